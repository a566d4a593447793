namespace Bandtide.Storage.Maintenance;

/// <summary>One thing that is wrong in the store.</summary>
/// <param name="Station">Code of the station.</param>
/// <param name="Place">The date (<c>yyyy-MM-dd</c>) or month (<c>yyyy-MM</c>) concerned, or empty.</param>
/// <param name="Message">What is wrong, in a sentence.</param>
public sealed record StoreFault(string Station, string Place, string Message);
