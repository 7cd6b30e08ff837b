using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class CellMapping : IEntityTypeConfiguration<Cell>, IEntityTypeConfiguration<CellSetup>
{
    public void Configure(EntityTypeBuilder<Cell> builder)
    {
        builder.ToTable("cells");
        builder.Property(c => c.Id).ValueGeneratedNever();
        builder.Property(c => c.Name).HasMaxLength(Names.MaxName);
        builder.Property(c => c.Version).IsRowVersion();
        builder.HasIndex(c => new { c.PlantId, c.Name }).IsUnique();
        builder.HasOne<Plant>().WithMany().HasForeignKey(c => c.PlantId).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<CellSetup> builder)
    {
        builder.ToTable("cell_setups");
        builder.Property(s => s.Id).ValueGeneratedNever();
        builder.Property(s => s.Sha256).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(s => s.Note).HasMaxLength(Names.MaxNote);
        builder.HasIndex(s => new { s.CellId, s.Number }).IsUnique();
        builder.HasOne<Cell>().WithMany().HasForeignKey(s => s.CellId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<ArmModelVersion>().WithMany().HasForeignKey(s => s.ArmModelVersionId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(s => s.CreatedBy).OnDelete(DeleteBehavior.Restrict);
    }
}
