using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.History;

namespace PathPortal.Portal.Data.Mappings;

// No foreign keys on purpose: the history stands by itself and can be verified and kept without the rest.
internal sealed class HistoryMapping : IEntityTypeConfiguration<HistoryEntry>, IEntityTypeConfiguration<HistoryHead>
{
    public void Configure(EntityTypeBuilder<HistoryEntry> builder)
    {
        builder.ToTable("history");
        builder.HasKey(e => e.Sequence);
        builder.Property(e => e.Sequence).ValueGeneratedNever();
        builder.Property(e => e.ActorName).HasMaxLength(Names.MaxName);
        builder.Property(e => e.SubjectKind).HasMaxLength(40);
        builder.Property(e => e.Action).HasMaxLength(40);
        builder.HasIndex(e => new { e.PlantId, e.Sequence });
        builder.HasIndex(e => new { e.SubjectId, e.Sequence });
    }

    public void Configure(EntityTypeBuilder<HistoryHead> builder)
    {
        builder.ToTable("history_head", table => table.HasCheckConstraint("ck_history_head_only", "id = 1"));
        builder.Property(h => h.Id).ValueGeneratedNever();
    }
}
