namespace Bandtide.Core.Geography;

/// <summary>Angles in degrees brought into one turn.</summary>
public static class Angles
{
    /// <summary>The same direction in 0 up to but not including 360.</summary>
    public static double Wrap360(double degrees)
    {
        var turn = degrees - 360 * Math.Floor(degrees / 360);

        // A tiny negative angle rounds up to the full turn.
        return turn < 360 ? turn : 0;
    }

    /// <summary>The same direction in -180 up to but not including 180.</summary>
    public static double Wrap180(double degrees) => Wrap360(degrees + 180) - 180;
}
