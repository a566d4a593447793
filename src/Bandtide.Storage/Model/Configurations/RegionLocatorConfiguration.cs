using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class RegionLocatorConfiguration : IEntityTypeConfiguration<RegionLocatorRow>
{
    public void Configure(EntityTypeBuilder<RegionLocatorRow> builder)
    {
        builder.ToTable("region_locator");
        builder.HasKey(row => new { row.RegionId, row.Locator }).HasName("pk_region_locator");
        builder.HasOne<RegionRow>().WithMany().HasForeignKey(row => row.RegionId)
            .OnDelete(DeleteBehavior.Cascade).HasConstraintName("fk_region_locator_region");
        builder.Property(row => row.RegionId).HasColumnName("region_id");
        builder.Property(row => row.Locator).HasColumnName("locator").HasMaxLength(4);
    }
}
