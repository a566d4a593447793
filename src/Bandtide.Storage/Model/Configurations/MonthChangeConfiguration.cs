using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata.Builders;

namespace Bandtide.Storage.Model.Configurations;

internal sealed class MonthChangeConfiguration : IEntityTypeConfiguration<MonthChangeRow>
{
    public void Configure(EntityTypeBuilder<MonthChangeRow> builder)
    {
        builder.ToTable("month_change");
        builder.HasKey(row => row.Month).HasName("pk_month_change");
        builder.Property(row => row.Month).HasColumnName("month").ValueGeneratedNever();
        builder.Property(row => row.Counter).HasColumnName("counter");

        // The row exists from the start, so that changes of the network can lock it.
        builder.HasData(new MonthChangeRow { Month = MonthChangeRow.Network, Counter = 0 });
    }
}
