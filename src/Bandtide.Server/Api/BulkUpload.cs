using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Days;

namespace Bandtide.Server.Api;

/// <summary>One bulk upload: reads the body, commits complete days together, acknowledges each after its commit.</summary>
/// <remarks>No transaction is open while input is awaited: at most 366 days, 8 MiB or one second are gathered, then committed.</remarks>
/// <param name="station">Whose days.</param>
/// <param name="store">Where they go.</param>
/// <param name="restore">Whether a withdrawn day is stored anew.</param>
/// <param name="reader">Makes days of bytes.</param>
/// <param name="receipts">Takes the answer's lines.</param>
/// <param name="body">The decoded body.</param>
/// <param name="patience">How long the sender may be silent.</param>
/// <param name="clock">Measures both times.</param>
internal sealed class BulkUpload(
    Station station, DayStore store, bool restore, IBulkReader reader, ReceiptWriter receipts, Stream body, TimeSpan patience, TimeProvider clock)
{
    private const int MostDays = 366;
    private const int MostBytes = 8 * 1024 * 1024;
    private const int ChunkBytes = 64 * 1024;
    private static readonly TimeSpan LongestWait = TimeSpan.FromSeconds(1);

    private readonly byte[] chunk = new byte[ChunkBytes];
    private readonly List<BulkDay> completed = [];
    private readonly List<BulkDay> waiting = [];
    private Task<int>? pending;
    private int waitingBytes;
    private long waitingSince;
    private long silentSince;

    private enum BodyEnd
    {
        Proper,
        Broken,
        Silent,
        Unread,
    }

    /// <summary>Runs the upload to its end.</summary>
    /// <returns>The refusal of the whole body, or <c>null</c> when receipts were written.</returns>
    public async Task<IResult?> RunAsync()
    {
        var end = await ReadAsync();
        var headerRead = reader.HeaderRead;
        if (end != BodyEnd.Unread)
        {
            reader.Finish(end == BodyEnd.Proper, completed);
        }

        if (reader.HeaderProblems.Count > 0)
        {
            return Problems.Bad(reader.HeaderProblems);
        }

        if (!headerRead && end == BodyEnd.Broken)
        {
            return Problems.Bad("", SheetRule.BodyIncomplete, "The body broke off before its header line was complete.");
        }

        await TakeAsync();
        await CommitAsync();
        receipts.Begin();
        if (end == BodyEnd.Silent)
        {
            await receipts.BreakOffAsync();
        }

        if (end != BodyEnd.Proper)
        {
            await DrainAsync();
        }

        return null;
    }

    private async Task<BodyEnd> ReadAsync()
    {
        try
        {
            while (!reader.Stopped)
            {
                pending ??= NextAsync();
                if (!await ArrivesAsync(pending))
                {
                    await CommitAsync();
                    continue;
                }

                var read = await pending;
                pending = null;
                if (read == 0)
                {
                    return BodyEnd.Proper;
                }

                reader.Feed(chunk.AsSpan(0, read), completed);
                await TakeAsync();
            }

            return BodyEnd.Unread;
        }
        catch (TimeoutException)
        {
            return BodyEnd.Silent;
        }
        catch (Exception e) when (IsBreak(e))
        {
            // The connection or the compressed data broke: every complete day is still stored.
            return BodyEnd.Broken;
        }
    }

    // Nothing cancels a read but the connection itself: the server could not use the connection afterwards.
    private Task<int> NextAsync()
    {
        silentSince = clock.GetTimestamp();
        return body.ReadAsync(chunk, CancellationToken.None).AsTask();
    }

    // False when days have waited long enough though the next bytes have not come; a sender silent for too long is given up.
    private async Task<bool> ArrivesAsync(Task<int> next)
    {
        var rest = patience - clock.GetElapsedTime(silentSince);
        if (waiting.Count > 0 && LongestWait - clock.GetElapsedTime(waitingSince) is var due && due < rest)
        {
            rest = due;
        }

        if (next.IsCompleted || rest <= TimeSpan.Zero)
        {
            return next.IsCompleted || (waiting.Count == 0 ? throw new TimeoutException() : false);
        }

        await ((Task)next.WaitAsync(rest, clock)).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
        return next.IsCompleted || await ArrivesAsync(next);
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
    private async Task DrainAsync()
    {
        try
        {
            while (await (pending ?? NextAsync()).WaitAsync(patience, clock) > 0)
            {
                pending = null;
            }
        }
        catch (Exception e) when (IsBreak(e) || e is TimeoutException)
        {
            // Nothing more to read.
        }
    }

    private static bool IsBreak(Exception e) => e is InvalidDataException or IOException or BadHttpRequestException or OperationCanceledException;
}
