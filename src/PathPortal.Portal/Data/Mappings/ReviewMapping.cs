using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;
using PathPortal.Portal.Domain.Reviews;
using PathPortal.Portal.Domain.Runs;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class ReviewMapping :
    IEntityTypeConfiguration<Review>, IEntityTypeConfiguration<ReviewTransition>, IEntityTypeConfiguration<Decision>
{
    public void Configure(EntityTypeBuilder<Review> builder)
    {
        builder.ToTable("reviews", table =>
        {
            table.HasCheckConstraint("ck_reviews_submitted", "round = 0 OR (submitted_by IS NOT NULL AND approvals_required >= 1)");
            table.HasCheckConstraint(
                "ck_reviews_approved",
                "state NOT IN ('Approved', 'Proved', 'Released') OR approvals_given >= approvals_required");
        });
        builder.Property(r => r.Id).ValueGeneratedNever();
        builder.Property(r => r.Version).IsRowVersion();
        builder.HasIndex(r => new { r.RevisionId, r.AssignmentId }).IsUnique();
        builder.HasIndex(r => new { r.PlantId, r.State });
        builder.HasOne<Plant>().WithMany().HasForeignKey(r => r.PlantId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Revision>().WithMany().HasForeignKey(r => r.RevisionId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Assignment>().WithMany().HasForeignKey(r => r.AssignmentId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(r => r.SubmittedBy).OnDelete(DeleteBehavior.Restrict);
        builder.HasMany(r => r.Transitions).WithOne().HasForeignKey(t => t.ReviewId).OnDelete(DeleteBehavior.Restrict);
        builder.HasMany(r => r.Decisions).WithOne().HasForeignKey(d => d.ReviewId).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<ReviewTransition> builder)
    {
        builder.ToTable("review_transitions");
        builder.HasKey(t => new { t.ReviewId, t.Number });
        builder.Property(t => t.Number).ValueGeneratedNever();
        builder.Property(t => t.Why).HasMaxLength(Names.MaxNote);
        builder.Property(t => t.From).HasColumnName("from_state");
        builder.Property(t => t.To).HasColumnName("to_state");
        builder.Property(t => t.By).HasColumnName("moved_by");
        builder.Property(t => t.At).HasColumnName("moved_at");
        builder.HasOne<Account>().WithMany().HasForeignKey(t => t.By).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<Decision> builder)
    {
        builder.ToTable("decisions", table =>
        {
            table.HasCheckConstraint("ck_decisions_four_eyes", "decided_by <> uploaded_by AND decided_by <> submitted_by");
            table.HasCheckConstraint("ck_decisions_samples", "(samples IS NULL) = (samples_sha256 IS NULL)");
        });
        builder.Property(d => d.Id).ValueGeneratedNever();
        foreach (var digest in new[] { "RevisionSha256", "SetupSha256", "CriteriaSha256", "RunDigest", "ControllerFileSha256", "SamplesSha256" })
            builder.Property<string>(digest).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(d => d.ControllerFileSha256).IsRequired(false);
        builder.Property(d => d.SamplesSha256).IsRequired(false);
        builder.Property(d => d.Meaning).HasMaxLength(Names.MaxNote);
        builder.Property(d => d.Reason).HasMaxLength(Names.MaxNote);
        builder.Ignore(d => d.Evidence);
        builder.HasIndex(d => new { d.ReviewId, d.Round, d.DecidedBy }).IsUnique();
        builder.HasOne<Account>().WithMany().HasForeignKey(d => d.DecidedBy).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(d => d.UploadedBy).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(d => d.SubmittedBy).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<RunRequest>().WithMany().HasForeignKey(d => d.RunRequestId).OnDelete(DeleteBehavior.Restrict);
    }
}
