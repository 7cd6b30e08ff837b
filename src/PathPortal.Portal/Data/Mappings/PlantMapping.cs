using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.ChangeTracking;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class PlantMapping : IEntityTypeConfiguration<Plant>, IEntityTypeConfiguration<Part>
{
    public void Configure(EntityTypeBuilder<Plant> builder)
    {
        builder.ToTable("plants", table =>
            table.HasCheckConstraint("ck_plants_approvals_required", "approvals_required BETWEEN 1 AND 5"));
        builder.Property(p => p.Id).ValueGeneratedNever();
        builder.Property(p => p.Name).HasMaxLength(Names.MaxName);
        builder.Property(p => p.TimeZone).HasMaxLength(64);
        builder.Property(p => p.ApprovingRoles).HasMaxLength(120).HasConversion(
            roles => string.Join(',', roles),
            text => text.Split(',').Select(Enum.Parse<Role>).ToArray(),
            new ValueComparer<IReadOnlyList<Role>>(
                (a, b) => a!.SequenceEqual(b!), roles => roles.Aggregate(0, HashCode.Combine), roles => roles.ToArray()));
        builder.Property(p => p.Version).IsRowVersion();
        builder.HasIndex(p => p.Name).IsUnique();
    }

    public void Configure(EntityTypeBuilder<Part> builder)
    {
        builder.ToTable("parts");
        builder.Property(p => p.Id).ValueGeneratedNever();
        builder.Property(p => p.Name).HasMaxLength(Names.MaxName);
        builder.Property(p => p.Note).HasMaxLength(Names.MaxNote);
        builder.HasIndex(p => p.Name).IsUnique();
    }
}
