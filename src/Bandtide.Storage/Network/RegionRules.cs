using Bandtide.Core.Geography;

namespace Bandtide.Storage.Network;

/// <summary>What a region must satisfy to be drawn up.</summary>
internal static class RegionRules
{
    /// <summary>The reason against a region, or <c>null</c>.</summary>
    public static RegionCreation? Check(NewRegion region, NetworkView network)
    {
        if (OwnRegions.IsReserved(region.Code) || network.FindRegion(region.Code) is not null)
        {
            return new RegionCreation.DuplicateCode();
        }

        if (region.Stations is null == region.Locators is null)
        {
            return new RegionCreation.NeitherOrBoth();
        }

        var unknown = (region.Stations ?? []).Where(code => network.FindStation(code) is null).ToList();
        if (unknown.Count > 0)
        {
            return new RegionCreation.UnknownStations(unknown);
        }

        var invalid = (region.Locators ?? []).Where(text => !IsFieldOrSquare(text)).ToList();
        return invalid.Count > 0 ? new RegionCreation.InvalidLocators(invalid) : null;
    }

    private static bool IsFieldOrSquare(string text) =>
        MaidenheadLocator.TryParse(text, out var locator) && locator.Length <= MaidenheadLocator.SquareLength;
}
