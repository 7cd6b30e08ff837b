namespace PathPortal.Portal.Domain.Fleet;

/// <summary>A definition as the canonical JSON it was saved as; text, not jsonb, because the database must not touch what is hashed.</summary>
/// <param name="Json">Canonical text; its UTF-8 bytes are what <paramref name="Sha256"/> covers.</param>
public sealed record StoredDocument(string Json, string Sha256)
{
    public static StoredDocument Of(string json) => new(json, Sha256Text.Of(json));
}
