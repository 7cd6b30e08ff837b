using Microsoft.Extensions.DependencyInjection;
using Npgsql;
using Quartz;

namespace PathPortal.Portal.Jobs;

/// <summary>How every process sees the one job engine of the portal: a name, tables, groups.</summary>
internal static class JobScheduler
{
    /// <summary>All processes under this name share one queue.</summary>
    public const string Name = "pathportal";

    public const string Schema = "jobs";

    public const string TablePrefix = Schema + ".qrtz_";

    /// <summary>The group of all jobs and triggers that compute runs.</summary>
    public const string RunsGroup = "runs";

    /// <summary>How often a worker tells the others that it is alive; a dead one's jobs are taken over after about twice this.</summary>
    private static readonly TimeSpan CheckIn = TimeSpan.FromSeconds(4);

    /// <summary>For a process that only hands over jobs. Its scheduler is never started.</summary>
    public static void ConfigureSender(IQuartzBuilder quartz)
    {
        quartz.ConfigureScheduler(options => options.InstanceName = Name);
        quartz.UseDefaultThreadPool(1);
        quartz.UsePersistentStore(store => Store(store, SchemaProvisioning.None));
    }

    /// <summary>For a worker. Bulk work leaves a thread free, so that somebody who waits is served first.</summary>
    public static void ConfigureWorker(IQuartzBuilder quartz, string instanceId, int threads)
    {
        quartz.ConfigureScheduler(options =>
        {
            options.InstanceName = Name;
            options.InstanceId = instanceId;
            options.IdleWaitTime = TimeSpan.FromSeconds(1);
        });
        quartz.UseDefaultThreadPool(threads);
        quartz.UseExecutionLimits(limits => limits.ForGroup(GroupOf(RunPriority.Bulk), threads - 1));
        quartz.UsePersistentStore(store =>
        {
            Store(store, SchemaProvisioning.Validate);
            store.UseClustering(options =>
            {
                options.CheckinInterval = CheckIn;
                options.CheckinMisfireThreshold = CheckIn;
            });
        });
    }

    /// <summary>For the owner of the database. Never started, and under a name of its own, so that it touches no job.</summary>
    public static void ConfigureProvisioning(IQuartzBuilder quartz)
    {
        quartz.ConfigureScheduler(options => options.InstanceName = Name + "-provisioning");
        quartz.UseDefaultThreadPool(1);
        quartz.UsePersistentStore(store => Store(store, SchemaProvisioning.CreateIfMissing));
    }

    public static string GroupOf(RunPriority priority) => priority == RunPriority.Bulk ? "bulk" : "interactive";

    private static void Store(IPersistentStoreBuilder store, SchemaProvisioning provisioning)
    {
        store.UsePostgres(source => source.DataSourceFactory = services => services.GetRequiredService<NpgsqlDataSource>());
        store.ConfigureStore(options =>
        {
            options.TablePrefix = TablePrefix;
            options.SchemaProvisioning = provisioning;
            options.StoreJobDataAsStrings = true;
            options.AcceptEnlistedTransactions = true;
            // Every job has a name of its own, so that inserting one needs no lock: an upload never holds up the workers.
            options.LockOnInsert = false;
            options.CommandTimeout = TimeSpan.FromSeconds(10);
            options.DbRetryInterval = TimeSpan.FromSeconds(2);
        });
    }
}
