using System.CommandLine;
using PathPortal.Portal.Data.Provisioning;

namespace PathPortal.Cli;

/// <summary>Brings the database up to date. Safe to run again and by several at once.</summary>
internal static class MigrateCommand
{
    public static Command Create()
    {
        var command = new Command("migrate", "Creates or updates tables, database roles and grants. "
            + $"{Settings.OwnerVariable} owns the database; {Settings.WebVariable} and {Settings.WorkerVariable} name the roles of the two processes.");
        command.SetAction((_, cancellation) => Terminal.RunAsync(async () =>
        {
            var owner = Settings.Owner;
            var target = new MigrationTarget(owner, Settings.Read(Settings.WebVariable) ?? owner, Settings.Read(Settings.WorkerVariable) ?? owner);
            var report = await new DatabaseMigrator(target).RunAsync(cancellation);
            foreach (var line in report.Lines())
                Console.WriteLine(line);
            return Terminal.Done;
        }));
        return command;
    }
}
