namespace PathPortal.Web.Shared;

public static class TimeZones
{
    /// <summary>The zone of that IANA name; UTC when the machine does not know it, because a moment in a wrong zone is worse than one in UTC.</summary>
    public static TimeZoneInfo Find(string? ianaName) =>
        ianaName is not null && TimeZoneInfo.TryFindSystemTimeZoneById(ianaName, out var zone) ? zone : TimeZoneInfo.Utc;
}
