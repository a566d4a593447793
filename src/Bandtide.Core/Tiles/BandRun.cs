namespace Bandtide.Core.Tiles;

/// <summary>Neighbouring columns of one set of bands that are neighbours in another set too.</summary>
/// <param name="Source">First column in the one.</param>
/// <param name="Target">First column in the other.</param>
/// <param name="Length">Number of columns.</param>
internal readonly record struct BandRun(int Source, int Target, int Length)
{
    /// <summary>The bands that two ascending lists of identities share, as the fewest runs.</summary>
    public static BandRun[] Between(ReadOnlySpan<short> source, ReadOnlySpan<short> target)
    {
        var runs = new List<BandRun>();
        for (int s = 0, t = 0; s < source.Length && t < target.Length;)
        {
            if (source[s] != target[t])
            {
                _ = source[s] < target[t] ? s++ : t++;
                continue;
            }

            if (runs.Count > 0 && runs[^1].Source + runs[^1].Length == s && runs[^1].Target + runs[^1].Length == t)
            {
                runs[^1] = runs[^1] with { Length = runs[^1].Length + 1 };
            }
            else
            {
                runs.Add(new(s, t, 1));
            }

            s++;
            t++;
        }

        return [.. runs];
    }
}
