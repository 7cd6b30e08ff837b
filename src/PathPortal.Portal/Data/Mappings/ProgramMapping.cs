using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;
using PathPortal.Portal.Domain.Programs;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class ProgramMapping :
    IEntityTypeConfiguration<PathProgram>,
    IEntityTypeConfiguration<Revision>,
    IEntityTypeConfiguration<Assignment>,
    IEntityTypeConfiguration<ControllerFile>
{
    public void Configure(EntityTypeBuilder<PathProgram> builder)
    {
        builder.ToTable("programs");
        builder.Property(p => p.Id).ValueGeneratedNever();
        builder.Property(p => p.Name).HasMaxLength(Names.MaxName);
        builder.Property(p => p.Process).HasMaxLength(Names.MaxName);
        builder.Property(p => p.Version).IsRowVersion();
        builder.HasIndex(p => new { p.PlantId, p.Name }).IsUnique();
        builder.HasOne<Plant>().WithMany().HasForeignKey(p => p.PlantId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Part>().WithMany().HasForeignKey(p => p.PartId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<CriteriaSheetRecord>().WithMany().HasForeignKey(p => p.CriteriaSheetId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(p => p.CreatedBy).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<Revision> builder)
    {
        builder.ToTable("revisions");
        builder.Property(r => r.Id).ValueGeneratedNever();
        builder.Property(r => r.FileName).HasMaxLength(255);
        builder.Property(r => r.Format).HasMaxLength(24);
        builder.Property(r => r.Sha256).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(r => r.Note).HasMaxLength(Names.MaxNote);
        builder.HasIndex(r => new { r.ProgramId, r.Number }).IsUnique();
        builder.HasOne<PathProgram>().WithMany().HasForeignKey(r => r.ProgramId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(r => r.UploadedBy).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<Assignment> builder)
    {
        builder.ToTable("assignments");
        builder.Property(a => a.Id).ValueGeneratedNever();
        builder.Property(a => a.ToolName).HasMaxLength(Names.MaxName);
        builder.Property(a => a.WorkFrameName).HasMaxLength(Names.MaxName);
        builder.Property(a => a.Version).IsRowVersion();
        builder.Ignore(a => a.Terms);
        builder.HasIndex(a => new { a.ProgramId, a.CellId }).IsUnique().HasFilter("retired_at IS NULL");
        builder.HasOne<PathProgram>().WithMany().HasForeignKey(a => a.ProgramId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Cell>().WithMany().HasForeignKey(a => a.CellId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(a => a.CreatedBy).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<ControllerFile> builder)
    {
        builder.ToTable("controller_files");
        builder.Property(f => f.Id).ValueGeneratedNever();
        builder.Property(f => f.FileName).HasMaxLength(255);
        builder.Property(f => f.Sha256).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.HasIndex(f => new { f.RevisionId, f.CellId, f.AttachedAt });
        builder.HasOne<Revision>().WithMany().HasForeignKey(f => f.RevisionId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Cell>().WithMany().HasForeignKey(f => f.CellId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(f => f.AttachedBy).OnDelete(DeleteBehavior.Restrict);
    }
}
