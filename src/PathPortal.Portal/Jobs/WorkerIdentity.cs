using System.Globalization;

namespace PathPortal.Portal.Jobs;

/// <summary>This worker process's name, unique among all that ever ran: on the job engine, in the runs it takes and where it says it is alive.</summary>
public sealed class WorkerIdentity
{
    private const int LongestMachineName = 60;

    public string Name { get; } = string.Create(
        CultureInfo.InvariantCulture,
        $"{Environment.MachineName[..Math.Min(LongestMachineName, Environment.MachineName.Length)]}/{Environment.ProcessId}/{Guid.NewGuid().ToString("N")[..8]}");

    public override string ToString() => Name;
}
