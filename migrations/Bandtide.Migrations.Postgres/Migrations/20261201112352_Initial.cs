using Microsoft.EntityFrameworkCore.Migrations;
using Npgsql.EntityFrameworkCore.PostgreSQL.Metadata;

#nullable disable

namespace Bandtide.Migrations.Postgres.Migrations
{
    /// <inheritdoc />
    public partial class Initial : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.CreateTable(
                name: "band",
                columns: table => new
                {
                    id = table.Column<short>(type: "smallint", nullable: false),
                    code = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    layer = table.Column<string>(type: "character varying(10)", maxLength: 10, nullable: false),
                    name = table.Column<string>(type: "character varying(200)", maxLength: 200, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_band", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "month_change",
                columns: table => new
                {
                    month = table.Column<int>(type: "integer", nullable: false),
                    counter = table.Column<long>(type: "bigint", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_month_change", x => x.month);
                });

            migrationBuilder.CreateTable(
                name: "region",
                columns: table => new
                {
                    id = table.Column<int>(type: "integer", nullable: false)
                        .Annotation("Npgsql:ValueGenerationStrategy", NpgsqlValueGenerationStrategy.IdentityByDefaultColumn),
                    code = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    name = table.Column<string>(type: "character varying(200)", maxLength: 200, nullable: false),
                    kind = table.Column<string>(type: "character varying(10)", maxLength: 10, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_region", x => x.id);
                });

            migrationBuilder.CreateTable(
                name: "station",
                columns: table => new
                {
                    id = table.Column<int>(type: "integer", nullable: false)
                        .Annotation("Npgsql:ValueGenerationStrategy", NpgsqlValueGenerationStrategy.IdentityByDefaultColumn),
                    code = table.Column<string>(type: "character varying(24)", maxLength: 24, nullable: false),
                    name = table.Column<string>(type: "character varying(200)", maxLength: 200, nullable: false),
                    latitude = table.Column<double>(type: "double precision", nullable: false),
                    longitude = table.Column<double>(type: "double precision", nullable: false),
                    level_unit = table.Column<string>(type: "character varying(20)", maxLength: 20, nullable: false),
                    itu_region = table.Column<int>(type: "integer", nullable: false),
                    created_at = table.Column<long>(type: "bigint", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_station", x => x.id);
                    table.CheckConstraint("ck_station_itu_region", "itu_region BETWEEN 1 AND 3");
                });

            migrationBuilder.CreateTable(
                name: "band_segment",
                columns: table => new
                {
                    band_id = table.Column<short>(type: "smallint", nullable: false),
                    low_hz = table.Column<int>(type: "integer", nullable: false),
                    high_hz = table.Column<int>(type: "integer", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_band_segment", x => new { x.band_id, x.low_hz });
                    table.CheckConstraint("ck_band_segment_edges", "low_hz >= 0 AND high_hz > low_hz");
                    table.ForeignKey(
                        name: "fk_band_segment_band",
                        column: x => x.band_id,
                        principalTable: "band",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "region_locator",
                columns: table => new
                {
                    region_id = table.Column<int>(type: "integer", nullable: false),
                    locator = table.Column<string>(type: "character varying(4)", maxLength: 4, nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_region_locator", x => new { x.region_id, x.locator });
                    table.ForeignKey(
                        name: "fk_region_locator_region",
                        column: x => x.region_id,
                        principalTable: "region",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                });

            migrationBuilder.CreateTable(
                name: "access_key",
                columns: table => new
                {
                    id = table.Column<int>(type: "integer", nullable: false)
                        .Annotation("Npgsql:ValueGenerationStrategy", NpgsqlValueGenerationStrategy.IdentityByDefaultColumn),
                    lookup = table.Column<long>(type: "bigint", nullable: false),
                    hash = table.Column<byte[]>(type: "bytea", maxLength: 32, nullable: false),
                    station_id = table.Column<int>(type: "integer", nullable: true),
                    loopback_only = table.Column<bool>(type: "boolean", nullable: false),
                    note = table.Column<string>(type: "character varying(200)", maxLength: 200, nullable: false),
                    created_at = table.Column<long>(type: "bigint", nullable: false),
                    revoked_at = table.Column<long>(type: "bigint", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_access_key", x => x.id);
                    table.ForeignKey(
                        name: "fk_access_key_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "day_revision",
                columns: table => new
                {
                    station_id = table.Column<int>(type: "integer", nullable: false),
                    date = table.Column<int>(type: "integer", nullable: false),
                    revision = table.Column<int>(type: "integer", nullable: false),
                    received_at = table.Column<long>(type: "bigint", nullable: false),
                    cell_count = table.Column<int>(type: "integer", nullable: false),
                    hours_mask = table.Column<int>(type: "integer", nullable: false),
                    band_count = table.Column<int>(type: "integer", nullable: false),
                    checksum = table.Column<byte[]>(type: "bytea", maxLength: 16, nullable: true),
                    sheet = table.Column<byte[]>(type: "bytea", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_day_revision", x => new { x.station_id, x.date, x.revision });
                    table.ForeignKey(
                        name: "fk_day_revision_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "day_sheet",
                columns: table => new
                {
                    station_id = table.Column<int>(type: "integer", nullable: false),
                    date = table.Column<int>(type: "integer", nullable: false),
                    received_at = table.Column<long>(type: "bigint", nullable: false),
                    revision = table.Column<int>(type: "integer", nullable: false),
                    cell_count = table.Column<int>(type: "integer", nullable: false),
                    hours_mask = table.Column<int>(type: "integer", nullable: false),
                    band_count = table.Column<int>(type: "integer", nullable: false),
                    checksum = table.Column<byte[]>(type: "bytea", maxLength: 16, nullable: true),
                    sheet = table.Column<byte[]>(type: "bytea", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_day_sheet", x => new { x.station_id, x.date });
                    table.CheckConstraint("ck_day_sheet_withdrawal", "(cell_count = 0) = (sheet IS NULL) AND (sheet IS NULL) = (checksum IS NULL)");
                    table.ForeignKey(
                        name: "fk_day_sheet_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "month_tile",
                columns: table => new
                {
                    station_id = table.Column<int>(type: "integer", nullable: false),
                    month = table.Column<int>(type: "integer", nullable: false),
                    measure = table.Column<int>(type: "integer", nullable: false),
                    tile = table.Column<byte[]>(type: "bytea", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_month_tile", x => new { x.station_id, x.month, x.measure });
                    table.ForeignKey(
                        name: "fk_month_tile_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "region_station",
                columns: table => new
                {
                    region_id = table.Column<int>(type: "integer", nullable: false),
                    station_id = table.Column<int>(type: "integer", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_region_station", x => new { x.region_id, x.station_id });
                    table.ForeignKey(
                        name: "fk_region_station_region",
                        column: x => x.region_id,
                        principalTable: "region",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Cascade);
                    table.ForeignKey(
                        name: "fk_region_station_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "setup",
                columns: table => new
                {
                    station_id = table.Column<int>(type: "integer", nullable: false),
                    seq = table.Column<int>(type: "integer", nullable: false),
                    valid_from = table.Column<int>(type: "integer", nullable: false),
                    threshold = table.Column<string>(type: "character varying(40)", maxLength: 40, nullable: true),
                    margin_db = table.Column<double>(type: "double precision", nullable: true),
                    averages = table.Column<int>(type: "integer", nullable: true),
                    detector = table.Column<string>(type: "character varying(8)", maxLength: 8, nullable: true),
                    resolution_hz = table.Column<double>(type: "double precision", nullable: true),
                    noise_bandwidth_hz = table.Column<double>(type: "double precision", nullable: true),
                    revisit_seconds = table.Column<double>(type: "double precision", nullable: true),
                    antenna_factor_db = table.Column<double>(type: "double precision", nullable: true),
                    environment = table.Column<string>(type: "character varying(40)", maxLength: 40, nullable: true),
                    receiver = table.Column<string>(type: "text", nullable: true),
                    antenna = table.Column<string>(type: "text", nullable: true),
                    note = table.Column<string>(type: "text", nullable: true)
                },
                constraints: table =>
                {
                    table.PrimaryKey("pk_setup", x => new { x.station_id, x.seq });
                    table.ForeignKey(
                        name: "fk_setup_station",
                        column: x => x.station_id,
                        principalTable: "station",
                        principalColumn: "id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.InsertData(
                table: "month_change",
                columns: new[] { "month", "counter" },
                values: new object[] { 0, 0L });

            migrationBuilder.CreateIndex(
                name: "ix_access_key_hash",
                table: "access_key",
                column: "hash",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_access_key_lookup",
                table: "access_key",
                column: "lookup");

            migrationBuilder.CreateIndex(
                name: "ix_access_key_station_id",
                table: "access_key",
                column: "station_id");

            migrationBuilder.CreateIndex(
                name: "ix_band_code",
                table: "band",
                column: "code",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_day_sheet_checksum",
                table: "day_sheet",
                columns: new[] { "station_id", "checksum" });

            migrationBuilder.CreateIndex(
                name: "ix_day_sheet_coverage",
                table: "day_sheet",
                columns: new[] { "station_id", "date", "cell_count", "hours_mask", "band_count" });

            migrationBuilder.CreateIndex(
                name: "ix_region_code",
                table: "region",
                column: "code",
                unique: true);

            migrationBuilder.CreateIndex(
                name: "ix_region_station_station_id",
                table: "region_station",
                column: "station_id");

            migrationBuilder.CreateIndex(
                name: "ix_station_code",
                table: "station",
                column: "code",
                unique: true);

            StorageTuning.Apply(migrationBuilder);
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.DropTable(
                name: "access_key");

            migrationBuilder.DropTable(
                name: "band_segment");

            migrationBuilder.DropTable(
                name: "day_revision");

            migrationBuilder.DropTable(
                name: "day_sheet");

            migrationBuilder.DropTable(
                name: "month_change");

            migrationBuilder.DropTable(
                name: "month_tile");

            migrationBuilder.DropTable(
                name: "region_locator");

            migrationBuilder.DropTable(
                name: "region_station");

            migrationBuilder.DropTable(
                name: "setup");

            migrationBuilder.DropTable(
                name: "band");

            migrationBuilder.DropTable(
                name: "region");

            migrationBuilder.DropTable(
                name: "station");
        }
    }
}
