namespace PathPortal.Portal.Simulation;

/// <summary>What a run was asked to compute, as it stood then: the frozen versions, and the digest the scenario must come to.</summary>
/// <param name="Format">Reader of the revision's bytes.</param>
public sealed record RunInputs(Guid RunId, string Digest, int NumericsVersion, string Format, byte[] Source, ScenarioInputs Scenario)
{
    /// <summary>The scenario, or why it can't be computed here; a digest that differs is such a reason.</summary>
    public ScenarioResult Build()
    {
        var built = ScenarioBuilder.Build(Format, Source, Scenario);
        if (!built.Ok || built.Digest == Digest)
            return built;
        var message = NumericsVersion == Engine.NumericsVersion.Current
            ? $"The stored inputs come to the digest {built.Digest}, but the run was asked for under {Digest}. " +
              "Either a stored version was altered, or the processes run different builds."
            : string.Create(
                System.Globalization.CultureInfo.InvariantCulture,
                $"The run {Digest} belongs to version {NumericsVersion} of the arithmetic; this build computes with version {Engine.NumericsVersion.Current}, under which its inputs come to {built.Digest}.");
        return new([new(ScenarioPart.Path, message)]);
    }
}
