using Microsoft.Extensions.DependencyInjection;

namespace PathPortal.Portal.Data.Queries;

/// <summary>Registers the queries pages read with. They keep nothing between calls.</summary>
public static class QueryServices
{
    /// <summary>Needs AddPortalData.</summary>
    public static IServiceCollection AddPortalQueries(this IServiceCollection services) => services
        .AddSingleton<ArmsQuery>()
        .AddSingleton<CellsQuery>()
        .AddSingleton<CriteriaQuery>()
        .AddSingleton<FileQuery>()
        .AddSingleton<FleetQuery>()
        .AddSingleton<HistoryQuery>()
        .AddSingleton<ProgramQuery>()
        .AddSingleton<ReviewQuery>()
        .AddSingleton<RunQuery>()
        .AddSingleton<SetupQuery>()
        .AddSingleton<WaitingQuery>();
}
