using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Simulation;

/// <summary>
/// From what is stored to what the engine takes. Web and worker build scenarios here and nowhere else, so that both come to the same digest.
/// Inputs that don't fit together give problems; nothing throws.
/// </summary>
public static class ScenarioBuilder
{
    /// <summary>Reads a revision's bytes with the reader that understood them at upload.</summary>
    /// <param name="format">As in <see cref="Revision.Format"/>.</param>
    public static (ToolPath? Path, ImmutableArray<ScenarioProblem> Problems) ReadPath(string format, ReadOnlySpan<byte> source)
    {
        if (format != "csv")
            return (null, [new(ScenarioPart.Path, $"This version of PathPortal can't read path files of the kind “{format}”.")]);
        var read = PathCsv.Read(source);
        return read.Ok ? (read.Value.Path, []) : (null, Problems(ScenarioPart.Path, "The path file", read));
    }

    /// <summary>Builds from a revision's bytes and the other inputs.</summary>
    public static ScenarioResult Build(string format, ReadOnlySpan<byte> source, ScenarioInputs inputs)
    {
        var (path, problems) = ReadPath(format, source);
        return path is null ? new(problems) : Build(path, inputs);
    }

    /// <summary>Builds for a path that is read already; an upload reads once for all its cells.</summary>
    public static ScenarioResult Build(ToolPath path, ScenarioInputs inputs)
    {
        var arm = ArmDocument.Read(inputs.ArmJson);
        var setup = CellSetupDocument.Read(inputs.SetupJson);
        var criteria = CriteriaDocument.Read(inputs.CriteriaJson);
        if (!arm.Ok || !setup.Ok || !criteria.Ok)
        {
            return new(
            [
                .. Problems(ScenarioPart.Arm, "The arm model", arm),
                .. Problems(ScenarioPart.Setup, "The cell setup", setup),
                .. Problems(ScenarioPart.Criteria, "The criteria sheet", criteria),
            ]);
        }

        var model = arm.Value.ToArmModel();
        var terms = inputs.Terms;
        ImmutableArray<ScenarioProblem> problems = [.. Names(setup.Value, terms), .. Start(model, terms), .. Postures(model, path)];
        if (problems.Length > 0)
            return new(problems);

        var scenario = new Scenario
        {
            Arm = model,
            Cell = setup.Value.ToCellGeometry(terms.ToolName, terms.WorkFrameName),
            Controller = setup.Value.ToControllerSettings(),
            Path = path,
            Criteria = criteria.Value.ToCriteriaSheet(),
            Start = terms.StartJoints is { } joints ? [.. joints] : null,
            FreeTurn = terms.FreeTurn,
        };
        var unfit = ScenarioCheck.Find(scenario);
        return unfit.IsEmpty
            ? new(scenario, Sha256Text.From(ScenarioDigest.Compute(scenario)))
            : new([.. unfit.Select(p => new ScenarioProblem(PartOf(p), Sentence(p)))]);
    }

    private static ScenarioPart PartOf(InputProblem problem) => problem.Place switch
    {
        _ when problem.Quantity == "required clearance" => ScenarioPart.Criteria,
        "cell" or "controller" => ScenarioPart.Setup,
        "criteria" => ScenarioPart.Criteria,
        "start" => ScenarioPart.Terms,
        var place when place == "arm" || place.StartsWith("joint", StringComparison.Ordinal) => ScenarioPart.Arm,
        _ => ScenarioPart.Path,
    };

    private static string Sentence(InputProblem problem)
    {
        var text = problem.ToString();
        return char.ToUpperInvariant(text[0]) + text[1..] + ".";
    }

    private static IEnumerable<ScenarioProblem> Names(CellSetupDocument setup, StartTerms terms)
    {
        if (!setup.Tools.Exists(t => t.Name == terms.ToolName))
            yield return new(ScenarioPart.Setup, $"The cell's setup has no tool “{terms.ToolName}”; it has {Listed(setup.Tools)}.");
        if (!setup.Frames.Exists(f => f.Name == terms.WorkFrameName))
            yield return new(ScenarioPart.Setup, $"The cell's setup has no work frame “{terms.WorkFrameName}”; it has {Listed(setup.Frames)}.");
    }

    private static IEnumerable<ScenarioProblem> Start(ArmModel arm, StartTerms terms)
    {
        if (terms.StartJoints is { } joints)
        {
            if (joints.Length != arm.Joints.Length)
            {
                yield return new(
                    ScenarioPart.Terms,
                    $"The start posture has {Count(joints.Length, "value")}, but the arm “{arm.Name}” has {Count(arm.Joints.Length, "joint")}.");
            }
            else if (Array.FindIndex(joints, j => !double.IsFinite(j)) is >= 0 and var index)
            {
                yield return new(ScenarioPart.Terms, $"The start value of joint “{arm.Joints[index].Name}” is not a number.");
            }
        }
        if (terms.FreeTurn is { } turn && !double.IsFinite(turn))
            yield return new(ScenarioPart.Terms, "The turn about the free tool axis is not a number.");
    }

    // Postures of joint moves stand in the file, which knows nothing of the arm; the first that doesn't fit is enough to tell.
    private static IEnumerable<ScenarioProblem> Postures(ArmModel arm, ToolPath path)
    {
        foreach (var waypoint in path.Waypoints)
        {
            if (waypoint.Joints is { } joints && joints.Length != arm.Joints.Length)
            {
                yield return new(
                    ScenarioPart.Path,
                    string.Create(CultureInfo.InvariantCulture, $"Line {waypoint.SourceLine} of the path gives a posture of {Count(joints.Length, "value")}, but the arm “{arm.Name}” has {Count(arm.Joints.Length, "joint")}."));
                yield break;
            }
        }

        for (var i = 0; i < Math.Min(path.PostureKinds.Length, arm.Joints.Length); i++)
        {
            if (path.PostureKinds[i] != arm.Joints[i].Kind)
            {
                var (given, does) = arm.Joints[i].Kind == JointKind.Prismatic ? ("an angle", "slides") : ("a length", "turns");
                yield return new(
                    ScenarioPart.Path,
                    string.Create(CultureInfo.InvariantCulture, $"The path gives {given} for joint {i + 1}, but joint “{arm.Joints[i].Name}” of the arm “{arm.Name}” {does}."));
            }
        }
    }

    private static ImmutableArray<ScenarioProblem> Problems<T>(ScenarioPart part, string what, ReadResult<T> read)
        where T : class =>
        [.. read.Problems.Select(p => new ScenarioProblem(part, $"{what} can't be used. {p}"))];

    private static string Listed(List<MeasuredPoseDocument> named) =>
        named.Count == 0 ? "none" : string.Join(", ", named.Select(n => $"“{n.Name}”"));

    private static string Count(int number, string what) =>
        string.Create(CultureInfo.InvariantCulture, $"{number} {what}{(number == 1 ? "" : "s")}");
}
