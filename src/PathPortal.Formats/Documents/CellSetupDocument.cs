using System.Collections.Immutable;
using System.Text;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Control;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Documents;

/// <summary>One version of a cell's setup as people write and store it: base, tools, work frames, controller. Mutable for edit forms.</summary>
public sealed record CellSetupDocument
{
    public const string FormatName = "pathportal-cell-setup-1";

    public string Note { get; set; } = "";

    /// <summary>The arm's base in the cell.</summary>
    public MeasuredPoseDocument Base { get; set; } = new();

    /// <summary>Each tool in the flange; the tool's z axis points from the holder to the tip.</summary>
    public List<MeasuredPoseDocument> Tools { get; set; } = [];

    /// <summary>Each work frame in the cell; path points are written in one of them.</summary>
    public List<MeasuredPoseDocument> Frames { get; set; } = [];

    public ControllerDocument Controller { get; set; } = new();

    /// <summary>Reads a document; a value that comes back holds (<see cref="Validate"/> is empty).</summary>
    public static ReadResult<CellSetupDocument> Read(ReadOnlySpan<byte> source) => CellSetupFormat.Format.Read(source);

    public static ReadResult<CellSetupDocument> Read(string source) => Read(Encoding.UTF8.GetBytes(source));

    /// <summary>Every rule the document breaks, by property path; lines and columns are 0.</summary>
    public ImmutableArray<FormatProblem> Validate() => CellSetupFormat.Format.Check(this);

    /// <summary>Canonical text; equal content gives equal text.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public string ToJson() => CellSetupFormat.Format.Write(this);

    /// <summary>Base, one tool and one work frame for the engine, SI. Names match exactly.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold, or has no such tool or frame.</exception>
    public CellGeometry ToCellGeometry(string toolName, string frameName)
    {
        CellSetupFormat.Format.Demand(this);
        return new(
            Conversion.ToTransform(Base.Pose),
            Conversion.ToTransform(Named(Tools, toolName, "tool").Pose),
            Conversion.ToTransform(Named(Frames, frameName, "work frame").Pose));
    }

    /// <summary>The controller's settings for the engine, SI.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public ControllerSettings ToControllerSettings()
    {
        CellSetupFormat.Format.Demand(this);
        return Controller.ToControllerSettings();
    }

    /// <summary>A copy that shares nothing with this one.</summary>
    public CellSetupDocument Copy() => this with
    {
        Base = Base.Copy(),
        Tools = [.. Tools.Select(t => t.Copy())],
        Frames = [.. Frames.Select(f => f.Copy())],
        Controller = Controller with { },
    };

    private static MeasuredPoseDocument Named(List<MeasuredPoseDocument> list, string name, string what) =>
        list.Find(p => p.Name == name) ?? throw new InvalidOperationException($"The setup has no {what} named “{VisibleText.Of(name)}”.");
}
