using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class RunMapping :
    IEntityTypeConfiguration<Run>, IEntityTypeConfiguration<RunRequest>, IEntityTypeConfiguration<WorkerPresence>
{
    public void Configure(EntityTypeBuilder<Run> builder)
    {
        builder.ToTable("runs", table =>
        {
            table.HasCheckConstraint("ck_runs_bins", "octet_length(bins) <= 65536");
            table.HasCheckConstraint("ck_runs_done", "state <> 'Done' OR (verdict IS NOT NULL AND summary_json IS NOT NULL)");
            // PostgreSQL sorts NaN above everything and an infinite progress is a mistake.
            table.HasCheckConstraint("ck_runs_worst_use", "worst_use <> 'NaN'");
            table.HasCheckConstraint("ck_runs_progress", "progress BETWEEN 0 AND 1");
        });
        builder.Property(r => r.Id).ValueGeneratedNever();
        builder.Property(r => r.Digest).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(r => r.WorkerName).HasMaxLength(Names.MaxName);
        builder.Property(r => r.Version).IsRowVersion();
        builder.Ignore(r => r.IsFinished);
        builder.HasIndex(r => new { r.PlantId, r.Digest }).IsUnique();
        builder.HasIndex(r => r.QueuedAt).HasFilter("state IN ('Queued', 'Running')");
        builder.HasIndex(r => r.BatchId).HasFilter("state IN ('Queued', 'Running')");
        builder.HasOne<Plant>().WithMany().HasForeignKey(r => r.PlantId).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<RunRequest> builder)
    {
        builder.ToTable("run_requests", table =>
            table.HasCheckConstraint("ck_run_requests_run_or_problem", "(run_id IS NULL) <> (problem IS NULL)"));
        builder.Property(r => r.Id).ValueGeneratedNever();
        builder.HasIndex(r => new { r.RevisionId, r.AssignmentId, r.RequestedAt });
        builder.HasOne<Run>().WithMany().HasForeignKey(r => r.RunId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Revision>().WithMany().HasForeignKey(r => r.RevisionId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Assignment>().WithMany().HasForeignKey(r => r.AssignmentId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<CellSetup>().WithMany().HasForeignKey(r => r.CellSetupId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<CriteriaSheetVersion>().WithMany().HasForeignKey(r => r.CriteriaSheetVersionId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(r => r.RequestedBy).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<WorkerPresence> builder)
    {
        builder.ToTable("workers");
        builder.HasKey(w => w.Name);
        builder.Property(w => w.Name).HasMaxLength(Names.MaxName);
    }
}
