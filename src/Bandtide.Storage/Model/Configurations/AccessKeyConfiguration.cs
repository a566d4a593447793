using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class AccessKeyConfiguration : IEntityTypeConfiguration<AccessKeyRow>
{
    public void Configure(EntityTypeBuilder<AccessKeyRow> builder)
    {
        builder.ToTable("access_key");
        builder.HasKey(row => row.Id).HasName("pk_access_key");
        builder.HasIndex(row => row.Lookup).HasDatabaseName("ix_access_key_lookup");
        builder.HasIndex(row => row.Hash).IsUnique().HasDatabaseName("ix_access_key_hash");
        builder.HasIndex(row => row.StationId).HasDatabaseName("ix_access_key_station_id");
        builder.HasOne<StationRow>().WithMany().HasForeignKey(row => row.StationId)
            .OnDelete(DeleteBehavior.Restrict).HasConstraintName("fk_access_key_station");
        builder.Property(row => row.Id).HasColumnName("id");
        builder.Property(row => row.Lookup).HasColumnName("lookup");
        builder.Property(row => row.Hash).HasColumnName("hash").HasMaxLength(32);
        builder.Property(row => row.StationId).HasColumnName("station_id");
        builder.Property(row => row.LoopbackOnly).HasColumnName("loopback_only");
        builder.Property(row => row.Note).HasColumnName("note").HasMaxLength(200);
        builder.Property(row => row.CreatedAt).HasColumnName("created_at");
        builder.Property(row => row.RevokedAt).HasColumnName("revoked_at");
    }
}
