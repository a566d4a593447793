using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Days;

/// <summary>Days on their way into the store: packed once, judged against what is current, answered with receipts.</summary>
internal sealed class DayUpload
{
    private readonly Station station;
    private readonly IReadOnlyList<PendingDay> days;
    private readonly bool restoreWithdrawn;
    private readonly BandPlan plan;
    private readonly long receivedAt;
    private readonly PackedSheet[] sheets;
    private readonly int[] dates;

    public DayUpload(Station station, IReadOnlyList<PendingDay> days, bool restoreWithdrawn, BandPlan plan, DateTimeOffset now)
    {
        (this.station, this.days, this.restoreWithdrawn, this.plan) = (station, days, restoreWithdrawn, plan);
        receivedAt = now.ToUnixTimeMilliseconds();
        dates = [.. days.Select(day => EpochDay.Of(day.Sheet.Date))];
        if (dates.Distinct().Count() != dates.Length)
        {
            throw new ArgumentException("Dates must be distinct.", nameof(days));
        }

        sheets = [.. days.Select(day => PackedSheet.Of(day.Sheet.Cells, plan))];
    }

    public IReadOnlyCollection<int> Dates => dates;

    public IReadOnlyCollection<byte[]> Checksums => [.. sheets.Select(sheet => sheet.Checksum)];

    /// <summary>What storing does to each day, and the revision that is current afterwards.</summary>
    public IReadOnlyList<(DayStatus Status, int Revision)> Decide(IReadOnlyDictionary<int, DayHead> heads) =>
        [.. dates.Select((date, i) => heads.GetValueOrDefault(date) switch
        {
            null => (DayStatus.Created, 1),
            { Checksum: null } head when !restoreWithdrawn => (DayStatus.Withdrawn, head.Revision),
            { Checksum: null } head => (DayStatus.Created, head.Revision + 1),
            var head when head.Checksum.AsSpan().SequenceEqual(sheets[i].Checksum) => (DayStatus.Unchanged, head.Revision),
            var head => (DayStatus.Replaced, head.Revision + 1),
        })];

    /// <summary>What has to be written.</summary>
    public IReadOnlyList<DayChange> ChangesOf(IReadOnlyList<(DayStatus Status, int Revision)> decisions) =>
        [.. decisions
            .Select((decision, i) => (decision, Change: new DayChange(new(dates[i], decision.Revision, receivedAt, sheets[i]), days[i].Sheet.Cells)))
            .Where(pair => pair.decision.Status is DayStatus.Created or DayStatus.Replaced)
            .Select(pair => pair.Change)];

    /// <summary>The receipts, in the order of the days.</summary>
    /// <param name="decisions">What storing did.</param>
    /// <param name="stored">The earliest other date with each checksum, by checksum text.</param>
    public IReadOnlyList<DayReceipt> Receipts(IReadOnlyList<(DayStatus Status, int Revision)> decisions, IReadOnlyDictionary<string, int> stored)
    {
        var earliest = new Dictionary<string, int>(stored, StringComparer.Ordinal);
        for (var i = 0; i < dates.Length; i++)
        {
            var text = PackedSheet.Text(sheets[i].Checksum);
            if (decisions[i].Status != DayStatus.Withdrawn && (!earliest.TryGetValue(text, out var date) || dates[i] < date))
            {
                earliest[text] = dates[i];
            }
        }

        return [.. days.Select((day, i) =>
        {
            var text = PackedSheet.Text(sheets[i].Checksum);
            var original = earliest.TryGetValue(text, out var date) && date < dates[i] ? EpochDay.ToDate(date) : (DateOnly?)null;
            return new DayReceipt(
                station.Code, day.Sheet.Date, decisions[i].Status, decisions[i].Revision, sheets[i].CellCount, text,
                [.. day.ReaderWarnings.Concat(SheetWarnings.Find(day.Sheet, station, plan, original)).Take(SheetWarnings.Max)]);
        })];
    }
}
