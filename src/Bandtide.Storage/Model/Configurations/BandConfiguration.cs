using Bandtide.Core;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class BandConfiguration : IEntityTypeConfiguration<BandRow>
{
    public void Configure(EntityTypeBuilder<BandRow> builder)
    {
        builder.ToTable("band");
        builder.HasKey(row => row.Id).HasName("pk_band");
        builder.HasIndex(row => row.Code).IsUnique().HasDatabaseName("ix_band_code");
        builder.Property(row => row.Id).HasColumnName("id").ValueGeneratedNever();
        builder.Property(row => row.Code).HasColumnName("code").HasMaxLength(Codes.MaxLength);
        builder.Property(row => row.Layer).HasColumnName("layer").HasConversion<string>().HasMaxLength(10);
        builder.Property(row => row.Name).HasColumnName("name").HasMaxLength(200);
    }
}
