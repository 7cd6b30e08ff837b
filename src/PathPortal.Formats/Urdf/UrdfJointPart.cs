using System.Globalization;
using System.Xml;
using PathPortal.Engine.Geometry;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Urdf;

/// <summary>Reads one element inside a joint.</summary>
internal sealed class UrdfJointPart(XmlReader reader, IXmlLineInfo lines, UrdfJoint joint, HashSet<string> seen, ProblemList problems)
{
    private const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    // Farther than any arm reaches; beyond it the file is in other units.
    private const double FarthestM = 100;
    private const double MostTurn = 4 * Math.PI;

    // Angles this near to a right one are usually one that was rounded.
    private const double RoundedRightAngle = 2e-3;
    private const double ExactRightAngle = 1e-9;

    private readonly string _element = reader.Name;

    public void Read()
    {
        if (_element is not ("origin" or "parent" or "child" or "axis" or "limit" or "mimic" or "safety_controller"))
        {
            return;
        }

        if (!seen.Add(_element))
        {
            Wrong("", "", "the element once", "The element is there twice.");
            return;
        }

        switch (_element)
        {
            case "origin":
                joint.Xyz = Vector("xyz", FarthestM, "m") ?? joint.Xyz;
                joint.Rpy = Vector("rpy", MostTurn, "rad") ?? joint.Rpy;
                RemarkRoundedAngles();
                break;
            case "parent":
                joint.Parent = LinkName();
                break;
            case "child":
                joint.Child = LinkName();
                break;
            case "axis":
                joint.Axis = Vector("xyz", 1e6, "") ?? joint.Axis;
                break;
            case "limit":
                joint.HasLimit = true;
                (joint.Lower, joint.Upper, joint.Velocity) = (Number("lower"), Number("upper"), Number("velocity"));
                if (joint.Velocity < 0)
                {
                    Wrong("velocity", reader.GetAttribute("velocity") ?? "", "a number above 0", "The speed limit is negative.");
                }

                break;
            case "mimic":
                joint.Mimic = new(reader.GetAttribute("joint") ?? "", Number("multiplier") ?? 1, Number("offset") ?? 0);
                break;
            default:
                (joint.SoftLower, joint.SoftUpper) = (Number("soft_lower_limit") ?? 0, Number("soft_upper_limit") ?? 0);
                break;
        }
    }

    private string LinkName()
    {
        var name = reader.GetAttribute("link") ?? "";
        if (name.Length == 0)
        {
            Wrong("link", "", "the name of a link", "The link is not named.");
        }

        return name;
    }

    private Vector3D? Vector(string attribute, double most, string unit)
    {
        if (reader.GetAttribute(attribute) is not { } text)
        {
            return null;
        }

        var expected = "three numbers with blanks between" + (unit.Length == 0 ? "" : $" in {unit}");
        if (IsMacro(attribute, text))
        {
            return null;
        }

        var parts = text.Split((char[])[' ', '\t', '\n', '\r'], StringSplitOptions.RemoveEmptyEntries);
        var values = new double[3];
        if (parts.Length != 3)
        {
            Wrong(
                attribute, text, expected,
                text.Contains(',', StringComparison.Ordinal) ? "There are not three numbers; only a decimal point is read." : "There are not three numbers.");
            return null;
        }

        for (var i = 0; i < 3; i++)
        {
            if (!double.TryParse(parts[i], Style, CultureInfo.InvariantCulture, out values[i]) || !double.IsFinite(values[i]))
            {
                Wrong(
                    attribute, text, expected,
                    parts[i].Contains(',', StringComparison.Ordinal) ? "A number has a comma; only a decimal point is read." : "One of the three is not a finite number.");
                return null;
            }

            if (!(Math.Abs(values[i]) <= most))
            {
                Wrong(
                    attribute, text,
                    string.Create(CultureInfo.InvariantCulture, $"numbers from {-most:G5} to {most:G5} {unit}: are the units right?"),
                    "A number is outside its range.");
                return null;
            }
        }

        return new(values[0], values[1], values[2]);
    }

    private double? Number(string attribute)
    {
        if (reader.GetAttribute(attribute) is not { } text || IsMacro(attribute, text))
        {
            return null;
        }

        if (double.TryParse(text.Trim(' ', '\t', '\n', '\r'), Style, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value))
        {
            return value;
        }

        Wrong(
            attribute, text, "a finite number",
            text.Contains(',', StringComparison.Ordinal) ? "The number has a comma; only a decimal point is read." : "This is not a finite number.");
        return null;
    }

    private bool IsMacro(string attribute, string text)
    {
        var macro = text.Contains("${", StringComparison.Ordinal) || text.Contains("$(", StringComparison.Ordinal);
        if (macro)
        {
            Wrong(attribute, text, "the file a macro processor makes of this one", "The value is a macro that was not expanded.");
        }

        return macro;
    }

    // Kept as written: a snapped angle would be another arm. But whoever expects a spherical wrist should know.
    private void RemarkRoundedAngles()
    {
        foreach (var angle in (double[])[joint.Rpy.X, joint.Rpy.Y, joint.Rpy.Z])
        {
            var off = angle - Math.Round(angle / (Math.PI / 2)) * (Math.PI / 2);
            if (Math.Abs(angle) > 1 && Math.Abs(off) is > ExactRightAngle and < RoundedRightAngle)
            {
                problems.Remark(
                    lines.LineNumber, lines.LinePosition, $"{joint.Field}, origin rpy",
                    string.Create(CultureInfo.InvariantCulture, $"{angle:R} rad is {Math.Abs(off) * 180 / Math.PI:G3} degrees off a right angle. It is kept as written."));
            }
        }
    }

    private void Wrong(string attribute, string value, string expected, string message) => problems.Add(
        lines.LineNumber, lines.LinePosition, $"{joint.Field}, {_element}{(attribute.Length == 0 ? "" : " " + attribute)}", value, expected,
        message);
}
