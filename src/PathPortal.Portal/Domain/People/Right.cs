namespace PathPortal.Portal.Domain.People;

/// <summary>What can be asked of an account in a plant. Approving is not here: each plant says which roles approve.</summary>
public enum Right
{
    Read,
    EditPrograms,
    UploadRevision,
    SubmitReview,
    AttachControllerFile,
    EditArmModels,
    EditCells,
    EditCriteria,
    ManagePlant,
}
