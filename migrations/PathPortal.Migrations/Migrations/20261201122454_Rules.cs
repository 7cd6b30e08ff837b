using Microsoft.EntityFrameworkCore.Migrations;

#nullable disable

namespace PathPortal.Migrations.Migrations
{
    /// <inheritdoc />
    public partial class Rules : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.Sql(EmbeddedSql.Read("Rules"));
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            throw new NotSupportedException("The rules of the database are not taken back; restore a backup instead.");
        }
    }
}
