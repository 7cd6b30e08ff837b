using System.Collections.Immutable;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Urdf;

/// <summary>
/// A robot description read from a URDF file (version 1.0): its tree of links, from which the chain between two of them becomes an arm. Immutable.
/// </summary>
public sealed class UrdfModel
{
    private readonly UrdfTree _tree;
    private readonly ImmutableArray<FormatRemark> _remarks;

    private UrdfModel(UrdfXml xml, UrdfTree tree, ImmutableArray<FormatRemark> remarks)
    {
        (_tree, _remarks, Name, RootLink, Links) = (tree, remarks, xml.RobotName, tree.Root, [.. tree.Order]);
        var parents = xml.Joints.Select(j => j.Parent).ToHashSet(StringComparer.Ordinal);
        TipLinks = [.. Links.Where(l => !parents.Contains(l)).OrderByDescending(l => MovingJoints(l)).ThenBy(l => l, StringComparer.Ordinal)];
    }

    /// <summary>Name of the robot; may be empty.</summary>
    public string Name { get; }

    public string RootLink { get; }

    /// <summary>Every link in kinematic order.</summary>
    public ImmutableArray<string> Links { get; }

    /// <summary>Links nothing hangs on; the one behind the most moving joints first.</summary>
    public ImmutableArray<string> TipLinks { get; }

    /// <summary>Reads a file. Nothing outside it is ever loaded.</summary>
    public static ReadResult<UrdfModel> Read(ReadOnlySpan<byte> source)
    {
        var problems = new ProblemList();
        if (SourceText.ToUtf8(source, ReadLimits.UrdfBytes, problems) is not { } utf8)
        {
            return ReadResult<UrdfModel>.Refused(problems);
        }

        var xml = new UrdfXml(problems);
        xml.Read(utf8);
        if (problems.Any)
        {
            return ReadResult<UrdfModel>.Refused(problems);
        }

        var tree = new UrdfTree(xml, problems);
        return problems.Any ? ReadResult<UrdfModel>.Refused(problems) : ReadResult<UrdfModel>.Of(new(xml, tree, problems.Remarks), problems);
    }

    public static ReadResult<UrdfModel> Read(string source) => Read(System.Text.Encoding.UTF8.GetBytes(source));

    /// <summary>What a joint follows, through every joint between; null when it follows none.</summary>
    public UrdfMimic? MimicOf(string joint) => _tree.Resolve(joint);

    /// <summary>
    /// The chain from a base link to a tip link as an arm document; the tip becomes the flange. Remarks on its joints made while the file was read
    /// come first.
    /// </summary>
    /// <param name="baseLink">Null: the root.</param>
    /// <param name="tipLink">Null: the first of <see cref="TipLinks"/>.</param>
    /// <param name="freeMimicJoints">
    /// False: a joint that follows another makes the chain no arm, and it is refused. True: it becomes a joint of its own; the coupling is lost and
    /// a remark says so.
    /// </param>
    public ReadResult<ArmDocument> ToArm(string? baseLink = null, string? tipLink = null, bool freeMimicJoints = false) =>
        new UrdfChain(_tree, Name, _remarks, freeMimicJoints).ToArm(baseLink ?? RootLink, tipLink ?? TipLinks[0]);

    private int MovingJoints(string link)
    {
        var count = 0;
        for (var joint = _tree.JointAbove(link); joint is not null; joint = _tree.JointAbove(joint.Parent))
        {
            count += joint.Moves ? 1 : 0;
        }

        return count;
    }
}
