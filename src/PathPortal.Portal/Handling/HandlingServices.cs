using Microsoft.Extensions.DependencyInjection;
using PathPortal.Portal.Handling.Fleet;
using PathPortal.Portal.Handling.History;
using PathPortal.Portal.Handling.People;
using PathPortal.Portal.Handling.Programs;
using PathPortal.Portal.Handling.Reviews;
using PathPortal.Portal.Handling.Runs;
using PathPortal.Portal.Jobs;

namespace PathPortal.Portal.Handling;

/// <summary>Registers every handler. They keep nothing between calls.</summary>
public static class HandlingServices
{
    /// <summary>Needs AddPortalData and AddRunQueue.</summary>
    public static IServiceCollection AddPortalHandlers(this IServiceCollection services) => services
        .AddRunSamples()
        .AddSingleton<AddCell>()
        .AddSingleton<SaveArmModel>()
        .AddSingleton<SaveCellSetup>()
        .AddSingleton<SaveCriteriaSheet>()
        .AddSingleton<VerifyHistory>()
        .AddSingleton<CreatePlant>()
        .AddSingleton<SetPlantRole>()
        .AddSingleton<DisableAccount>()
        .AddScoped<CreateAccount>()
        .AddScoped<Reauthenticate>()
        .AddSingleton<RunRequester>()
        .AddSingleton<CreatePart>()
        .AddSingleton<CreateProgram>()
        .AddSingleton<AssignProgram>()
        .AddSingleton<UploadRevision>()
        .AddSingleton<AttachControllerFile>()
        .AddSingleton<SubmitForReview>()
        .AddSingleton<DecideReview>()
        .AddSingleton<WithdrawReview>();
}
