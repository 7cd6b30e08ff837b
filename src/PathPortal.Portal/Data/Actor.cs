namespace PathPortal.Portal.Data;

/// <summary>Who acts: an account, or a process under a name. The database is told for every transaction.</summary>
public sealed record Actor
{
    private Actor(Guid? accountId, string? name)
    {
        AccountId = accountId;
        Name = name;
    }

    public Guid? AccountId { get; }

    /// <summary>Name of the process; null for an account, whose name is read where it acts.</summary>
    public string? Name { get; }

    public static Actor Of(Guid accountId) => new(accountId, null);

    /// <summary>For what nobody asked for in person: workers, re-checks, commands at a terminal.</summary>
    public static Actor Process(string name) => new(null, name);

    public override string ToString() => AccountId is { } id ? "account " + id : "process " + Name;
}
