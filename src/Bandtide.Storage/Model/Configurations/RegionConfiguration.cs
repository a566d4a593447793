using Bandtide.Core;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class RegionConfiguration : IEntityTypeConfiguration<RegionRow>
{
    public void Configure(EntityTypeBuilder<RegionRow> builder)
    {
        builder.ToTable("region");
        builder.HasKey(row => row.Id).HasName("pk_region");
        builder.HasIndex(row => row.Code).IsUnique().HasDatabaseName("ix_region_code");
        builder.Property(row => row.Id).HasColumnName("id");
        builder.Property(row => row.Code).HasColumnName("code").HasMaxLength(Codes.MaxLength);
        builder.Property(row => row.Name).HasColumnName("name").HasMaxLength(200);
        builder.Property(row => row.Kind).HasColumnName("kind").HasConversion<string>().HasMaxLength(10);
    }
}
