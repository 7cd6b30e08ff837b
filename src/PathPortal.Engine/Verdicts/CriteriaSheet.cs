namespace PathPortal.Engine.Verdicts;

/// <summary>What a run must hold to pass. SI, immutable. A tolerance that is null means the criterion is not asked for.</summary>
public sealed record CriteriaSheet
{
    /// <summary>Allowed distance across the path in process sections (m).</summary>
    public double? AcrossTolerance { get; init; }

    /// <summary>Added to the size before comparing with <see cref="AcrossTolerance"/> (m): what the simulation does not know, stated.</summary>
    public double AcrossAllowance { get; init; }

    /// <summary>Allowed distance along the tool axis (stand-off) in process sections (m).</summary>
    public double? StandOffTolerance { get; init; }

    public double StandOffAllowance { get; init; }

    /// <summary>Allowed angle between programmed and true tool axis in process sections (rad).</summary>
    public double? AxisTolerance { get; init; }

    public double AxisAllowance { get; init; }

    /// <summary>Allowed distance between reference and tool at equal times (m); asked only where the process runs by the clock.</summary>
    public double? TrackingTolerance { get; init; }

    public double TrackingAllowance { get; init; }

    /// <summary>Required distance to a joint position limit for revolute joints (rad), above zero.</summary>
    public required double RevoluteClearance { get; init; }

    /// <summary>Required distance to a joint position limit for prismatic joints (m), above zero.</summary>
    public required double PrismaticClearance { get; init; }

    /// <summary>Turns a continuous joint may use either way from zero, above zero.</summary>
    public double ContinuousTurns { get; init; } = 1;

    /// <summary>Share of the joint speed limits the path may demand, in (0, 1].</summary>
    public required double SpeedShare { get; init; }

    /// <summary>Share of the joint acceleration limits the path may demand, in (0, 1].</summary>
    public required double AccelerationShare { get; init; }

    /// <summary>Smallest allowed σ_min of the scaled Jacobian on tool-space moves.</summary>
    public required double RequiredSigmaMin { get; init; }

    /// <summary>True: too close to a singularity fails. False: it is advice.</summary>
    public bool SingularityBinds { get; init; }

    /// <summary>Allowed difference of tool speed from the reference speed in process sections, as a share of the programmed speed; null: not asked.</summary>
    public double? ToolSpeedTolerance { get; init; }

    /// <summary>Use at and above which a criterion counts as near its limit, by criterion; <see cref="DefaultNear"/> where absent.</summary>
    public IReadOnlyDictionary<Criterion, double> Near { get; init; } = new Dictionary<Criterion, double>();

    /// <summary>Near threshold where none is given: 80 % of the limit.</summary>
    public const double DefaultNear = 0.8;
}
