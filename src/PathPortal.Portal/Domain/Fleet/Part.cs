namespace PathPortal.Portal.Domain.Fleet;

/// <summary>Something the company makes; its programs run on cells of several plants. Shared by the company.</summary>
public sealed class Part
{
    public Part(string name, string note, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        Name = name;
        Note = note;
        CreatedAt = at;
    }

    private Part()
    {
    }

    public Guid Id { get; private set; }

    public string Name { get; private set; } = "";

    public string Note { get; private set; } = "";

    public DateTimeOffset CreatedAt { get; private set; }

    public DateTimeOffset? RetiredAt { get; private set; }

    public void Retire(DateTimeOffset at) => RetiredAt ??= at;
}
