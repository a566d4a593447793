using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Model;

/// <summary>The whole store as Entity Framework knows it: the same model for both providers.</summary>
/// <remarks>
/// Names are snake case. Dates are whole days since 1970-01-01, months 12 x year + month - 1, times Unix milliseconds, so
/// that both providers store and order them alike. Small tables are read and written through this context; the large ones
/// (<c>day_sheet</c>, <c>day_revision</c>, <c>month_tile</c>) by hand-written SQL over the same connection.
/// </remarks>
public sealed class BandtideContext(DbContextOptions<BandtideContext> options) : DbContext(options)
{
    internal DbSet<StationRow> Stations => Set<StationRow>();

    internal DbSet<SetupRow> Setups => Set<SetupRow>();

    internal DbSet<RegionRow> Regions => Set<RegionRow>();

    internal DbSet<RegionStationRow> RegionStations => Set<RegionStationRow>();

    internal DbSet<RegionLocatorRow> RegionLocators => Set<RegionLocatorRow>();

    internal DbSet<BandRow> Bands => Set<BandRow>();

    internal DbSet<BandSegmentRow> BandSegments => Set<BandSegmentRow>();

    internal DbSet<AccessKeyRow> AccessKeys => Set<AccessKeyRow>();

    internal DbSet<MonthChangeRow> MonthChanges => Set<MonthChangeRow>();

    /// <inheritdoc/>
    protected override void OnModelCreating(ModelBuilder modelBuilder) =>
        modelBuilder.ApplyConfigurationsFromAssembly(typeof(BandtideContext).Assembly);
}
