namespace PathPortal.Portal.Data.Queries;

/// <summary>A file as it was stored.</summary>
public sealed record StoredFile(string FileName, byte[] Bytes, string Sha256);
