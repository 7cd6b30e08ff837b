using Microsoft.AspNetCore.Identity;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;
using PathPortal.Portal.Domain;
using PathPortal.Portal.Domain.Fleet;
using PathPortal.Portal.Domain.People;

namespace PathPortal.Portal.Data.Mappings;

internal sealed class PeopleMapping :
    IEntityTypeConfiguration<Account>,
    IEntityTypeConfiguration<PlantRole>,
    IEntityTypeConfiguration<IdentityUserClaim<Guid>>,
    IEntityTypeConfiguration<IdentityUserLogin<Guid>>,
    IEntityTypeConfiguration<IdentityUserToken<Guid>>,
    IEntityTypeConfiguration<IdentityUserPasskey<Guid>>
{
    public void Configure(EntityTypeBuilder<Account> builder)
    {
        builder.ToTable("accounts");
        builder.Property(a => a.DisplayName).HasMaxLength(Names.MaxName);
    }

    public void Configure(EntityTypeBuilder<PlantRole> builder)
    {
        builder.ToTable("plant_roles");
        builder.HasKey(r => new { r.AccountId, r.PlantId, r.Role });
        builder.HasOne<Account>().WithMany().HasForeignKey(r => r.AccountId).OnDelete(DeleteBehavior.Restrict);
        builder.HasOne<Plant>().WithMany().HasForeignKey(r => r.PlantId).OnDelete(DeleteBehavior.Restrict);
    }

    public void Configure(EntityTypeBuilder<IdentityUserClaim<Guid>> builder) => builder.ToTable("account_claims");

    public void Configure(EntityTypeBuilder<IdentityUserLogin<Guid>> builder) => builder.ToTable("account_logins");

    public void Configure(EntityTypeBuilder<IdentityUserToken<Guid>> builder) => builder.ToTable("account_tokens");

    public void Configure(EntityTypeBuilder<IdentityUserPasskey<Guid>> builder) => builder.ToTable("account_passkeys");
}
