namespace PathPortal.Portal.Data.Queries;

/// <summary>Every criteria sheet of the company, those in use first.</summary>
public sealed record CriteriaList(IReadOnlyList<CriteriaList.Line> Sheets, bool MayEdit)
{
    /// <param name="Json">The newest version; null before the first.</param>
    public sealed record Line(Guid Id, string Name, int LatestNumber, DateTimeOffset? RetiredAt, string? Json, int Programs);
}
