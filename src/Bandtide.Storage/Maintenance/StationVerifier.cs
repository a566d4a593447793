using System.Data.Common;
using System.Globalization;
using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Tiles;

namespace Bandtide.Storage.Maintenance;

/// <summary>Verifies one station as it is at one moment, a month in memory at a time.</summary>
internal sealed class StationVerifier
{
    private const string Columns = "date, revision, cell_count, hours_mask, band_count, checksum, sheet";

    private readonly StoreSession session;
    private readonly Station station;
    private readonly BandPlan plan;
    private readonly VerifyTally tally;

    private StationVerifier(StoreSession session, Station station, BandPlan plan, VerifyTally tally) =>
        (this.session, this.station, this.plan, this.tally) = (session, station, plan, tally);

    /// <summary>Adds what is wrong with a station to the tally.</summary>
    public static async Task VerifyAsync(StoreDatabase database, Station station, BandPlan plan, VerifyTally tally, CancellationToken ct)
    {
        try
        {
            await database.SnapshotAsync(async session =>
            {
                var verifier = new StationVerifier(session, station, plan, tally);
                var heads = await verifier.SheetsAndTilesAsync(ct);
                await verifier.RevisionsAsync(heads, ct);
                return heads.Count;
            }, ct);
        }
        catch (DbException exception) when (!database.Dialect.IsPassing(exception))
        {
            tally.Faults.Add(new(station.Code, "", $"The database cannot read this station's rows: {exception.Message}"));
        }
    }

    /// <returns>The current revision of each date.</returns>
    private async Task<Dictionary<int, int>> SheetsAndTilesAsync(CancellationToken ct)
    {
        var tiles = await TilesAsync(ct);
        var heads = new Dictionary<int, int>();
        var month = new List<CellGrid?>();
        var current = 0;
        await using var command = session.Command($"SELECT {Columns} FROM day_sheet WHERE station_id = @station ORDER BY date");
        command.Add("@station", station.Id);
        await using (var reader = await command.ExecuteReaderAsync(ct))
        {
            while (await reader.ReadAsync(ct))
            {
                var date = reader.GetInt32(0);
                heads[date] = reader.GetInt32(1);
                if (YearMonth.Of(EpochDay.ToDate(date)).Number is var number && number != current)
                {
                    Compare(current, month, tiles);
                    (current, month) = (number, []);
                }

                if (!reader.IsDBNull(6))
                {
                    tally.Sheets++;
                    month.Add(Check(reader));
                }
            }
        }

        Compare(current, month, tiles);
        foreach (var (key, _) in tiles)
        {
            Fault(YearMonth.FromNumber(key.Month).ToString(), $"There is a tile of {key.Measure} without a sheet.");
        }

        return heads;
    }

    private async Task<SortedDictionary<(int Month, Measure Measure), byte[]>> TilesAsync(CancellationToken ct)
    {
        await using var command = session.Command("SELECT month, measure, tile FROM month_tile WHERE station_id = @station");
        command.Add("@station", station.Id);
        var rows = await command.ListAsync(
            row => KeyValuePair.Create((row.GetInt32(0), (Measure)row.GetInt32(1)), row.GetFieldValue<byte[]>(2)), ct);
        return new(rows.ToDictionary());
    }

    private CellGrid? Check(DbDataReader row)
    {
        var place = DateText.Format(EpochDay.ToDate(row.GetInt32(0)));
        try
        {
            var cells = StoredSheets.Decode(station.Id, row.GetInt32(0), row.GetFieldValue<byte[]>(6));
            if (cells.BandIds.ToArray().FirstOrDefault(id => plan.ById(id) is null) is not 0 and var unknown)
            {
                Fault(place, string.Create(CultureInfo.InvariantCulture, $"There is no band with the identity {unknown}."));
            }
            else if (!PackedSheet.ChecksumOf(cells, plan).AsSpan().SequenceEqual(row.IsDBNull(5) ? [] : row.GetFieldValue<byte[]>(5)))
            {
                Fault(place, "The checksum is not that of the cells.");
            }

            if ((cells.Count, cells.HoursMask(), cells.BandCount) != (row.GetInt32(2), row.GetInt32(3), row.GetInt32(4)))
            {
                Fault(place, "The counts of cells, hours and bands are not those of the cells.");
            }

            return cells;
        }
        catch (InvalidDataException exception)
        {
            Fault(place, exception.Message);
            return null;
        }
    }

    // Takes the tiles it has judged out of the list.
    private void Compare(int month, List<CellGrid?> sheets, SortedDictionary<(int Month, Measure Measure), byte[]> tiles)
    {
        if (sheets.Contains(null))
        {
            // A damaged sheet is reported already; what its tiles should be nobody can tell.
            foreach (var measure in Enum.GetValues<Measure>())
            {
                tiles.Remove((month, measure));
            }

            return;
        }

        foreach (var expected in TileMaker.TilesOf(month, [.. sheets.OfType<CellGrid>()]))
        {
            tally.Tiles++;
            var place = YearMonth.FromNumber(month).ToString();
            if (!tiles.Remove((month, expected.Measure), out var stored))
            {
                Fault(place, $"The tile of {expected.Measure} is missing.");
            }
            else if (!expected.Bytes.AsSpan().SequenceEqual(stored))
            {
                Fault(place, $"The tile of {expected.Measure} is not what the sheets give.");
            }
        }
    }

    private async Task RevisionsAsync(Dictionary<int, int> heads, CancellationToken ct)
    {
        var next = heads.Keys.ToDictionary(date => date, _ => 1);
        await using var command = session.Command($"SELECT {Columns} FROM day_revision WHERE station_id = @station ORDER BY date, revision");
        command.Add("@station", station.Id);
        await using (var reader = await command.ExecuteReaderAsync(ct))
        {
            while (await reader.ReadAsync(ct))
            {
                tally.Revisions++;
                var (date, revision) = (reader.GetInt32(0), reader.GetInt32(1));
                if (next.TryGetValue(date, out var expected) && revision == expected)
                {
                    next[date] = expected + 1;
                }
                else
                {
                    Fault(DateText.Format(EpochDay.ToDate(date)), string.Create(
                        CultureInfo.InvariantCulture, $"Revision {revision} stands where revision {expected} should follow."));
                    next[date] = revision + 1;
                }

                if (!reader.IsDBNull(6))
                {
                    Check(reader);
                }
            }
        }

        foreach (var (date, head) in heads.Where(day => next[day.Key] != day.Value))
        {
            Fault(DateText.Format(EpochDay.ToDate(date)), string.Create(
                CultureInfo.InvariantCulture, $"The current revision is {head}, the earlier ones end with {next[date] - 1}."));
        }
    }

    private void Fault(string place, string message) => tally.Faults.Add(new(station.Code, place, message));
}
