namespace Bandtide.Storage.Network;

/// <summary>What drawing up a region gives.</summary>
public abstract record RegionCreation
{
    private RegionCreation()
    {
    }

    /// <summary>The region exists now.</summary>
    public sealed record Created(Region Region) : RegionCreation;

    /// <summary>Another region has the code, or it is kept for a region that exists by itself.</summary>
    public sealed record DuplicateCode : RegionCreation;

    /// <summary>No stations of these codes.</summary>
    public sealed record UnknownStations(IReadOnlyList<string> Codes) : RegionCreation;

    /// <summary>Texts that are not Maidenhead fields or squares.</summary>
    public sealed record InvalidLocators(IReadOnlyList<string> Texts) : RegionCreation;

    /// <summary>Neither stations nor locators, or both.</summary>
    public sealed record NeitherOrBoth : RegionCreation;
}
