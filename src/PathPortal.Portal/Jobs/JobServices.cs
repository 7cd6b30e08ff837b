using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.DependencyInjection.Extensions;
using PathPortal.Portal.Simulation;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>Registers the queue for a process that hands over runs, and what a worker needs to compute them.</summary>
public static class JobServices
{
    /// <summary>For the web and for commands: runs can be enqueued, nothing is computed here. Needs AddPortalData.</summary>
    public static IServiceCollection AddRunQueue(this IServiceCollection services)
    {
        services.AddQuartz(JobScheduler.ConfigureSender);
        return services.AddSingleton<RunQueue>();
    }

    /// <summary>For a process that shows runs or decides on them. Needs AddPortalData; register options of its own before.</summary>
    public static IServiceCollection AddRunSamples(this IServiceCollection services)
    {
        services.TryAddSingleton(new RunSampleCacheOptions());
        services.TryAddSingleton<RunSampleCache>();
        services.TryAddSingleton<DecisionSamples>();
        return services;
    }

    /// <summary>For a worker process. Needs AddPortalData.</summary>
    public static IServiceCollection AddRunWorker(this IServiceCollection services, JobWorkerOptions options)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(options.Threads, 2);
        var worker = new WorkerIdentity();
        services.AddQuartz(quartz => JobScheduler.ConfigureWorker(quartz, worker.Name, options.Threads));
        services.AddSingleton(worker);
        services.AddSingleton(options);
        services.AddSingleton<RunQueue>();
        services.AddSingleton<RunClaims>();
        services.AddSingleton<RunProgress>();
        services.AddSingleton<RunReconciler>();
        services.AddSingleton<RunComputer>();
        services.AddSingleton<DatabasePatience>();
        services.AddSingleton<WorkerHeartbeat>();
        services.AddSingleton<WorkerStop>();
        services.AddSingleton<JobWorkerParts>();
        return services.AddHostedService<JobWorker>();
    }
}
