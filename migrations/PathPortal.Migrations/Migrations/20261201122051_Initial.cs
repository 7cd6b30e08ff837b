using System;
using Microsoft.EntityFrameworkCore.Migrations;
using Npgsql.EntityFrameworkCore.PostgreSQL.Metadata;

#nullable disable

namespace PathPortal.Migrations.Migrations
{
    /// <inheritdoc />
    public partial class Initial : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.CreateTable(
                name: "accounts",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    display_name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    disabled_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    administers_company = table.Column<bool>(type: "boolean", nullable: false),
                    user_name = table.Column<string>(type: "character varying(256)", maxLength: 256, nullable: true),
                    normalized_user_name = table.Column<string>(type: "character varying(256)", maxLength: 256, nullable: true),
                    email = table.Column<string>(type: "character varying(256)", maxLength: 256, nullable: true),
                    normalized_email = table.Column<string>(type: "character varying(256)", maxLength: 256, nullable: true),
                    email_confirmed = table.Column<bool>(type: "boolean", nullable: false),
                    password_hash = table.Column<string>(type: "text", nullable: true),
                    security_stamp = table.Column<string>(type: "text", nullable: true),
                    concurrency_stamp = table.Column<string>(type: "text", nullable: true),
                    phone_number = table.Column<string>(type: "character varying(256)", maxLength: 256, nullable: true),
                    phone_number_confirmed = table.Column<bool>(type: "boolean", nullable: false),
                    two_factor_enabled = table.Column<bool>(type: "boolean", nullable: false),
                    lockout_end = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    lockout_enabled = table.Column<bool>(type: "boolean", nullable: false),
                    access_failed_count = table.Column<int>(type: "integer", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_accounts", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "arm_models",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    latest_number = table.Column<int>(type: "integer", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_arm_models", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "criteria_sheets",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    latest_number = table.Column<int>(type: "integer", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_criteria_sheets", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "history",
                columns: table => new
                {
                    sequence = table.Column<long>(type: "bigint", nullable: false),
                    at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    actor_id = table.Column<Guid>(type: "uuid", nullable: true),
                    actor_name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: true),
                    subject_kind = table.Column<string>(type: "character varying(40)", maxLength: 40, nullable: false),
                    subject_id = table.Column<Guid>(type: "uuid", nullable: false),
                    action = table.Column<string>(type: "character varying(40)", maxLength: 40, nullable: false),
                    content = table.Column<byte[]>(type: "bytea", nullable: false),
                    salt = table.Column<byte[]>(type: "bytea", nullable: false),
                    content_digest = table.Column<byte[]>(type: "bytea", nullable: false),
                    previous_hash = table.Column<byte[]>(type: "bytea", nullable: false),
                    hash = table.Column<byte[]>(type: "bytea", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_history", x => x.sequence);
                });

            migrationBuilder.CreateTable(
                name: "history_head",
                columns: table => new
                {
                    id = table.Column<int>(type: "integer", nullable: false),
                    sequence = table.Column<long>(type: "bigint", nullable: false),
                    hash = table.Column<byte[]>(type: "bytea", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_history_head", x => x.id);
                    table.CheckConstraint("ck_history_head_only", "id = 1");
                });

            migrationBuilder.CreateTable(
                name: "parts",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    note = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_parts", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "plants",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    time_zone = table.Column<string>(type: "character varying(64)", maxLength: 64, nullable: false),
                    approvals_required = table.Column<int>(type: "integer", nullable: false),
                    approving_roles = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_plants", x => x.id);
                    table.CheckConstraint("ck_plants_approvals_required", "approvals_required BETWEEN 1 AND 5");
                });

            migrationBuilder.CreateTable(
                name: "workers",
                columns: table => new
                {
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    started_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    last_seen_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_workers", x => x.name);
                });

            migrationBuilder.CreateTable(
                name: "account_claims",
                columns: table => new
                {
                    id = table.Column<int>(type: "integer", nullable: false)
                        .Annotation("Npgsql:ValueGenerationStrategy", NpgsqlValueGenerationStrategy.IdentityByDefaultColumn),
                    user_id = table.Column<Guid>(type: "uuid", nullable: false),
                    claim_type = table.Column<string>(type: "text", nullable: true),
                    claim_value = table.Column<string>(type: "text", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_account_claims", x => x.id);
                    table.ForeignKey(
                        name: "fk_account_claims_user_id",
                        column: x => x.user_id,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "account_logins",
                columns: table => new
                {
                    login_provider = table.Column<string>(type: "character varying(128)", maxLength: 128, nullable: false),
                    provider_key = table.Column<string>(type: "character varying(128)", maxLength: 128, nullable: false),
                    provider_display_name = table.Column<string>(type: "text", nullable: true),
                    user_id = table.Column<Guid>(type: "uuid", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_account_logins", x => new { x.login_provider, x.provider_key });
                    table.ForeignKey(
                        name: "fk_account_logins_user_id",
                        column: x => x.user_id,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "account_passkeys",
                columns: table => new
                {
                    credential_id = table.Column<byte[]>(type: "bytea", maxLength: 1024, nullable: false),
                    user_id = table.Column<Guid>(type: "uuid", nullable: false),
                    data = table.Column<string>(type: "jsonb", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_account_passkeys", x => x.credential_id);
                    table.ForeignKey(
                        name: "fk_account_passkeys_user_id",
                        column: x => x.user_id,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "account_tokens",
                columns: table => new
                {
                    user_id = table.Column<Guid>(type: "uuid", nullable: false),
                    login_provider = table.Column<string>(type: "character varying(128)", maxLength: 128, nullable: false),
                    name = table.Column<string>(type: "character varying(128)", maxLength: 128, nullable: false),
                    value = table.Column<string>(type: "text", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_account_tokens", x => new { x.user_id, x.login_provider, x.name });
                    table.ForeignKey(
                        name: "fk_account_tokens_user_id",
                        column: x => x.user_id,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "arm_model_versions",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    arm_model_id = table.Column<Guid>(type: "uuid", nullable: false),
                    number = table.Column<int>(type: "integer", nullable: false),
                    json = table.Column<string>(type: "text", nullable: false),
                    sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    note = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    created_by = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_arm_model_versions", x => x.id);
                    table.ForeignKey(
                        name: "fk_arm_model_versions_arm_model_id",
                        column: x => x.arm_model_id,
                        principalTable: "arm_models",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_arm_model_versions_created_by",
                        column: x => x.created_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "criteria_sheet_versions",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    criteria_sheet_id = table.Column<Guid>(type: "uuid", nullable: false),
                    number = table.Column<int>(type: "integer", nullable: false),
                    json = table.Column<string>(type: "text", nullable: false),
                    sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    note = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    created_by = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_criteria_sheet_versions", x => x.id);
                    table.ForeignKey(
                        name: "fk_criteria_sheet_versions_created_by",
                        column: x => x.created_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_criteria_sheet_versions_criteria_sheet_id",
                        column: x => x.criteria_sheet_id,
                        principalTable: "criteria_sheets",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "cells",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    latest_setup_number = table.Column<int>(type: "integer", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_cells", x => x.id);
                    table.ForeignKey(
                        name: "fk_cells_plant_id",
                        column: x => x.plant_id,
                        principalTable: "plants",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "plant_roles",
                columns: table => new
                {
                    account_id = table.Column<Guid>(type: "uuid", nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: false),
                    role = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    given_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_plant_roles", x => new { x.account_id, x.plant_id, x.role });
                    table.ForeignKey(
                        name: "fk_plant_roles_account_id",
                        column: x => x.account_id,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_plant_roles_plant_id",
                        column: x => x.plant_id,
                        principalTable: "plants",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "programs",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: false),
                    part_id = table.Column<Guid>(type: "uuid", nullable: false),
                    name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    process = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    criteria_sheet_id = table.Column<Guid>(type: "uuid", nullable: false),
                    created_by = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    latest_number = table.Column<int>(type: "integer", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_programs", x => x.id);
                    table.ForeignKey(
                        name: "fk_programs_created_by",
                        column: x => x.created_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_programs_criteria_sheet_id",
                        column: x => x.criteria_sheet_id,
                        principalTable: "criteria_sheets",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_programs_part_id",
                        column: x => x.part_id,
                        principalTable: "parts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_programs_plant_id",
                        column: x => x.plant_id,
                        principalTable: "plants",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "runs",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: false),
                    digest = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    numerics_version = table.Column<int>(type: "integer", nullable: false),
                    state = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    progress = table.Column<double>(type: "double precision", nullable: false),
                    worker_name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: true),
                    attempts = table.Column<int>(type: "integer", nullable: false),
                    queued_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    started_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    finished_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    verdict = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: true),
                    worst_use = table.Column<double>(type: "double precision", nullable: true),
                    worst_criterion = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: true),
                    cycle_time = table.Column<double>(type: "double precision", nullable: true),
                    summary_json = table.Column<string>(type: "text", nullable: true),
                    bins = table.Column<byte[]>(type: "bytea", nullable: true),
                    error = table.Column<string>(type: "text", nullable: true),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_runs", x => x.id);
                    table.CheckConstraint("ck_runs_bins", "octet_length(bins) <= 65536");
                    table.CheckConstraint("ck_runs_done", "state <> 'Done' OR (verdict IS NOT NULL AND summary_json IS NOT NULL)");
                    table.CheckConstraint("ck_runs_progress", "progress BETWEEN 0 AND 1");
                    table.CheckConstraint("ck_runs_worst_use", "worst_use <> 'NaN'");
                    table.ForeignKey(
                        name: "fk_runs_plant_id",
                        column: x => x.plant_id,
                        principalTable: "plants",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "cell_setups",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    cell_id = table.Column<Guid>(type: "uuid", nullable: false),
                    number = table.Column<int>(type: "integer", nullable: false),
                    arm_model_version_id = table.Column<Guid>(type: "uuid", nullable: false),
                    json = table.Column<string>(type: "text", nullable: false),
                    sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    note = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    created_by = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_cell_setups", x => x.id);
                    table.ForeignKey(
                        name: "fk_cell_setups_arm_model_version_id",
                        column: x => x.arm_model_version_id,
                        principalTable: "arm_model_versions",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_cell_setups_cell_id",
                        column: x => x.cell_id,
                        principalTable: "cells",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_cell_setups_created_by",
                        column: x => x.created_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "assignments",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    program_id = table.Column<Guid>(type: "uuid", nullable: false),
                    cell_id = table.Column<Guid>(type: "uuid", nullable: false),
                    tool_name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    work_frame_name = table.Column<string>(type: "character varying(120)", maxLength: 120, nullable: false),
                    start_joints = table.Column<double[]>(type: "double precision[]", nullable: true),
                    free_turn = table.Column<double>(type: "double precision", nullable: true),
                    created_by = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    retired_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_assignments", x => x.id);
                    table.ForeignKey(
                        name: "fk_assignments_cell_id",
                        column: x => x.cell_id,
                        principalTable: "cells",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_assignments_created_by",
                        column: x => x.created_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_assignments_program_id",
                        column: x => x.program_id,
                        principalTable: "programs",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "revisions",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    program_id = table.Column<Guid>(type: "uuid", nullable: false),
                    number = table.Column<int>(type: "integer", nullable: false),
                    file_name = table.Column<string>(type: "character varying(255)", maxLength: 255, nullable: false),
                    format = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    source = table.Column<byte[]>(type: "bytea", nullable: false),
                    sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    source_size = table.Column<int>(type: "integer", nullable: false),
                    point_count = table.Column<int>(type: "integer", nullable: false),
                    length = table.Column<double>(type: "double precision", nullable: false),
                    planned_time = table.Column<double>(type: "double precision", nullable: true),
                    box_low = table.Column<double[]>(type: "double precision[]", nullable: false),
                    box_high = table.Column<double[]>(type: "double precision[]", nullable: false),
                    remarks = table.Column<string[]>(type: "text[]", nullable: false),
                    note = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    uploaded_by = table.Column<Guid>(type: "uuid", nullable: false),
                    uploaded_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_revisions", x => x.id);
                    table.ForeignKey(
                        name: "fk_revisions_program_id",
                        column: x => x.program_id,
                        principalTable: "programs",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_revisions_uploaded_by",
                        column: x => x.uploaded_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "controller_files",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    revision_id = table.Column<Guid>(type: "uuid", nullable: false),
                    cell_id = table.Column<Guid>(type: "uuid", nullable: false),
                    file_name = table.Column<string>(type: "character varying(255)", maxLength: 255, nullable: false),
                    bytes = table.Column<byte[]>(type: "bytea", nullable: false),
                    size = table.Column<int>(type: "integer", nullable: false),
                    sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    attached_by = table.Column<Guid>(type: "uuid", nullable: false),
                    attached_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_controller_files", x => x.id);
                    table.ForeignKey(
                        name: "fk_controller_files_attached_by",
                        column: x => x.attached_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_controller_files_cell_id",
                        column: x => x.cell_id,
                        principalTable: "cells",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_controller_files_revision_id",
                        column: x => x.revision_id,
                        principalTable: "revisions",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "reviews",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    plant_id = table.Column<Guid>(type: "uuid", nullable: false),
                    revision_id = table.Column<Guid>(type: "uuid", nullable: false),
                    assignment_id = table.Column<Guid>(type: "uuid", nullable: false),
                    created_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    state = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    round = table.Column<int>(type: "integer", nullable: false),
                    submitted_by = table.Column<Guid>(type: "uuid", nullable: true),
                    submitted_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: true),
                    approvals_required = table.Column<int>(type: "integer", nullable: false),
                    approvals_given = table.Column<int>(type: "integer", nullable: false),
                    latest_transition = table.Column<int>(type: "integer", nullable: false),
                    xmin = table.Column<uint>(type: "xid", rowVersion: true, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_reviews", x => x.id);
                    table.CheckConstraint("ck_reviews_approved", "state NOT IN ('Approved', 'Proved', 'Released') OR approvals_given >= approvals_required");
                    table.CheckConstraint("ck_reviews_submitted", "round = 0 OR (submitted_by IS NOT NULL AND approvals_required >= 1)");
                    table.ForeignKey(
                        name: "fk_reviews_assignment_id",
                        column: x => x.assignment_id,
                        principalTable: "assignments",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_reviews_plant_id",
                        column: x => x.plant_id,
                        principalTable: "plants",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_reviews_revision_id",
                        column: x => x.revision_id,
                        principalTable: "revisions",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_reviews_submitted_by",
                        column: x => x.submitted_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "run_requests",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    run_id = table.Column<Guid>(type: "uuid", nullable: true),
                    problem = table.Column<string>(type: "text", nullable: true),
                    revision_id = table.Column<Guid>(type: "uuid", nullable: false),
                    assignment_id = table.Column<Guid>(type: "uuid", nullable: false),
                    cell_setup_id = table.Column<Guid>(type: "uuid", nullable: false),
                    criteria_sheet_version_id = table.Column<Guid>(type: "uuid", nullable: false),
                    requested_by = table.Column<Guid>(type: "uuid", nullable: true),
                    requested_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_run_requests", x => x.id);
                    table.CheckConstraint("ck_run_requests_run_or_problem", "(run_id IS NULL) <> (problem IS NULL)");
                    table.ForeignKey(
                        name: "fk_run_requests_assignment_id",
                        column: x => x.assignment_id,
                        principalTable: "assignments",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_run_requests_cell_setup_id",
                        column: x => x.cell_setup_id,
                        principalTable: "cell_setups",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_run_requests_criteria_sheet_version_id",
                        column: x => x.criteria_sheet_version_id,
                        principalTable: "criteria_sheet_versions",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_run_requests_requested_by",
                        column: x => x.requested_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_run_requests_revision_id",
                        column: x => x.revision_id,
                        principalTable: "revisions",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_run_requests_run_id",
                        column: x => x.run_id,
                        principalTable: "runs",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "review_transitions",
                columns: table => new
                {
                    review_id = table.Column<Guid>(type: "uuid", nullable: false),
                    number = table.Column<int>(type: "integer", nullable: false),
                    from_state = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    to_state = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    moved_by = table.Column<Guid>(type: "uuid", nullable: true),
                    why = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    moved_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_review_transitions", x => new { x.review_id, x.number });
                    table.ForeignKey(
                        name: "fk_review_transitions_by",
                        column: x => x.moved_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_review_transitions_review_id",
                        column: x => x.review_id,
                        principalTable: "reviews",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "decisions",
                columns: table => new
                {
                    id = table.Column<Guid>(type: "uuid", nullable: false),
                    review_id = table.Column<Guid>(type: "uuid", nullable: false),
                    round = table.Column<int>(type: "integer", nullable: false),
                    kind = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    decided_by = table.Column<Guid>(type: "uuid", nullable: false),
                    decided_at = table.Column<DateTimeOffset>(type: "timestamp with time zone", nullable: false),
                    uploaded_by = table.Column<Guid>(type: "uuid", nullable: false),
                    submitted_by = table.Column<Guid>(type: "uuid", nullable: false),
                    run_request_id = table.Column<Guid>(type: "uuid", nullable: false),
                    revision_sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    setup_sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    criteria_sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    run_digest = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: false),
                    controller_file_sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: true),
                    meaning = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    reason = table.Column<string>(type: "character varying(2000)", maxLength: 2000, nullable: false),
                    samples = table.Column<byte[]>(type: "bytea", nullable: true),
                    samples_sha256 = table.Column<string>(type: "character(64)", fixedLength: true, maxLength: 64, nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_decisions", x => x.id);
                    table.CheckConstraint("ck_decisions_four_eyes", "decided_by <> uploaded_by AND decided_by <> submitted_by");
                    table.CheckConstraint("ck_decisions_samples", "(samples IS NULL) = (samples_sha256 IS NULL)");
                    table.ForeignKey(
                        name: "fk_decisions_decided_by",
                        column: x => x.decided_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_decisions_review_id",
                        column: x => x.review_id,
                        principalTable: "reviews",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_decisions_run_request_id",
                        column: x => x.run_request_id,
                        principalTable: "run_requests",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_decisions_submitted_by",
                        column: x => x.submitted_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                    table.ForeignKey(
                        name: "fk_decisions_uploaded_by",
                        column: x => x.uploaded_by,
                        principalTable: "accounts",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateIndex(
                name: "ix_account_claims_user_id",
                table: "account_claims",
                column: "user_id");

            migrationBuilder.CreateIndex(
                name: "ix_account_logins_user_id",
                table: "account_logins",
                column: "user_id");

            migrationBuilder.CreateIndex(
                name: "ix_account_passkeys_user_id",
                table: "account_passkeys",
                column: "user_id");

            migrationBuilder.CreateIndex(
                name: "ix_accounts_normalized_email",
                table: "accounts",
                column: "normalized_email");

            migrationBuilder.CreateIndex(
                name: "ix_accounts_normalized_user_name",
                table: "accounts",
                column: "normalized_user_name",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_arm_model_versions_arm_model_id_number",
                table: "arm_model_versions",
                columns: new[] { "arm_model_id", "number" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_arm_model_versions_created_by",
                table: "arm_model_versions",
                column: "created_by");

            migrationBuilder.CreateIndex(
                name: "ix_arm_models_name",
                table: "arm_models",
                column: "name",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_assignments_cell_id",
                table: "assignments",
                column: "cell_id");

            migrationBuilder.CreateIndex(
                name: "ix_assignments_created_by",
                table: "assignments",
                column: "created_by");

            migrationBuilder.CreateIndex(
                name: "ix_assignments_program_id_cell_id",
                table: "assignments",
                columns: new[] { "program_id", "cell_id" },
                unique: true,
                filter: "retired_at IS NULL");

            migrationBuilder.CreateIndex(
                name: "ix_cell_setups_arm_model_version_id",
                table: "cell_setups",
                column: "arm_model_version_id");

            migrationBuilder.CreateIndex(
                name: "ix_cell_setups_cell_id_number",
                table: "cell_setups",
                columns: new[] { "cell_id", "number" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_cell_setups_created_by",
                table: "cell_setups",
                column: "created_by");

            migrationBuilder.CreateIndex(
                name: "ix_cells_plant_id_name",
                table: "cells",
                columns: new[] { "plant_id", "name" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_controller_files_attached_by",
                table: "controller_files",
                column: "attached_by");

            migrationBuilder.CreateIndex(
                name: "ix_controller_files_cell_id",
                table: "controller_files",
                column: "cell_id");

            migrationBuilder.CreateIndex(
                name: "ix_controller_files_revision_id_cell_id_attached_at",
                table: "controller_files",
                columns: new[] { "revision_id", "cell_id", "attached_at" });

            migrationBuilder.CreateIndex(
                name: "ix_criteria_sheet_versions_created_by",
                table: "criteria_sheet_versions",
                column: "created_by");

            migrationBuilder.CreateIndex(
                name: "ix_criteria_sheet_versions_criteria_sheet_id_number",
                table: "criteria_sheet_versions",
                columns: new[] { "criteria_sheet_id", "number" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_criteria_sheets_name",
                table: "criteria_sheets",
                column: "name",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_decisions_decided_by",
                table: "decisions",
                column: "decided_by");

            migrationBuilder.CreateIndex(
                name: "ix_decisions_review_id_round_decided_by",
                table: "decisions",
                columns: new[] { "review_id", "round", "decided_by" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_decisions_run_request_id",
                table: "decisions",
                column: "run_request_id");

            migrationBuilder.CreateIndex(
                name: "ix_decisions_submitted_by",
                table: "decisions",
                column: "submitted_by");

            migrationBuilder.CreateIndex(
                name: "ix_decisions_uploaded_by",
                table: "decisions",
                column: "uploaded_by");

            migrationBuilder.CreateIndex(
                name: "ix_history_plant_id_sequence",
                table: "history",
                columns: new[] { "plant_id", "sequence" });

            migrationBuilder.CreateIndex(
                name: "ix_history_subject_id_sequence",
                table: "history",
                columns: new[] { "subject_id", "sequence" });

            migrationBuilder.CreateIndex(
                name: "ix_parts_name",
                table: "parts",
                column: "name",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_plant_roles_plant_id",
                table: "plant_roles",
                column: "plant_id");

            migrationBuilder.CreateIndex(
                name: "ix_plants_name",
                table: "plants",
                column: "name",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_programs_created_by",
                table: "programs",
                column: "created_by");

            migrationBuilder.CreateIndex(
                name: "ix_programs_criteria_sheet_id",
                table: "programs",
                column: "criteria_sheet_id");

            migrationBuilder.CreateIndex(
                name: "ix_programs_part_id",
                table: "programs",
                column: "part_id");

            migrationBuilder.CreateIndex(
                name: "ix_programs_plant_id_name",
                table: "programs",
                columns: new[] { "plant_id", "name" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_review_transitions_by",
                table: "review_transitions",
                column: "moved_by");

            migrationBuilder.CreateIndex(
                name: "ix_reviews_assignment_id",
                table: "reviews",
                column: "assignment_id");

            migrationBuilder.CreateIndex(
                name: "ix_reviews_plant_id_state",
                table: "reviews",
                columns: new[] { "plant_id", "state" });

            migrationBuilder.CreateIndex(
                name: "ix_reviews_revision_id_assignment_id",
                table: "reviews",
                columns: new[] { "revision_id", "assignment_id" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_reviews_submitted_by",
                table: "reviews",
                column: "submitted_by");

            migrationBuilder.CreateIndex(
                name: "ix_revisions_program_id_number",
                table: "revisions",
                columns: new[] { "program_id", "number" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_revisions_uploaded_by",
                table: "revisions",
                column: "uploaded_by");

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_assignment_id",
                table: "run_requests",
                column: "assignment_id");

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_cell_setup_id",
                table: "run_requests",
                column: "cell_setup_id");

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_criteria_sheet_version_id",
                table: "run_requests",
                column: "criteria_sheet_version_id");

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_requested_by",
                table: "run_requests",
                column: "requested_by");

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_revision_id_assignment_id_requested_at",
                table: "run_requests",
                columns: new[] { "revision_id", "assignment_id", "requested_at" });

            migrationBuilder.CreateIndex(
                name: "ix_run_requests_run_id",
                table: "run_requests",
                column: "run_id");

            migrationBuilder.CreateIndex(
                name: "ix_runs_plant_id_digest",
                table: "runs",
                columns: new[] { "plant_id", "digest" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_runs_queued_at",
                table: "runs",
                column: "queued_at",
                filter: "state IN ('Queued', 'Running')");
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.DropTable(
                name: "account_claims");

            migrationBuilder.DropTable(
                name: "account_logins");

            migrationBuilder.DropTable(
                name: "account_passkeys");

            migrationBuilder.DropTable(
                name: "account_tokens");

            migrationBuilder.DropTable(
                name: "controller_files");

            migrationBuilder.DropTable(
                name: "decisions");

            migrationBuilder.DropTable(
                name: "history");

            migrationBuilder.DropTable(
                name: "history_head");

            migrationBuilder.DropTable(
                name: "plant_roles");

            migrationBuilder.DropTable(
                name: "review_transitions");

            migrationBuilder.DropTable(
                name: "workers");

            migrationBuilder.DropTable(
                name: "run_requests");

            migrationBuilder.DropTable(
                name: "reviews");

            migrationBuilder.DropTable(
                name: "cell_setups");

            migrationBuilder.DropTable(
                name: "criteria_sheet_versions");

            migrationBuilder.DropTable(
                name: "runs");

            migrationBuilder.DropTable(
                name: "assignments");

            migrationBuilder.DropTable(
                name: "revisions");

            migrationBuilder.DropTable(
                name: "arm_model_versions");

            migrationBuilder.DropTable(
                name: "cells");

            migrationBuilder.DropTable(
                name: "programs");

            migrationBuilder.DropTable(
                name: "arm_models");

            migrationBuilder.DropTable(
                name: "accounts");

            migrationBuilder.DropTable(
                name: "criteria_sheets");

            migrationBuilder.DropTable(
                name: "parts");

            migrationBuilder.DropTable(
                name: "plants");
        }
    }
}
