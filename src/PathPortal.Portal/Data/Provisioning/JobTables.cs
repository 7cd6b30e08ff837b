using Microsoft.Extensions.DependencyInjection;
using Npgsql;
using PathPortal.Portal.Jobs;
using Quartz;

namespace PathPortal.Portal.Data.Provisioning;

/// <summary>The job engine's own tables, made by the owner in a schema of their own.</summary>
internal static class JobTables
{
    public const string Schema = JobScheduler.Schema;

    /// <summary>Makes what is missing; never alters or drops.</summary>
    public static async Task ProvisionAsync(NpgsqlDataSource owner, CancellationToken cancellation)
    {
        await using (var schema = owner.CreateCommand($"CREATE SCHEMA IF NOT EXISTS {Schema}"))
            await schema.ExecuteNonQueryAsync(cancellation);
        var services = new ServiceCollection();
        services.AddLogging();
        // As an instance, so that disposing the provider leaves it open.
        services.AddSingleton(owner);
        services.AddQuartz(JobScheduler.ConfigureProvisioning);
        await using var provider = services.BuildServiceProvider();
        // Building the scheduler makes the tables; it is never started.
        var scheduler = await provider.GetRequiredService<ISchedulerFactory>().GetScheduler(cancellation);
        await scheduler.Shutdown(waitForJobsToComplete: false, cancellation);
    }

    /// <summary>
    /// What the roles may do: the worker runs the engine; the web adds jobs, and to do so looks whether one of that name is there or its
    /// group paused.
    /// </summary>
    public static IEnumerable<string> Grants(string? web, string? worker)
    {
        if (worker is not null)
        {
            yield return $"GRANT USAGE ON SCHEMA {Schema} TO {worker};";
            yield return $"GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA {Schema} TO {worker};";
        }
        if (web is not null)
        {
            yield return $"GRANT USAGE ON SCHEMA {Schema} TO {web};";
            foreach (var table in new[] { "job_details", "triggers", "simple_triggers" })
                yield return $"GRANT SELECT, INSERT ON {JobScheduler.TablePrefix}{table} TO {web};";
            foreach (var table in new[] { "paused_trigger_grps", "paused_job_grps" })
                yield return $"GRANT SELECT ON {JobScheduler.TablePrefix}{table} TO {web};";
        }
    }
}
