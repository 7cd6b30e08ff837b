using PathPortal.Engine.Paths;

namespace PathPortal.Formats.Paths;

/// <summary>A path read from a file, and what the file holds in figures.</summary>
public sealed record PathFile(ToolPath Path, PathReport Report);
