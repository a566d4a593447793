using Bandtide.Core;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class StationConfiguration : IEntityTypeConfiguration<StationRow>
{
    public void Configure(EntityTypeBuilder<StationRow> builder)
    {
        builder.ToTable("station", table => table.HasCheckConstraint("ck_station_itu_region", "itu_region BETWEEN 1 AND 3"));
        builder.HasKey(row => row.Id).HasName("pk_station");
        builder.HasIndex(row => row.Code).IsUnique().HasDatabaseName("ix_station_code");
        builder.Property(row => row.Id).HasColumnName("id");
        builder.Property(row => row.Code).HasColumnName("code").HasMaxLength(Codes.MaxLength);
        builder.Property(row => row.Name).HasColumnName("name").HasMaxLength(200);
        builder.Property(row => row.LatitudeDegrees).HasColumnName("latitude");
        builder.Property(row => row.LongitudeDegrees).HasColumnName("longitude");
        builder.Property(row => row.LevelUnit).HasColumnName("level_unit").HasConversion<string>().HasMaxLength(20);
        builder.Property(row => row.ItuRegion).HasColumnName("itu_region");
        builder.Property(row => row.CreatedAt).HasColumnName("created_at");
    }
}
