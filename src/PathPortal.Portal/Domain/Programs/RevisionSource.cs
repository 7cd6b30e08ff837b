namespace PathPortal.Portal.Domain.Programs;

/// <summary>The uploaded file.</summary>
/// <param name="Format">Name of the reader that understood it, such as "csv".</param>
public sealed record RevisionSource(string FileName, string Format, byte[] Bytes);
