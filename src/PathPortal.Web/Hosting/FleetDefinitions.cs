using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Handling.Fleet;

namespace PathPortal.Web.Hosting;

/// <summary>What the pages of arm models, cells and criteria sheets need.</summary>
internal static class FleetDefinitions
{
    public static void AddFleetDefinitions(this IServiceCollection services)
    {
        services.AddSingleton<ArmsQuery>();
        services.AddSingleton<CellsQuery>();
        services.AddSingleton<CriteriaQuery>();
        services.AddSingleton<SaveArmModel>();
        services.AddSingleton<SaveCriteriaSheet>();
        services.AddSingleton<SaveCellSetup>();
        services.AddSingleton<AddCell>();
    }
}
