using System.Collections.Frozen;
using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;

namespace Bandtide.Core.Bands;

/// <summary>All bands a network knows, in both layers. Immutable; the same for every station.</summary>
/// <remarks>
/// A plan only grows: bands are added (<see cref="With"/>), never changed in place, so that what is stored keeps its meaning.
/// Identities: service bands from 1 and slices from 100 (<see cref="StandardBands"/>), added bands from <see cref="FirstAddedId"/>.
/// </remarks>
public sealed class BandPlan
{
    /// <summary>High end of the plan in Hz: 30 MHz, not part of it.</summary>
    public const int HighestHz = 30_000_000;

    /// <summary>Smallest identity of an added band.</summary>
    public const short FirstAddedId = 1000;

    private readonly FrozenDictionary<string, Band> byCode;
    private readonly FrozenDictionary<short, Band> byId;
    private readonly Utf8CodeIndex byUtf8Code;
    private readonly ImmutableArray<Band>[] layers;

    private BandPlan(IEnumerable<Band> bands)
    {
        var sorted = bands.OrderBy(band => band.Layer).ThenBy(band => band.LowHz).ToImmutableArray();
        All = sorted;
        byCode = sorted.ToFrozenDictionary(band => band.Code, StringComparer.Ordinal);
        byId = sorted.ToFrozenDictionary(band => band.Id);
        byUtf8Code = new(sorted);
        layers = [.. Enum.GetValues<BandLayer>().Select(layer => sorted.Where(band => band.Layer == layer).ToImmutableArray())];
    }

    /// <summary>The plan without additions.</summary>
    public static BandPlan Standard { get; } = new(StandardBands.All());

    /// <summary>Every band: the service layer, then the slices, each by lowest edge.</summary>
    public IReadOnlyList<Band> All { get; }

    /// <summary>The smallest identity that an added band may take and none has.</summary>
    public short NextId => (short)Math.Max(FirstAddedId, byId.Keys.Max() + 1);

    /// <summary>The bands of a layer by lowest edge.</summary>
    public IReadOnlyList<Band> Layer(BandLayer layer) => layers[(int)layer];

    /// <summary>The band with an identity, or <c>null</c>.</summary>
    public Band? ById(short id) => byId.GetValueOrDefault(id);

    /// <summary>Finds a band by its exact code.</summary>
    public bool TryGet(string code, [MaybeNullWhen(false)] out Band band) => byCode.TryGetValue(code, out band);

    /// <summary>Finds a band by its exact code in UTF-8. Allocates nothing: made for reading millions of rows.</summary>
    public bool TryGet(ReadOnlySpan<byte> utf8Code, [MaybeNullWhen(false)] out Band band) => byUtf8Code.TryGet(utf8Code, out band);

    /// <summary>The band of a layer that holds a frequency in Hz, or <c>null</c>.</summary>
    public Band? At(BandLayer layer, double hz) => Layer(layer).FirstOrDefault(band => band.Contains(hz));

    /// <summary>This plan with more bands, or every reason against them.</summary>
    /// <param name="added">Bands of either layer with identities from <see cref="FirstAddedId"/>; none is allowed too.</param>
    public BandPlanExtension With(IEnumerable<Band> added)
    {
        ArgumentNullException.ThrowIfNull(added);
        var accepted = new List<Band>(All);
        var problems = new List<BandPlanProblem>();
        foreach (var band in added)
        {
            var found = BandRules.Check(band, accepted);
            problems.AddRange(found);
            if (found.Count == 0)
            {
                accepted.Add(band);
            }
        }

        return problems.Count == 0 ? new(new(accepted), []) : new(null, problems);
    }
}
