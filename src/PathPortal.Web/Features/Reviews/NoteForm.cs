namespace PathPortal.Web.Features.Reviews;

public sealed class NoteForm
{
    public string? Why { get; set; }
}
