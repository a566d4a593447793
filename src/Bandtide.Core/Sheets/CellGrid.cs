namespace Bandtide.Core.Sheets;

/// <summary>
/// The cells of one day sheet as dense planes of whole numbers: hour-major, index <c>hour * BandCount + band</c>.
/// </summary>
/// <remarks>
/// Hour-major order makes a change of clock a rotation of whole rows. A cell exists exactly when its
/// <see cref="Quantity.Sweeps"/> is present; a value that was not sent is <see cref="Missing"/>, never 0.
/// Bands are held by identity (<see cref="Bands.Band.Id"/>), ascending, so that a grid outlives any change of plan.
/// The grid owns its planes: whoever hands arrays in gives them up.
/// </remarks>
public sealed class CellGrid
{
    /// <summary>Hours of a day.</summary>
    public const int Hours = 24;

    /// <summary>Number of quantities, the length of the array of planes.</summary>
    public const int QuantityCount = 8;

    /// <summary>Marks a value that was not sent.</summary>
    public const int Missing = int.MinValue;

    private readonly short[] bandIds;
    private readonly int[]?[] planes;

    /// <summary>Takes over the band identities and the planes.</summary>
    /// <param name="bandIds">Ascending, no identity twice.</param>
    /// <param name="planes">One per <see cref="Quantity"/>, <c>null</c> where no cell has it, each 24 x bands long.</param>
    /// <exception cref="ArgumentException">Bands not ascending, or a plane of the wrong length or without sweeps and occupancy.</exception>
    public CellGrid(short[] bandIds, int[]?[] planes)
    {
        ArgumentNullException.ThrowIfNull(bandIds);
        ArgumentNullException.ThrowIfNull(planes);
        for (var b = 1; b < bandIds.Length; b++)
        {
            if (bandIds[b] <= bandIds[b - 1])
            {
                throw new ArgumentException("Band identities must ascend.", nameof(bandIds));
            }
        }

        if (planes.Length != QuantityCount || planes[(int)Quantity.Sweeps] is null || planes[(int)Quantity.Occupancy] is null
            || planes.Any(plane => plane is not null && plane.Length != Hours * bandIds.Length))
        {
            throw new ArgumentException("Planes must be 24 x bands long, with sweeps and occupancy among them.", nameof(planes));
        }

        this.bandIds = bandIds;
        this.planes = planes;
        foreach (var sweeps in planes[(int)Quantity.Sweeps]!)
        {
            Count += sweeps == Missing ? 0 : 1;
        }
    }

    /// <summary>Identities of the bands, ascending.</summary>
    public ReadOnlySpan<short> BandIds => bandIds;

    /// <summary>Number of bands.</summary>
    public int BandCount => bandIds.Length;

    /// <summary>Number of cells that exist.</summary>
    public int Count { get; }

    /// <summary>All values of one quantity, or an empty span where no cell has it.</summary>
    public ReadOnlySpan<int> Plane(Quantity quantity) => planes[(int)quantity];

    /// <summary>One value in its stored resolution, or <see cref="Missing"/>.</summary>
    public int this[Quantity quantity, int hour, int band] =>
        planes[(int)quantity] is { } plane ? plane[hour * bandIds.Length + band] : Missing;

    /// <summary>Whether the cell was observed.</summary>
    public bool Has(int hour, int band) => this[Quantity.Sweeps, hour, band] != Missing;

    /// <summary>The hours with at least one cell, bit <c>h</c> for hour <c>h</c>.</summary>
    public int HoursMask()
    {
        var mask = 0;
        var sweeps = Plane(Quantity.Sweeps);
        for (var i = 0; i < sweeps.Length; i++)
        {
            if (sweeps[i] != Missing)
            {
                mask |= 1 << (i / bandIds.Length);
            }
        }

        return mask;
    }
}
