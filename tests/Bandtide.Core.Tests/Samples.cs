using Bandtide.Core.Geography;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests;

/// <summary>Generators of domain values that several property tests draw from.</summary>
internal static class Samples
{
    /// <summary>Any point of the Earth.</summary>
    public static Gen<GeoPoint> Point { get; } =
        Gen.Select(Gen.Double[-90, 90], Gen.Double[-180, 180], (latitude, longitude) => new GeoPoint(latitude, longitude));

    /// <summary>Any second of the years 1950 to 2050.</summary>
    public static Gen<DateTimeOffset> Instant { get; } =
        Gen.Int[0, (int)(new DateTime(2051, 1, 1) - new DateTime(1950, 1, 1)).TotalMinutes]
            .Select(minutes => new DateTimeOffset(1950, 1, 1, 0, 0, 0, TimeSpan.Zero).AddMinutes(minutes));

    /// <summary>Any month of the years 1950 to 2050.</summary>
    public static Gen<YearMonth> Month { get; } =
        Gen.Select(Gen.Int[1950, 2050], Gen.Int[1, 12], (year, month) => new YearMonth(year, month));
}
