using Npgsql;
using PathPortal.Portal.Data;

namespace PathPortal.Cli;

/// <summary>The database as its owner, checked to be current.</summary>
internal sealed class OwnerDatabase : IAsyncDisposable
{
    private readonly NpgsqlDataSource _source;

    private OwnerDatabase(NpgsqlDataSource source)
    {
        _source = source;
        Db = new PortalDb(PortalData.OptionsFor(source), TimeProvider.System);
    }

    public PortalDb Db { get; }

    public static async Task<OwnerDatabase> OpenAsync(CancellationToken cancellation)
    {
        var source = PortalData.OpenDataSource(Settings.Owner);
        if (await new PortalSchema(source).WhyNotReadyAsync(cancellation) is { } reason)
        {
            await source.DisposeAsync();
            throw new CommandException(reason);
        }
        return new(source);
    }

    public ValueTask DisposeAsync() => _source.DisposeAsync();
}
