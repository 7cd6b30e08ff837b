using System.Collections.Immutable;
using System.Text;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Documents;

/// <summary>
/// An arm model as people write and store it, in degrees and millimetres. Mutable for edit forms; compare documents by <see cref="ToJson"/>.
/// </summary>
public sealed record ArmDocument
{
    public const string FormatName = "pathportal-arm-1";

    /// <summary>Longest note.</summary>
    public const int MostNoteCharacters = 4000;

    public string Name { get; set; } = "";

    /// <summary>Free text: what kind of arm, where its numbers come from, or that it is invented.</summary>
    public string Note { get; set; } = "";

    /// <summary>L: makes singular values of mixed units comparable; printed wherever one is.</summary>
    public double CharacteristicLengthMm { get; set; } = 1000;

    public ArmKinematics Kinematics { get; set; }

    public List<JointDocument> Joints { get; set; } = [];

    /// <summary>The mechanical interface in the frame after the last joint's row (last DH frame, or last link).</summary>
    public PoseDocument Flange { get; set; } = new();

    /// <summary>Reads a document; a value that comes back holds (<see cref="Validate"/> is empty).</summary>
    public static ReadResult<ArmDocument> Read(ReadOnlySpan<byte> source) => ArmFormat.Format.Read(source);

    public static ReadResult<ArmDocument> Read(string source) => Read(Encoding.UTF8.GetBytes(source));

    /// <summary>Every rule the document breaks, by property path; lines and columns are 0.</summary>
    public ImmutableArray<FormatProblem> Validate() => ArmFormat.Format.Check(this);

    /// <summary>Canonical text; equal content gives equal text.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public string ToJson() => ArmFormat.Format.Write(this);

    /// <summary>The arm in the engine's inner form, SI.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public ArmModel ToArmModel()
    {
        ArmFormat.Format.Demand(this);
        return ArmConversion.ToArmModel(this);
    }

    /// <summary>A copy that shares nothing with this one.</summary>
    public ArmDocument Copy() => this with
    {
        Joints = [.. Joints.Select(j => j with
        {
            Pose = j.Pose with { Orientation = j.Pose.Orientation with { } },
            Limits = j.Limits with
            {
                Low = j.Limits.Low is null ? null : j.Limits.Low with { },
                High = j.Limits.High is null ? null : j.Limits.High with { },
                Speed = j.Limits.Speed is null ? null : j.Limits.Speed with { },
                Acceleration = j.Limits.Acceleration is null ? null : j.Limits.Acceleration with { },
                Jerk = j.Limits.Jerk is null ? null : j.Limits.Jerk with { },
            },
        })],
        Flange = Flange with { Orientation = Flange.Orientation with { } },
    };
}
