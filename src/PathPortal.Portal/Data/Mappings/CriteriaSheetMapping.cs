using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class CriteriaSheetMapping : IEntityTypeConfiguration<CriteriaSheetRecord>, IEntityTypeConfiguration<CriteriaSheetVersion>
{
    public void Configure(EntityTypeBuilder<CriteriaSheetRecord> builder)
    {
        builder.ToTable("criteria_sheets");
        builder.Property(m => m.Id).ValueGeneratedNever();
        builder.Property(m => m.Name).HasMaxLength(Names.MaxName);
        builder.Property(m => m.Version).IsRowVersion();
        builder.HasIndex(m => m.Name).IsUnique();
    }

    public void Configure(EntityTypeBuilder<CriteriaSheetVersion> builder)
    {
        builder.ToTable("criteria_sheet_versions");
        builder.Property(v => v.Id).ValueGeneratedNever();
        builder.Property(v => v.Sha256).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(v => v.Note).HasMaxLength(Names.MaxNote);
        builder.HasIndex(v => new { v.CriteriaSheetId, v.Number }).IsUnique();
        builder.HasOne<CriteriaSheetRecord>().WithMany().HasForeignKey(v => v.CriteriaSheetId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(v => v.CreatedBy).OnDelete(DeleteBehavior.Restrict);
    }
}
