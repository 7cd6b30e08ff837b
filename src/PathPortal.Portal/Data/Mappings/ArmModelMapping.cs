using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class ArmModelMapping : IEntityTypeConfiguration<ArmModelRecord>, IEntityTypeConfiguration<ArmModelVersion>
{
    public void Configure(EntityTypeBuilder<ArmModelRecord> builder)
    {
        builder.ToTable("arm_models");
        builder.Property(m => m.Id).ValueGeneratedNever();
        builder.Property(m => m.Name).HasMaxLength(Names.MaxName);
        builder.Property(m => m.Version).IsRowVersion();
        builder.HasIndex(m => m.Name).IsUnique();
    }

    public void Configure(EntityTypeBuilder<ArmModelVersion> builder)
    {
        builder.ToTable("arm_model_versions");
        builder.Property(v => v.Id).ValueGeneratedNever();
        builder.Property(v => v.Sha256).HasMaxLength(Sha256Text.Length).IsFixedLength();
        builder.Property(v => v.Note).HasMaxLength(Names.MaxNote);
        builder.HasIndex(v => new { v.ArmModelId, v.Number }).IsUnique();
        builder.HasOne<ArmModelRecord>().WithMany().HasForeignKey(v => v.ArmModelId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Account>().WithMany().HasForeignKey(v => v.CreatedBy).OnDelete(DeleteBehavior.Restrict);
    }
}
