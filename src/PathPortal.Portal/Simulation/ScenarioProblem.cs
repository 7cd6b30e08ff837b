namespace PathPortal.Portal.Simulation;

/// <summary>Why inputs don't make a scenario, in a sentence a person can act on.</summary>
public sealed record ScenarioProblem(ScenarioPart Part, string Message)
{
    public override string ToString() => Message;
}
