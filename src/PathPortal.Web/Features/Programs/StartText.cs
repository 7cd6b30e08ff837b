using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Web.Features.Programs;

/// <summary>Start posture and turn as typed: degrees and millimetres, decimal point, one number a joint.</summary>
public static class StartText
{
    private const double RadiansPerDegree = Math.PI / 180;

    public static Outcome<StartTerms> Parse(AssignForm form, ArmDocument arm)
    {
        double[]? start = null;
        if (!string.IsNullOrWhiteSpace(form.Start))
        {
            var words = form.Start.Split([' ', ';', '\t'], StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
            if (words.Length != arm.Joints.Count)
                return new Refusal(RefusalKind.Invalid, $"The start posture has {words.Length} numbers; the arm has {arm.Joints.Count} joints.");
            start = new double[words.Length];
            for (var i = 0; i < words.Length; i++)
            {
                if (Number(words[i]) is not { } value)
                    return new Refusal(RefusalKind.Invalid, $"“{words[i]}” for joint {i + 1} is no number; write it with a decimal point and blanks between joints.");
                start[i] = arm.Joints[i].Kind == JointKind.Prismatic ? value / 1e3 : value * RadiansPerDegree;
            }
        }
        double? turn = null;
        if (!string.IsNullOrWhiteSpace(form.Turn))
        {
            if (Number(form.Turn.Trim()) is not { } degrees)
                return new Refusal(RefusalKind.Invalid, $"“{form.Turn.Trim()}” is no angle; write it in degrees with a decimal point.");
            turn = degrees * RadiansPerDegree;
        }
        return new StartTerms(form.Tool ?? "", form.Frame ?? "", start, turn);
    }

    private static double? Number(string text) =>
        double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value) ? value : null;
}
