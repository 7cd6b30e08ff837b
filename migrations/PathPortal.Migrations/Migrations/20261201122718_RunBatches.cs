using System;
using Microsoft.EntityFrameworkCore.Migrations;

#nullable disable

namespace PathPortal.Migrations.Migrations
{
    /// <inheritdoc />
    public partial class RunBatches : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.AddColumn<Guid>(
                name: "batch_id",
                table: "runs",
                type: "uuid",
                nullable: true);

            migrationBuilder.CreateIndex(
                name: "ix_runs_batch_id",
                table: "runs",
                column: "batch_id",
                filter: "state IN ('Queued', 'Running')");
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.DropIndex(
                name: "ix_runs_batch_id",
                table: "runs");

            migrationBuilder.DropColumn(
                name: "batch_id",
                table: "runs");
        }
    }
}
