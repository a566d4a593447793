using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class SetupConfiguration : IEntityTypeConfiguration<SetupRow>
{
    public void Configure(EntityTypeBuilder<SetupRow> builder)
    {
        builder.ToTable("setup");
        builder.HasKey(row => new { row.StationId, row.Sequence }).HasName("pk_setup");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_setup_station");
        builder.Property(row => row.StationId).HasColumnName("station_id");
        builder.Property(row => row.Sequence).HasColumnName("seq").ValueGeneratedNever();
        builder.Property(row => row.ValidFrom).HasColumnName("valid_from");
        builder.Property(row => row.Threshold).HasColumnName("threshold").HasMaxLength(40);
        builder.Property(row => row.MarginDb).HasColumnName("margin_db");
        builder.Property(row => row.Averages).HasColumnName("averages");
        builder.Property(row => row.Detector).HasColumnName("detector").HasConversion<string>().HasMaxLength(8);
        builder.Property(row => row.ResolutionHz).HasColumnName("resolution_hz");
        builder.Property(row => row.NoiseBandwidthHz).HasColumnName("noise_bandwidth_hz");
        builder.Property(row => row.RevisitSeconds).HasColumnName("revisit_seconds");
        builder.Property(row => row.AntennaFactorDb).HasColumnName("antenna_factor_db");
        builder.Property(row => row.Environment).HasColumnName("environment").HasMaxLength(40);
        builder.Property(row => row.Receiver).HasColumnName("receiver");
        builder.Property(row => row.Antenna).HasColumnName("antenna");
        builder.Property(row => row.Note).HasColumnName("note");
    }
}
