namespace PathPortal.Engine.Verdicts;

/// <summary>The criteria a run is judged by. Names are stored; never renumber or rename.</summary>
public enum Criterion
{
    /// <summary>Distance of the tool from the programmed geometry, across the path.</summary>
    AcrossPath = 1,

    /// <summary>Distance along the tool axis.</summary>
    StandOff = 2,

    /// <summary>Angle between programmed and true tool axis.</summary>
    ToolAxis = 3,

    /// <summary>Distance between reference and tool at equal times.</summary>
    Tracking = 4,

    JointPosition = 5,

    JointSpeed = 6,

    JointAcceleration = 7,

    /// <summary>Required over actual σ_min of the scaled Jacobian.</summary>
    Singularity = 8,

    /// <summary>Difference from the reference tool speed.</summary>
    ToolSpeed = 9,

    /// <summary>The run came to the end of the path. Yes or no.</summary>
    Finished = 20,

    /// <summary>Every programmed pose can be reached. Yes or no.</summary>
    Reachable = 21,

    /// <summary>The start posture is inside the joint limits. Yes or no.</summary>
    StartInside = 22,

    /// <summary>The sampled loop is stable with a gain margin of at least 2. Yes or no.</summary>
    LoopSound = 23,
}
