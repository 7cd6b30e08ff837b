namespace PathPortal.Web.Features.Fleet;

/// <summary>What the reader chose to see; all of it stands in the address, so a view can be sent to a colleague.</summary>
public sealed record FleetFilter(Guid? Plant, Guid? Part, string? Process, string? Show, string? Sort, int Page)
{
    public const string PlantName = "plant";
    public const string PartName = "part";
    public const string ProcessName = "process";
    public const string ShowName = "show";
    public const string SortName = "sort";
    public const string PageName = "page";

    public const string ShowFailing = "failing";
    public const string ShowNear = "near";
    public const string ShowPassing = "passing";
    public const string ShowUnknown = "unknown";
    public const string SortByName = "name";
}
