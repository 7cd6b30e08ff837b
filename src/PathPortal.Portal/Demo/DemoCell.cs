using PathPortal.Formats.Documents;

namespace PathPortal.Portal.Demo;

/// <summary>One invented cell: where it stands, what it carries, and why it is in the demo.</summary>
public sealed record DemoCell(string Plant, string Name, string Arm, string Note, CellSetupDocument Setup);
