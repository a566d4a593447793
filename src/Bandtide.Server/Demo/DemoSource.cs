using Bandtide.Core.Geography;

namespace Bandtide.Server.Demo;

/// <summary>A part of the world that transmits. Places and weights are invented: roughly where people and transmitters are.</summary>
/// <param name="Place">Where its transmitters are taken to stand.</param>
/// <param name="Broadcasting">Weight in broadcasting bands.</param>
/// <param name="Amateur">Weight in amateur bands.</param>
/// <param name="Standard">Weight in standard frequency bands.</param>
internal sealed record DemoSource(GeoPoint Place, float Broadcasting, float Amateur, float Standard)
{
    /// <summary>The whole world in fourteen places.</summary>
    public static IReadOnlyList<DemoSource> All { get; } =
    [
        new(new(50, 6), 1.0f, 1.0f, .35f),
        new(new(55, 36), .5f, .5f, .5f),
        new(new(29, 45), .8f, .08f, .1f),
        new(new(23, 78), .6f, .12f, .2f),
        new(new(33, 112), 1.2f, .25f, .6f),
        new(new(36, 137), .4f, .6f, .4f),
        new(new(8, 108), .4f, .15f, .1f),
        new(new(-35, 147), .25f, .2f, .15f),
        new(new(6, 10), .4f, .05f, .05f),
        new(new(-27, 28), .25f, .1f, .1f),
        new(new(40, -82), .6f, .9f, .7f),
        new(new(40, -112), .3f, .5f, .7f),
        new(new(18, -75), .4f, .15f, .1f),
        new(new(-23, -50), .4f, .3f, .3f),
    ];

    /// <summary>Weight for a kind of use.</summary>
    public float Weight(DemoUse use) => use switch
    {
        DemoUse.Broadcasting => Broadcasting,
        DemoUse.Amateur => Amateur,
        DemoUse.Standard => Standard,
        _ => 0.5f * (Broadcasting + Amateur),
    };

    /// <summary>Hour of the day by the mean Sun at the source, 0 to 23, in the middle of an hour UTC.</summary>
    public int LocalHour(int hour) => (int)((((hour + 0.5 + Place.LongitudeDegrees / 15) % 24) + 24) % 24);
}
