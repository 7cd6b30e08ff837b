using System.Collections.Immutable;
using System.Text;
using PathPortal.Engine.Verdicts;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Documents;

/// <summary>One version of a criteria sheet as people write and store it. A tolerance that is null is not asked for. Mutable for edit forms.</summary>
public sealed record CriteriaDocument
{
    public const string FormatName = "pathportal-criteria-1";

    public string Note { get; set; } = "";

    /// <summary>Allowed distance across the path in process sections.</summary>
    public double? AcrossToleranceMm { get; set; }

    /// <summary>Added before comparing: what the simulation does not know.</summary>
    public double AcrossAllowanceMm { get; set; }

    /// <summary>Allowed distance along the tool axis in process sections.</summary>
    public double? StandOffToleranceMm { get; set; }

    public double StandOffAllowanceMm { get; set; }

    /// <summary>Allowed angle between programmed and true tool axis in process sections.</summary>
    public double? AxisToleranceDeg { get; set; }

    public double AxisAllowanceDeg { get; set; }

    /// <summary>Allowed distance between reference and tool at equal times; only where the process runs by the clock.</summary>
    public double? TrackingToleranceMm { get; set; }

    public double TrackingAllowanceMm { get; set; }

    /// <summary>Required distance to a position limit, revolute joints.</summary>
    public double RevoluteClearanceDeg { get; set; } = 3;

    /// <summary>Required distance to a position limit, prismatic joints.</summary>
    public double PrismaticClearanceMm { get; set; } = 10;

    /// <summary>Turns a continuous joint may use either way.</summary>
    public double ContinuousTurns { get; set; } = 1;

    /// <summary>Share of the joint speed limits the path may demand.</summary>
    public double SpeedSharePercent { get; set; } = 90;

    /// <summary>Share of the joint acceleration limits the path may demand.</summary>
    public double AccelerationSharePercent { get; set; } = 90;

    /// <summary>Smallest allowed σ_min of the scaled Jacobian.</summary>
    public double RequiredSigmaMin { get; set; } = 0.05;

    /// <summary>True: too close to a singularity fails; false: it is advice.</summary>
    public bool SingularityBinds { get; set; }

    /// <summary>Allowed difference of tool speed, as a share of the programmed speed; null: not asked.</summary>
    public double? ToolSpeedTolerancePercent { get; set; }

    /// <summary>Use of the limit (%) at which a criterion counts as near, where it differs from 80 %.</summary>
    public SortedDictionary<Criterion, double> NearPercent { get; set; } = [];

    /// <summary>Reads a document; a value that comes back holds (<see cref="Validate"/> is empty).</summary>
    public static ReadResult<CriteriaDocument> Read(ReadOnlySpan<byte> source) => CriteriaFormat.Format.Read(source);

    public static ReadResult<CriteriaDocument> Read(string source) => Read(Encoding.UTF8.GetBytes(source));

    /// <summary>Every rule the document breaks, by property path; lines and columns are 0.</summary>
    public ImmutableArray<FormatProblem> Validate() => CriteriaFormat.Format.Check(this);

    /// <summary>Canonical text; equal content gives equal text.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public string ToJson() => CriteriaFormat.Format.Write(this);

    /// <summary>The sheet for the engine, SI.</summary>
    /// <exception cref="InvalidOperationException">The document does not hold.</exception>
    public CriteriaSheet ToCriteriaSheet()
    {
        CriteriaFormat.Format.Demand(this);
        return CriteriaConversion.ToCriteriaSheet(this);
    }

    /// <summary>A copy that shares nothing with this one.</summary>
    public CriteriaDocument Copy() => this with { NearPercent = new(NearPercent) };
}
