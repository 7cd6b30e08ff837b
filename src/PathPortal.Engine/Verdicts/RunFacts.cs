namespace PathPortal.Engine.Verdicts;

/// <summary>What a run knows beside its samples: the answers to the yes-or-no criteria. A reason is one sentence and is given where the answer is no.</summary>
public sealed record RunFacts
{
    /// <summary>The run came to the end of the path; null when it could not be tried.</summary>
    public required bool? Finished { get; init; }

    /// <summary>Why the run ended early.</summary>
    public string? NotFinishedReason { get; init; }

    /// <summary>Every programmed pose can be reached; null when the run ended before this was known.</summary>
    public required bool? Reachable { get; init; }

    public string? NotReachableReason { get; init; }

    /// <summary>The sampled loop is stable with a gain margin of at least 2; null when it could not be judged.</summary>
    public required bool? LoopSound { get; init; }

    public string? NotSoundReason { get; init; }
}
