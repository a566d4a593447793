using Bandtide.Core.Geography;
using CsCheck;

namespace Bandtide.Core.Tests.Geography;

public sealed class GeoPointTests
{
    [Theory]
    [InlineData(90.001, 0)]
    [InlineData(-90.001, 0)]
    [InlineData(0, 180.001)]
    [InlineData(0, -180.001)]
    [InlineData(double.NaN, 0)]
    [InlineData(0, double.NaN)]
    [InlineData(double.PositiveInfinity, 0)]
    [InlineData(0, double.NegativeInfinity)]
    public void There_is_no_such_point(double latitude, double longitude)
    {
        Assert.False(GeoPoint.TryCreate(latitude, longitude, out _));
        Assert.Throws<ArgumentOutOfRangeException>(() => new GeoPoint(latitude, longitude));
    }

    [Theory]
    [InlineData(90, 180)]
    [InlineData(-90, -180)]
    [InlineData(0, 0)]
    public void Poles_and_antimeridian_are_points(double latitude, double longitude)
    {
        Assert.True(GeoPoint.TryCreate(latitude, longitude, out var point));
        Assert.Equal(new GeoPoint(latitude, longitude), point);
    }

    [Fact]
    public void A_wrapped_angle_is_the_same_direction_in_one_turn() =>
        Gen.Double[-1e6, 1e6].Sample(degrees =>
            Angles.Wrap360(degrees) is >= 0 and < 360 && Angles.Wrap180(degrees) is >= -180 and < 180
            && Math.Abs(Math.Sin(double.DegreesToRadians(degrees)) - Math.Sin(double.DegreesToRadians(Angles.Wrap180(degrees)))) < 1e-6);

    [Theory]
    [InlineData(-1e-20, 0)]
    [InlineData(360, 0)]
    [InlineData(-360, 0)]
    [InlineData(-90, 270)]
    public void Angles_at_the_seam(double degrees, double wrapped) => Assert.Equal(wrapped, Angles.Wrap360(degrees));
}
