using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class DaySheetConfiguration : IEntityTypeConfiguration<DaySheetRow>
{
    public void Configure(EntityTypeBuilder<DaySheetRow> builder)
    {
        builder.ToTable("day_sheet", table => table.HasCheckConstraint(
            "ck_day_sheet_withdrawal", "(cell_count = 0) = (sheet IS NULL) AND (sheet IS NULL) = (checksum IS NULL)"));
        builder.HasKey(row => new { row.StationId, row.Date }).HasName("pk_day_sheet");

        // Finds a copied day.
        builder.HasIndex(row => new { row.StationId, row.Checksum }).HasDatabaseName("ix_day_sheet_checksum");

        // Coverage and lists read this index alone and never touch the sheets.
        builder.HasIndex(row => new { row.StationId, row.Date, row.CellCount, row.HoursMask, row.BandCount })
            .HasDatabaseName("ix_day_sheet_coverage");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_day_sheet_station");
        builder.Property(row => row.StationId).HasColumnName("station_id");
        builder.Property(row => row.Date).HasColumnName("date");
        builder.Property(row => row.ReceivedAt).HasColumnName("received_at");
        builder.Property(row => row.Revision).HasColumnName("revision");
        builder.Property(row => row.CellCount).HasColumnName("cell_count");
        builder.Property(row => row.HoursMask).HasColumnName("hours_mask");
        builder.Property(row => row.BandCount).HasColumnName("band_count");
        builder.Property(row => row.Checksum).HasColumnName("checksum").HasMaxLength(16);
        builder.Property(row => row.Sheet).HasColumnName("sheet");
    }
}
