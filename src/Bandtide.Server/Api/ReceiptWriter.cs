using System.Text.Json;
using System.Threading.Channels;

namespace Bandtide.Server.Api;

/// <summary>
/// Sends receipts line by line without ever making the upload wait: lines the client does not read yet are kept, at most
/// one for each of a body's days.
/// </summary>
internal sealed class ReceiptWriter(HttpResponse response) : IAsyncDisposable
{
    private readonly Channel<byte[]> lines = Channel.CreateUnbounded<byte[]>(new() { SingleReader = true });
    private Task? sending;

    public void Write(object receipt)
    {
        byte[] line = [.. JsonSerializer.SerializeToUtf8Bytes(receipt, receipt.GetType(), WireJson.Options), (byte)'\n'];
        lines.Writer.TryWrite(line);
        sending ??= SendAsync();
    }

    /// <summary>Begins the answer even without a line.</summary>
    public void Begin() => sending ??= SendAsync();

    public async ValueTask DisposeAsync()
    {
        lines.Writer.TryComplete();
        await (sending ?? Task.CompletedTask);
    }

    private async Task SendAsync()
    {
        response.StatusCode = StatusCodes.Status200OK;
        response.ContentType = "application/x-ndjson";
        var aborted = response.HttpContext.RequestAborted;
        try
        {
            while (await lines.Reader.WaitToReadAsync(aborted))
            {
                while (lines.Reader.TryRead(out var line))
                {
                    await response.Body.WriteAsync(line, aborted);
                }

                await response.Body.FlushAsync(aborted);
            }
        }
        catch (Exception e) when (e is OperationCanceledException or IOException)
        {
            // The client has gone; what was stored stays stored.
        }
    }
}
