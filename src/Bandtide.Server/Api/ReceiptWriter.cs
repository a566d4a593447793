using System.Text.Json;
using System.Threading.Channels;

namespace Bandtide.Server.Api;

/// <summary>
/// Sends receipts line by line without ever making the upload wait: lines the client does not read yet are kept, at most
/// one for each of a body's days.
/// </summary>
/// <param name="context">The request, whose answer the lines are.</param>
/// <param name="patience">How long the client may take no byte once the body has ended.</param>
/// <param name="clock">Measures that.</param>
internal sealed class ReceiptWriter(HttpContext context, TimeSpan patience, TimeProvider clock) : IAsyncDisposable
{
    private const int PlainBytes = 1024 * 1024;

    private readonly Channel<KeptLine> lines = Channel.CreateUnbounded<KeptLine>(new() { SingleReader = true });
    private readonly CancellationTokenSource stalled = new(Timeout.InfiniteTimeSpan, clock);
    private Task? sending;
    private static readonly TimeSpan Linger = TimeSpan.FromSeconds(1);
    private volatile bool ending;
    private long kept;

    public void Write(object receipt)
    {
        byte[] line = [.. JsonSerializer.SerializeToUtf8Bytes(receipt, receipt.GetType(), WireJson.Options), (byte)'\n'];
        var entry = Interlocked.Read(ref kept) > PlainBytes ? KeptLine.Packed(line) : KeptLine.Plain(line);
        Interlocked.Add(ref kept, entry.Size);
        lines.Writer.TryWrite(entry);
        Begin();
    }

    /// <summary>Begins the answer even without a line.</summary>
    public void Begin() => sending ??= SendAsync();

    /// <summary>Sends what is known and ends the connection, so that nobody takes the answer for a whole one.</summary>
    public async Task BreakOffAsync()
    {
        await FinishAsync();

        // A reset makes the other side throw away what it has not read yet.
        await Task.Delay(Linger);
        context.Abort();
    }

    public async ValueTask DisposeAsync()
    {
        await FinishAsync();
        stalled.Dispose();
    }

    private async Task FinishAsync()
    {
        lines.Writer.TryComplete();
        ending = true;
        stalled.CancelAfter(patience);
        await (sending ?? Task.CompletedTask);
    }

    private async Task SendAsync()
    {
        var response = context.Response;
        response.StatusCode = StatusCodes.Status200OK;
        response.ContentType = "application/x-ndjson";
        using var stop = CancellationTokenSource.CreateLinkedTokenSource(context.RequestAborted, stalled.Token);
        try
        {
            while (await lines.Reader.WaitToReadAsync(stop.Token))
            {
                while (lines.Reader.TryRead(out var line))
                {
                    await response.Body.WriteAsync(line.Bytes(), stop.Token);
                    Interlocked.Add(ref kept, -line.Size);
                    if (ending)
                    {
                        stalled.CancelAfter(patience);
                    }
                }

                await response.Body.FlushAsync(stop.Token);
            }
        }
        catch (Exception e) when (e is OperationCanceledException or IOException)
        {
            // The client has gone, or takes nothing; what was stored stays stored.
            context.Abort();
        }
    }
}
