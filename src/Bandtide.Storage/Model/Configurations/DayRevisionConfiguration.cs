using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class DayRevisionConfiguration : IEntityTypeConfiguration<DayRevisionRow>
{
    public void Configure(EntityTypeBuilder<DayRevisionRow> builder)
    {
        builder.ToTable("day_revision");
        builder.HasKey(row => new { row.StationId, row.Date, row.Revision }).HasName("pk_day_revision");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_day_revision_station");
        builder.Property(row => row.StationId).HasColumnName("station_id");
        builder.Property(row => row.Date).HasColumnName("date");
        builder.Property(row => row.Revision).HasColumnName("revision");
        builder.Property(row => row.ReceivedAt).HasColumnName("received_at");
        builder.Property(row => row.CellCount).HasColumnName("cell_count");
        builder.Property(row => row.HoursMask).HasColumnName("hours_mask");
        builder.Property(row => row.BandCount).HasColumnName("band_count");
        builder.Property(row => row.Checksum).HasColumnName("checksum").HasMaxLength(16);
        builder.Property(row => row.Sheet).HasColumnName("sheet");
    }
}
