namespace PathPortal.Web.Features.Programs;

public sealed class NewProgramForm
{
    public Guid PlantId { get; set; }

    public Guid PartId { get; set; }

    public Guid SheetId { get; set; }

    public string? Name { get; set; }

    public string? Process { get; set; }
}
