using System.Globalization;
using PathPortal.Portal.Data;
using PathPortal.Portal.Jobs;

var builder = Host.CreateApplicationBuilder(args);
builder.Logging.AddJsonConsole(options =>
{
    options.UseUtcTimestamp = true;
    options.TimestampFormat = "yyyy-MM-ddTHH:mm:ss.fffZ";
});
// Every statement and every step of the job engine would drown what the worker itself has to say.
builder.Logging.AddFilter("Microsoft.EntityFrameworkCore", LogLevel.Warning);
builder.Logging.AddFilter("Quartz", LogLevel.Warning);

var database = builder.Configuration.GetConnectionString("Portal");
if (string.IsNullOrEmpty(database))
{
    await Console.Error.WriteLineAsync("No database is configured: set the connection string named Portal (ConnectionStrings__Portal).");
    return 1;
}

var options = new JobWorkerOptions();
if (builder.Configuration["Worker:Threads"] is { Length: > 0 } threads)
    options = options with { Threads = int.Parse(threads, CultureInfo.InvariantCulture) };
builder.Services.AddPortalData(database);
builder.Services.AddRunWorker(options);
// The worker gives its runs back after its own patience; the rest is for writing that down.
builder.Services.Configure<HostOptions>(host => host.ShutdownTimeout = options.StopPatience + TimeSpan.FromSeconds(5));

await builder.Build().RunAsync();
// Everything was given its time to end. Threads of the job engine that still try to reach a database that is gone must not keep the process.
Environment.Exit(0);
return 0;
