using System.CommandLine;
using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Data;
using PathPortal.Portal.Demo;
using PathPortal.Portal.Handling;
using PathPortal.Portal.Jobs;

namespace PathPortal.Cli;

/// <summary>Loads the invented company into an empty database; a second time changes nothing.</summary>
internal static class LoadDemoCommand
{
    public static Command Create()
    {
        var file = new Option<FileInfo>("--passwords-file")
        {
            Required = true,
            Description = "Where the random passwords of the demo accounts are written, readable by you alone.",
        };
        var command = new Command("load-demo", "Loads an invented company with plants, cells, programs and accounts. For a database of your own on this machine, never for real work.")
        {
            file,
        };
        command.SetAction((parsed, cancellation) => Terminal.RunAsync(async () =>
        {
            await using var database = await OwnerDatabase.OpenAsync(cancellation);
            await using var services = new ServiceCollection()
                .AddSingleton(TimeProvider.System)
                .AddLogging()
                .AddPortalData(Settings.Owner)
                .AddRunQueue()
                .AddPortalHandlers()
                .AddDemo()
                .BuildServiceProvider();
            await using var scope = services.CreateAsyncScope();
            var loader = scope.ServiceProvider.GetRequiredService<DemoLoader>();
            foreach (var line in await loader.LoadAsync(parsed.GetRequiredValue(file).FullName, cancellation))
                Console.WriteLine(line);
            return Terminal.Done;
        }));
        return command;
    }
}
