using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class MonthTileConfiguration : IEntityTypeConfiguration<MonthTileRow>
{
    public void Configure(EntityTypeBuilder<MonthTileRow> builder)
    {
        builder.ToTable("month_tile");
        builder.HasKey(row => new { row.StationId, row.Month, row.Measure }).HasName("pk_month_tile");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_month_tile_station");
        builder.Property(row => row.StationId).HasColumnName("station_id");
        builder.Property(row => row.Month).HasColumnName("month");
        builder.Property(row => row.Measure).HasColumnName("measure").HasConversion<int>();
        builder.Property(row => row.Tile).HasColumnName("tile");
    }
}
