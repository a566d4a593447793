using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class BandSegmentConfiguration : IEntityTypeConfiguration<BandSegmentRow>
{
    public void Configure(EntityTypeBuilder<BandSegmentRow> builder)
    {
        builder.ToTable("band_segment", table => table.HasCheckConstraint("ck_band_segment_edges", "low_hz >= 0 AND high_hz > low_hz"));
        builder.HasKey(row => new { row.BandId, row.LowHz }).HasName("pk_band_segment");
        builder.HasOne<BandRow>().WithMany().HasForeignKey(row => row.BandId)
            .OnDelete(DeleteBehavior.Cascade).HasConstraintName("fk_band_segment_band");
        builder.Property(row => row.BandId).HasColumnName("band_id");
        builder.Property(row => row.LowHz).HasColumnName("low_hz").ValueGeneratedNever();
        builder.Property(row => row.HighHz).HasColumnName("high_hz");
    }
}
