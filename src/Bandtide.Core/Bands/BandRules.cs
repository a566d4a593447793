using System.Globalization;

namespace Bandtide.Core.Bands;

/// <summary>What a band must satisfy to join a plan.</summary>
internal static class BandRules
{
    /// <summary>Every broken rule of a band against the bands already accepted; empty when none is.</summary>
    public static List<BandPlanProblem> Check(Band band, IReadOnlyList<Band> accepted)
    {
        var problems = new List<BandPlanProblem>();
        Refuse(!Codes.IsValid(band.Code), "code", "A code is 2 to 24 characters of a-z, 0-9 and -.");
        Refuse(accepted.Any(other => string.Equals(other.Code, band.Code, StringComparison.Ordinal)), "duplicate", "The code is taken.");
        Refuse(band.Id < BandPlan.FirstAddedId, "id",
            string.Create(CultureInfo.InvariantCulture, $"Added bands have identities from {BandPlan.FirstAddedId}."));
        Refuse(accepted.Any(other => other.Id == band.Id), "id", "The identity is taken.");
        Refuse(string.IsNullOrWhiteSpace(band.Name), "name", "The name is empty.");
        Refuse(!Enum.IsDefined(band.Layer), "layer", "There is no such layer.");
        if (SegmentProblem(band) is { } rule)
        {
            problems.Add(rule);
        }
        else
        {
            problems.AddRange(accepted
                .Where(other => other.Layer == band.Layer && other.Segments.Any(theirs => band.Segments.Any(theirs.Overlaps)))
                .Select(other => new BandPlanProblem(band.Code, "overlap", $"It overlaps {other.Code} ({other.Label}).")));
        }

        return problems;

        void Refuse(bool broken, string rule, string message)
        {
            if (broken)
            {
                problems.Add(new(band.Code, rule, message));
            }
        }
    }

    private static BandPlanProblem? SegmentProblem(Band band)
    {
        if (band.Segments.IsDefaultOrEmpty || band.Segments.Contains(default))
        {
            return new(band.Code, "segments", "A band needs at least one segment, none of them empty.");
        }

        for (var i = 1; i < band.Segments.Length; i++)
        {
            if (band.Segments[i].LowHz < band.Segments[i - 1].HighHz)
            {
                return new(band.Code, "segments", "Segments must ascend and not overlap.");
            }
        }

        return band.HighHz > BandPlan.HighestHz ? new(band.Code, "range", "A band lies between 0 and 30000 kHz.") : null;
    }
}
