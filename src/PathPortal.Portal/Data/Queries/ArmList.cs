namespace PathPortal.Portal.Data.Queries;

/// <summary>Every arm model of the company, those in use first.</summary>
public sealed record ArmList(IReadOnlyList<ArmList.Line> Arms, bool MayEdit)
{
    /// <param name="Json">The newest version; null before the first.</param>
    /// <param name="Cells">Cells whose newest setup carries it.</param>
    public sealed record Line(Guid Id, string Name, int LatestNumber, DateTimeOffset? RetiredAt, string? Json, int Cells);
}
