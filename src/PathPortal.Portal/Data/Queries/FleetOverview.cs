namespace PathPortal.Portal.Data.Queries;

/// <summary>Programs × cells: one figure per pair of the newest revision.</summary>
public sealed record FleetOverview(
    IReadOnlyList<FleetOverview.Plant> Plants, IReadOnlyList<FleetOverview.Part> Parts, IReadOnlyList<string> Processes,
    IReadOnlyList<FleetOverview.Cell> Cells, IReadOnlyList<FleetOverview.Program> Programs, DateTimeOffset? WorkerLastSeen)
{
    public sealed record Plant(Guid Id, string Name, string TimeZone);

    public sealed record Part(Guid Id, string Name);

    public sealed record Cell(Guid Id, string Name, Guid PlantId);

    public sealed record Program(
        Guid Id, string Name, string Process, Guid PlantId, Guid PartId, int LatestNumber, IReadOnlyDictionary<Guid, FleetFigure> Figures)
    {
        /// <summary>Weight of its worst cell; a program without any figure comes last.</summary>
        public double Weight => Figures.Count == 0 ? -2 : Figures.Values.Max(f => f.Weight);
    }
}
