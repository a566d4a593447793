using Bandtide.Core.Bands;

namespace Bandtide.Core.Sheets;

/// <summary>What the rules of a day sheet depend on beside its own content.</summary>
/// <param name="Plan">The bands that exist.</param>
/// <param name="Now">The moment of judgement: a later date, and an hour that has not ended, are refused.</param>
public sealed record SheetContext(BandPlan Plan, DateTimeOffset Now);
