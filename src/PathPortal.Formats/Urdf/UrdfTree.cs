using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Urdf;

/// <summary>Checks that links and joints form one tree, by names alone: the order of the file says nothing.</summary>
internal sealed class UrdfTree
{
    private readonly Dictionary<string, UrdfJoint> _jointAbove = new(StringComparer.Ordinal);
    private readonly Dictionary<string, UrdfJoint> _joints = new(StringComparer.Ordinal);
    private readonly HashSet<string> _links = new(StringComparer.Ordinal);

    public UrdfTree(UrdfXml xml, ProblemList problems)
    {
        foreach (var (name, line, column) in xml.Links)
        {
            if (!_links.Add(name))
            {
                problems.Add(line, column, "link", name, "a name of its own", "Two links have the same name.");
            }
        }

        foreach (var joint in xml.Joints)
        {
            if (!_joints.TryAdd(joint.Name, joint))
            {
                Wrong(joint, "", "a name of its own", "Two joints have the same name.", problems);
            }

            CheckEnds(joint, problems);
        }

        foreach (var joint in xml.Joints)
        {
            CheckMotion(joint, problems);
            CheckMimic(joint, problems);
        }

        Root = problems.Any ? "" : FindRoot(xml, problems);
    }

    public string Root { get; } = "";

    /// <summary>Links in kinematic order: each after the one it hangs on, otherwise as in the file.</summary>
    public List<string> Order { get; } = [];

    public UrdfJoint? JointAbove(string link) => _jointAbove.GetValueOrDefault(link);

    public bool HasLink(string link) => _links.Contains(link);

    /// <summary>The leading joint a joint follows, through every joint between, with factors and offsets multiplied out; null when it follows none.</summary>
    public UrdfMimic? Resolve(string joint)
    {
        if (_joints.GetValueOrDefault(joint)?.Mimic is not { } mimic)
        {
            return null;
        }

        while (_joints[mimic.Follows].Mimic is { } next)
        {
            mimic = new(next.Follows, mimic.Multiplier * next.Multiplier, mimic.Multiplier * next.Offset + mimic.Offset);
        }

        return mimic;
    }

    private void CheckEnds(UrdfJoint joint, ProblemList problems)
    {
        foreach (var (end, link) in (ReadOnlySpan<(string, string)>)[("parent", joint.Parent), ("child", joint.Child)])
        {
            if (link.Length == 0)
            {
                Wrong(joint, "", $"an element {end}", $"The joint names no {end} link.", problems);
            }
            else if (!_links.Contains(link))
            {
                Wrong(joint, link, "the name of a link in the file", $"The {end} link does not exist.", problems);
            }
        }

        if (joint.Child.Length > 0 && !_jointAbove.TryAdd(joint.Child, joint))
        {
            Wrong(
                joint, joint.Child, $"one parent per link; joint “{VisibleText.Of(_jointAbove[joint.Child].Name)}” has it already",
                "The child link has two parents.", problems);
        }
    }

    private static void CheckMotion(UrdfJoint joint, ProblemList problems)
    {
        if (joint.Moves && joint.Type is not UrdfJointType.Floating && !(joint.Axis.Norm > 1e-9))
        {
            Wrong(joint, "0 0 0", "a direction", "The axis of a moving joint is zero.", problems);
        }

        if (joint.Type is not (UrdfJointType.Revolute or UrdfJointType.Prismatic))
        {
            return;
        }

        if (!joint.HasLimit)
        {
            Wrong(joint, "", "an element limit", "A revolute or prismatic joint has no limit element.", problems);
        }
        else if ((joint.Lower ?? 0) > (joint.Upper ?? 0))
        {
            Wrong(
                joint, string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{joint.Lower ?? 0} to {joint.Upper ?? 0}"),
                "lower below upper", "The limits are the wrong way round.", problems);
        }
    }

    private void CheckMimic(UrdfJoint joint, ProblemList problems)
    {
        if (joint.Mimic is null)
        {
            return;
        }

        var steps = 0;
        for (var at = joint; at?.Mimic is { } mimic; at = _joints.GetValueOrDefault(mimic.Follows))
        {
            if (!_joints.TryGetValue(mimic.Follows, out var followed))
            {
                Wrong(joint, mimic.Follows, "the name of a joint in the file", "The joint follows one that does not exist.", problems);
                return;
            }

            if (followed == joint || ++steps > _joints.Count)
            {
                Wrong(joint, mimic.Follows, "another joint that does not follow this one", "The joint follows itself.", problems);
                return;
            }
        }
    }

    private string FindRoot(UrdfXml xml, ProblemList problems)
    {
        var roots = xml.Links.Where(l => !_jointAbove.ContainsKey(l.Name)).ToArray();
        if (roots.Length != 1)
        {
            var at = roots.Length == 0 ? (Line: 1, Column: 1) : (roots[1].Line, roots[1].Column);
            problems.Add(
                at.Line, at.Column, "", string.Join(", ", roots.Take(4).Select(r => r.Name)), "one link that is no joint's child",
                xml.Links.Count == 0 ? "The file has no links." : roots.Length == 0 ? "The links form a loop: every link is some joint's child." : "The links form more than one tree.");
            return "";
        }

        var below = xml.Joints.ToLookup(j => j.Parent, j => j.Child, StringComparer.Ordinal);
        var open = new Stack<string>([roots[0].Name]);
        while (open.TryPop(out var link))
        {
            Order.Add(link);
            foreach (var child in below[link].Reverse())
            {
                open.Push(child);
            }
        }

        if (Order.Count != _links.Count)
        {
            var reached = Order.ToHashSet(StringComparer.Ordinal);
            var lost = xml.Links.First(l => !reached.Contains(l.Name));
            problems.Add(
                lost.Line, lost.Column, "link", lost.Name, $"a way from the root link “{VisibleText.Of(roots[0].Name)}”",
                "The links form a loop.");
        }

        return roots[0].Name;
    }

    private static void Wrong(UrdfJoint joint, string value, string expected, string message, ProblemList problems) =>
        problems.Add(joint.Line, joint.Column, joint.Field, value, expected, message);
}
