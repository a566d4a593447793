using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class RegionStationConfiguration : IEntityTypeConfiguration<RegionStationRow>
{
    public void Configure(EntityTypeBuilder<RegionStationRow> builder)
    {
        builder.ToTable("region_station");
        builder.HasKey(row => new { row.RegionId, row.StationId }).HasName("pk_region_station");
        builder.HasIndex(row => row.StationId).HasDatabaseName("ix_region_station_station_id");
        builder.HasOne<RegionRow>().WithMany().HasForeignKey(row => row.RegionId)
            .OnDelete(DeleteBehavior.Cascade).HasConstraintName("fk_region_station_region");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_region_station_station");
        builder.Property(row => row.RegionId).HasColumnName("region_id");
        builder.Property(row => row.StationId).HasColumnName("station_id");
    }
}
