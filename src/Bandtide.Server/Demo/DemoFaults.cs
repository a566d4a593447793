namespace Bandtide.Server.Demo;

/// <summary>What goes wrong at a real station, put into an invented one on purpose.</summary>
internal sealed record DemoFaults
{
    /// <summary>Failures a year that cost one to nine days.</summary>
    public float FailuresPerYear { get; init; } = 2.5f;

    /// <summary>Share of days that lack some hours.</summary>
    public float BrokenDayShare { get; init; } = 0.02f;

    /// <summary>Hours UTC that are missing on many days, such as those of power cuts: first and last; <c>null</c> where none.</summary>
    public (int First, int Last, float Share)? PowerCuts { get; init; }

    /// <summary>Changes of gain, dB, from a date on, whether or not a setup records them.</summary>
    public IReadOnlyList<(DateOnly From, float Db)> GainSteps { get; init; } = [];

    /// <summary>Days on which the clock ran wrong, both included: the hour written down is so many hours before the true one.</summary>
    public (DateOnly First, DateOnly Last, int HoursBehind)? WrongClock { get; init; }

    /// <summary>Carriers made in the house, day and night: the band, from when on, and the share of its bins.</summary>
    public IReadOnlyList<(string Band, DateOnly From, float Share)> Carriers { get; init; } = [];

    /// <summary>A noisy time in the neighbourhood, both dates included, dB more noise.</summary>
    public (DateOnly First, DateOnly Last, float Db)? Noise { get; init; }

    /// <summary>Days that are a copy of another, earlier one.</summary>
    public IReadOnlyDictionary<DateOnly, DateOnly> Copies { get; init; } = new Dictionary<DateOnly, DateOnly>();
}
