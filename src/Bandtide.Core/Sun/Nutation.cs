using static Bandtide.Core.Sun.DeltaT;

namespace Bandtide.Core.Sun;

/// <summary>Nodding of the Earth's axis and the tilt it leaves.</summary>
/// <remarks>
/// IAU 1980 theory of nutation, the 63 terms of 0.0003 seconds of arc and more: Meeus, Astronomical Algorithms (2nd ed.),
/// table 22.A, the same as Table A4.3 of NREL/TP-560-34302. Mean obliquity: Laskar (1986), Meeus equation 22.3.
/// </remarks>
/// <param name="LongitudeDegrees">Nutation in longitude, degrees.</param>
/// <param name="ObliquityDegrees">True obliquity of the ecliptic, degrees.</param>
internal readonly record struct Nutation(double LongitudeDegrees, double ObliquityDegrees)
{
    // Multiples of D, M, M', F and omega, then the sine amplitude and its change per century, the cosine amplitude and its
    // change per century, in 0.0001 seconds of arc.
    private static ReadOnlySpan<double> Terms =>
    [
        0, 0, 0, 0, 1, -171996, -174.2, 92025, 8.9, -2, 0, 0, 2, 2, -13187, -1.6, 5736, -3.1,
        0, 0, 0, 2, 2, -2274, -0.2, 977, -0.5, 0, 0, 0, 0, 2, 2062, 0.2, -895, 0.5,
        0, 1, 0, 0, 0, 1426, -3.4, 54, -0.1, 0, 0, 1, 0, 0, 712, 0.1, -7, 0,
        -2, 1, 0, 2, 2, -517, 1.2, 224, -0.6, 0, 0, 0, 2, 1, -386, -0.4, 200, 0,
        0, 0, 1, 2, 2, -301, 0, 129, -0.1, -2, -1, 0, 2, 2, 217, -0.5, -95, 0.3,
        -2, 0, 1, 0, 0, -158, 0, 0, 0, -2, 0, 0, 2, 1, 129, 0.1, -70, 0,
        0, 0, -1, 2, 2, 123, 0, -53, 0, 2, 0, 0, 0, 0, 63, 0, 0, 0,
        0, 0, 1, 0, 1, 63, 0.1, -33, 0, 2, 0, -1, 2, 2, -59, 0, 26, 0,
        0, 0, -1, 0, 1, -58, -0.1, 32, 0, 0, 0, 1, 2, 1, -51, 0, 27, 0,
        -2, 0, 2, 0, 0, 48, 0, 0, 0, 0, 0, -2, 2, 1, 46, 0, -24, 0,
        2, 0, 0, 2, 2, -38, 0, 16, 0, 0, 0, 2, 2, 2, -31, 0, 13, 0,
        0, 0, 2, 0, 0, 29, 0, 0, 0, -2, 0, 1, 2, 2, 29, 0, -12, 0,
        0, 0, 0, 2, 0, 26, 0, 0, 0, -2, 0, 0, 2, 0, -22, 0, 0, 0,
        0, 0, -1, 2, 1, 21, 0, -10, 0, 0, 2, 0, 0, 0, 17, -0.1, 0, 0,
        2, 0, -1, 0, 1, 16, 0, -8, 0, -2, 2, 0, 2, 2, -16, 0.1, 7, 0,
        0, 1, 0, 0, 1, -15, 0, 9, 0, -2, 0, 1, 0, 1, -13, 0, 7, 0,
        0, -1, 0, 0, 1, -12, 0, 6, 0, 0, 0, 2, -2, 0, 11, 0, 0, 0,
        2, 0, -1, 2, 1, -10, 0, 5, 0, 2, 0, 1, 2, 2, -8, 0, 3, 0,
        0, 1, 0, 2, 2, 7, 0, -3, 0, -2, 1, 1, 0, 0, -7, 0, 0, 0,
        0, -1, 0, 2, 2, -7, 0, 3, 0, 2, 0, 0, 2, 1, -7, 0, 3, 0,
        2, 0, 1, 0, 0, 6, 0, 0, 0, -2, 0, 2, 2, 2, 6, 0, -3, 0,
        -2, 0, 1, 2, 1, 6, 0, -3, 0, 2, 0, -2, 0, 1, -6, 0, 3, 0,
        2, 0, 0, 0, 1, -6, 0, 3, 0, 0, -1, 1, 0, 0, 5, 0, 0, 0,
        -2, -1, 0, 2, 1, -5, 0, 3, 0, -2, 0, 0, 0, 1, -5, 0, 3, 0,
        0, 0, 2, 2, 1, -5, 0, 3, 0, -2, 0, 2, 0, 1, 4, 0, 0, 0,
        -2, 1, 0, 2, 1, 4, 0, 0, 0, 0, 0, 1, -2, 0, 4, 0, 0, 0,
        -1, 0, 1, 0, 0, -4, 0, 0, 0, -2, 1, 0, 0, 0, -4, 0, 0, 0,
        1, 0, 0, 0, 0, -4, 0, 0, 0, 0, 0, 1, 2, 0, 3, 0, 0, 0,
        0, 0, -2, 2, 2, -3, 0, 0, 0, -1, -1, 1, 0, 0, -3, 0, 0, 0,
        0, 1, 1, 0, 0, -3, 0, 0, 0, 0, -1, 1, 2, 2, -3, 0, 0, 0,
        2, -1, -1, 2, 2, -3, 0, 0, 0, 0, 0, 3, 2, 2, -3, 0, 0, 0,
        2, -1, 0, 2, 2, -3, 0, 0, 0,
    ];

    /// <summary>Nutation and obliquity at a time.</summary>
    /// <param name="centuries">Julian centuries of TT from J2000.0.</param>
    public static Nutation At(double centuries)
    {
        // Mean elongation of the Moon, mean anomalies of Sun and Moon, the Moon's argument of latitude and ascending node.
        var elongation = Polynomial(centuries, [297.85036, 445267.111480, -0.0019142, 1 / 189474.0]);
        var anomalySun = Polynomial(centuries, [357.52772, 35999.050340, -0.0001603, -1 / 300000.0]);
        var anomalyMoon = Polynomial(centuries, [134.96298, 477198.867398, 0.0086972, 1 / 56250.0]);
        var latitudeMoon = Polynomial(centuries, [93.27191, 483202.017538, -0.0036825, 1 / 327270.0]);
        var nodeMoon = Polynomial(centuries, [125.04452, -1934.136261, 0.0020708, 1 / 450000.0]);
        var (longitude, obliquity) = (0.0, 0.0);
        var terms = Terms;
        for (var i = 0; i < terms.Length; i += 9)
        {
            var argument = terms[i] * elongation + terms[i + 1] * anomalySun + terms[i + 2] * anomalyMoon
                + terms[i + 3] * latitudeMoon + terms[i + 4] * nodeMoon;
            var (sine, cosine) = Math.SinCos(double.DegreesToRadians(argument));
            longitude += (terms[i + 5] + terms[i + 6] * centuries) * sine;
            obliquity += (terms[i + 7] + terms[i + 8] * centuries) * cosine;
        }

        const double unitsPerDegree = 3600 * 10000;
        return new(longitude / unitsPerDegree, MeanObliquity(centuries) + obliquity / unitsPerDegree);
    }

    private static double MeanObliquity(double centuries) => Polynomial(
        centuries / 100,
        [84381.448, -4680.93, -1.55, 1999.25, -51.38, -249.67, -39.05, 7.12, 27.87, 5.79, 2.45]) / 3600;
}
