using Microsoft.EntityFrameworkCore.Design;
using PathPortal.Portal.Data;

namespace PathPortal.Migrations;

/// <summary>Lets the migration tool build the model without a host; it needs no database to compare models.</summary>
public sealed class DesignTimeFactory : IDesignTimeDbContextFactory<PortalDbContext>
{
    public PortalDbContext CreateDbContext(string[] args) =>
        new(PortalData.OptionsFor(PortalData.OpenDataSource(
            Environment.GetEnvironmentVariable("PATHPORTAL_OWNER_DB") ?? "Host=127.0.0.1;Database=pathportal;Username=pathportal")));
}
