using Microsoft.AspNetCore.Identity;
using Microsoft.AspNetCore.Identity.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Infrastructure;
using Microsoft.Extensions.DependencyInjection;
using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.History;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data;

/// <summary>Everything the portal stores. Opened by <see cref="PortalDb"/>, and by Identity's own stores for signing in.</summary>
public sealed class PortalDbContext(DbContextOptions<PortalDbContext> options)
    : IdentityUserContext<
        Account, Guid, IdentityUserClaim<Guid>, IdentityUserLogin<Guid>, IdentityUserToken<Guid>, IdentityUserPasskey<Guid>>(options)
{
    private static readonly ServiceProvider IdentityServices =
        new ServiceCollection().Configure<IdentityOptions>(PortalData.ConfigureIdentity).BuildServiceProvider();

    public DbSet<PlantRole> PlantRoles => Set<PlantRole>();

    public DbSet<Plant> Plants => Set<Plant>();

    public DbSet<Part> Parts => Set<Part>();

    public DbSet<ArmModelRecord> ArmModels => Set<ArmModelRecord>();

    public DbSet<ArmModelVersion> ArmModelVersions => Set<ArmModelVersion>();

    public DbSet<Cell> Cells => Set<Cell>();

    public DbSet<CellSetup> CellSetups => Set<CellSetup>();

    public DbSet<CriteriaSheetRecord> CriteriaSheets => Set<CriteriaSheetRecord>();

    public DbSet<CriteriaSheetVersion> CriteriaSheetVersions => Set<CriteriaSheetVersion>();

    public DbSet<PathProgram> Programs => Set<PathProgram>();

    public DbSet<Revision> Revisions => Set<Revision>();

    public DbSet<Assignment> Assignments => Set<Assignment>();

    public DbSet<ControllerFile> ControllerFiles => Set<ControllerFile>();

    public DbSet<Run> Runs => Set<Run>();

    public DbSet<RunRequest> RunRequests => Set<RunRequest>();

    public DbSet<WorkerPresence> Workers => Set<WorkerPresence>();

    public DbSet<Review> Reviews => Set<Review>();

    public DbSet<ReviewTransition> ReviewTransitions => Set<ReviewTransition>();

    public DbSet<Decision> Decisions => Set<Decision>();

    public DbSet<HistoryEntry> History => Set<HistoryEntry>();

    public DbSet<HistoryHead> HistoryHead => Set<HistoryHead>();

    // Identity reads the version of its tables from the services of the process. Tools and tests that have none must build the same tables.
    protected override void OnConfiguring(DbContextOptionsBuilder optionsBuilder)
    {
        if (optionsBuilder.Options.FindExtension<CoreOptionsExtension>()?.ApplicationServiceProvider is null)
            optionsBuilder.UseApplicationServiceProvider(IdentityServices);
    }

    protected override void ConfigureConventions(ModelConfigurationBuilder configurationBuilder)
    {
        base.ConfigureConventions(configurationBuilder);
        // Names survive a reordered enumeration and can be read in a query.
        configurationBuilder.Properties<Role>().HaveConversion<string>().HaveMaxLength(24);
        configurationBuilder.Properties<RunState>().HaveConversion<string>().HaveMaxLength(24);
        configurationBuilder.Properties<Verdict>().HaveConversion<string>().HaveMaxLength(24);
        configurationBuilder.Properties<Criterion>().HaveConversion<string>().HaveMaxLength(24);
        configurationBuilder.Properties<ReviewState>().HaveConversion<string>().HaveMaxLength(24);
        configurationBuilder.Properties<DecisionKind>().HaveConversion<string>().HaveMaxLength(24);
    }

    protected override void OnModelCreating(ModelBuilder builder)
    {
        base.OnModelCreating(builder);
        builder.ApplyConfigurationsFromAssembly(typeof(PortalDbContext).Assembly);
        SnakeCaseNames.Apply(builder.Model);
    }
}
