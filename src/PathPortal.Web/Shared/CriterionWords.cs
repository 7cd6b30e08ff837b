using PathPortal.Engine.Verdicts;

namespace PathPortal.Web.Shared;

/// <summary>The criteria in words.</summary>
public static class CriterionWords
{
    /// <summary>Short name for columns and badges.</summary>
    public static string Name(Criterion criterion) => criterion switch
    {
        Criterion.AcrossPath => "across the path",
        Criterion.StandOff => "stand-off",
        Criterion.ToolAxis => "tool axis",
        Criterion.Tracking => "tracking error",
        Criterion.JointPosition => "joint position",
        Criterion.JointSpeed => "joint speed",
        Criterion.JointAcceleration => "joint acceleration",
        Criterion.Singularity => "singularity",
        Criterion.ToolSpeed => "tool speed",
        Criterion.Finished => "path finished",
        Criterion.Reachable => "every pose reachable",
        Criterion.StartInside => "start inside limits",
        Criterion.LoopSound => "loop sound",
        _ => criterion.ToString(),
    };

    /// <summary>What the use of this criterion is a share of.</summary>
    public static string Explanation(Criterion criterion) => criterion switch
    {
        Criterion.AcrossPath => "distance from the programmed path, across it, plus the stated allowance; share of the tolerance",
        Criterion.StandOff => "distance from the programmed path along the tool axis, plus the stated allowance; share of the tolerance",
        Criterion.ToolAxis => "angle between programmed and true tool axis, plus the stated allowance; share of the tolerance",
        Criterion.Tracking => "distance between reference and tool at the same moment, plus the stated allowance; share of the tolerance",
        Criterion.JointPosition => "required clearance as a share of the distance left to the nearest position limit",
        Criterion.JointSpeed => "speed the path asks of a joint, before limiting, as a share of what is allowed",
        Criterion.JointAcceleration => "acceleration the path asks of a joint, before limiting, as a share of what is allowed",
        Criterion.Singularity => "required smallest singular value of the scaled Jacobian as a share of the one there is",
        Criterion.ToolSpeed => "difference from the speed programmed for that moment; share of the allowed difference",
        Criterion.Finished => "the run came to the end of the path",
        Criterion.Reachable => "the arm reaches every programmed pose",
        Criterion.StartInside => "the start posture lies inside the joint limits",
        Criterion.LoopSound => "the sampled control loop is stable with a gain margin of at least 2",
        _ => "",
    };

    /// <summary>Answered by yes or no, without a share of a limit.</summary>
    public static bool IsYesOrNo(Criterion criterion) =>
        criterion is Criterion.Finished or Criterion.Reachable or Criterion.StartInside or Criterion.LoopSound;
}
