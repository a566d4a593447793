using Bandtide.Core.Time;
using Bandtide.Storage.Days;

namespace Bandtide.Server.Api;

/// <summary>What an upload of one day returns.</summary>
/// <param name="Station">Code of the station.</param>
/// <param name="Date">UTC date.</param>
/// <param name="Status"><c>created</c>, <c>replaced</c>, <c>unchanged</c>, or in bulk uploads <c>withdrawn</c>.</param>
/// <param name="Revision">The revision that is current now, from 1.</param>
/// <param name="Cells">Cells of the sheet sent.</param>
/// <param name="Checksum">Equal exactly when the rounded cells are.</param>
/// <param name="Warnings">At most 10, one per rule.</param>
public sealed record ReceiptAnswer(
    string Station, string Date, string Status, int Revision, int Cells, string Checksum, IReadOnlyList<WarningAnswer> Warnings)
{
    internal static ReceiptAnswer Of(DayReceipt receipt) => new(
        receipt.Station, DateText.Format(receipt.Date), StatusText(receipt.Status), receipt.Revision, receipt.Cells, receipt.Checksum,
        [.. receipt.Warnings.Select(warning => new WarningAnswer(warning.Rule, warning.Count, warning.Hour, warning.Band, warning.Message))]);

    private static string StatusText(DayStatus status) => status switch
    {
        DayStatus.Created => "created",
        DayStatus.Replaced => "replaced",
        DayStatus.Unchanged => "unchanged",
        _ => "withdrawn",
    };
}
