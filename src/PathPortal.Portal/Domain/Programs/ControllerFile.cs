namespace PathPortal.Portal.Domain.Programs;

/// <summary>The cell controller's own program for a revision, kept as bytes. A newer one stands beside the older; the newest counts.</summary>
public sealed class ControllerFile
{
    public const int MaxBytes = 32 * 1024 * 1024;

    public ControllerFile(Guid revisionId, Guid cellId, string fileName, byte[] bytes, Guid by, DateTimeOffset at)
    {
        Id = Guid.CreateVersion7(at);
        RevisionId = revisionId;
        CellId = cellId;
        FileName = fileName;
        Bytes = bytes;
        Size = bytes.Length;
        Sha256 = Sha256Text.Of(bytes);
        AttachedBy = by;
        AttachedAt = at;
    }

    private ControllerFile()
    {
    }

    public Guid Id { get; private set; }

    public Guid RevisionId { get; private set; }

    public Guid CellId { get; private set; }

    public string FileName { get; private set; } = "";

    /// <summary>Large: lists must not select it.</summary>
    public byte[] Bytes { get; private set; } = [];

    public int Size { get; private set; }

    public string Sha256 { get; private set; } = "";

    public Guid AttachedBy { get; private set; }

    public DateTimeOffset AttachedAt { get; private set; }
}
