using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Days;

namespace Bandtide.Server.Api;

/// <summary>One bulk upload: reads the body, commits complete days together, acknowledges each after its commit.</summary>
/// <remarks>No transaction is open while input is awaited: at most 366 days, 8 MiB or one second are gathered, then committed.</remarks>
internal sealed class BulkUpload(
    Station station, DayStore store, bool restore, IBulkReader reader, ReceiptWriter receipts, TimeProvider clock)
{
    private const int MostDays = 366;
    private const int MostBytes = 8 * 1024 * 1024;
    private const int ChunkBytes = 64 * 1024;
    private static readonly TimeSpan LongestWait = TimeSpan.FromSeconds(1);

    private readonly List<BulkDay> completed = [];
    private readonly List<BulkDay> waiting = [];
    private int waitingBytes;
    private long waitingSince;

    /// <returns>The refusal of the whole body, or <c>null</c> when receipts were written.</returns>
    public async Task<IResult?> RunAsync(Stream body, CancellationToken ct)
    {
        var chunk = new byte[ChunkBytes];
        var endedProperly = false;
        Task<int>? pending = null;
        try
        {
            while (!reader.Stopped)
            {
                pending ??= body.ReadAsync(chunk, ct).AsTask();
                if (!await ArrivesAsync(pending, ct))
                {
                    await CommitAsync();
                    continue;
                }

                var read = await pending;
                pending = null;
                if (read == 0)
                {
                    endedProperly = true;
                    break;
                }

                reader.Feed(chunk.AsSpan(0, read), completed);
                await TakeAsync();
            }
        }
        catch (Exception e) when (e is InvalidDataException or IOException or BadHttpRequestException or OperationCanceledException)
        {
            // The connection broke, or the compressed data did: every complete day is still stored.
        }

        if (!reader.Stopped)
        {
            reader.Finish(endedProperly, completed);
        }

        if (reader.HeaderProblems.Count > 0)
        {
            return Problems.Bad(reader.HeaderProblems);
        }

        await TakeAsync();
        await CommitAsync();
        receipts.Begin();
        await DrainAsync(body, chunk, endedProperly, pending, ct);
        return null;
    }

    // False when days have waited long enough though the next bytes have not come.
    private async Task<bool> ArrivesAsync(Task<int> pending, CancellationToken ct)
    {
        if (waiting.Count == 0 || pending.IsCompleted)
        {
            return true;
        }

        var rest = LongestWait - clock.GetElapsedTime(waitingSince);
        return rest > TimeSpan.Zero && await Task.WhenAny(pending, Task.Delay(rest, clock, ct)) == pending;
    }

    private async Task TakeAsync()
    {
        foreach (var day in completed)
        {
            if (waiting.Count == 0)
            {
                waitingSince = clock.GetTimestamp();
            }

            waiting.Add(day);
            waitingBytes += day.Bytes;
            if (waiting.Count >= MostDays || waitingBytes >= MostBytes)
            {
                await CommitAsync();
            }
        }

        completed.Clear();
        if (waiting.Count > 0 && clock.GetElapsedTime(waitingSince) >= LongestWait)
        {
            await CommitAsync();
        }
    }

    // A client that has gone still sent these days whole: they are stored.
    private async Task CommitAsync()
    {
        if (waiting.Count == 0)
        {
            return;
        }

        PendingDay[] good = [.. waiting.Where(day => day.Reading.Sheet is not null).Select(day => new PendingDay(day.Reading.Sheet!, day.Reading.Warnings))];
        var stored = good.Length == 0 ? [] : await store.StoreAsync(station, good, restore, CancellationToken.None);
        var next = 0;
        foreach (var day in waiting)
        {
            receipts.Write(day.Reading.Sheet is null
                ? new RefusedDayAnswer(day.DateText, "refused", day.Reading.Problems)
                : ReceiptAnswer.Of(stored[next++]));
        }

        waiting.Clear();
        waitingBytes = 0;
    }

    // A client that sends all before it reads must be able to, also where reading has stopped early.
    private static async Task DrainAsync(Stream body, byte[] chunk, bool ended, Task<int>? pending, CancellationToken ct)
    {
        try
        {
            var read = ended ? 0 : await (pending ?? body.ReadAsync(chunk, ct).AsTask());
            while (read > 0)
            {
                read = await body.ReadAsync(chunk, ct);
            }
        }
        catch (Exception e) when (e is InvalidDataException or IOException or BadHttpRequestException or OperationCanceledException)
        {
            // Nothing more to read.
        }
    }
}
