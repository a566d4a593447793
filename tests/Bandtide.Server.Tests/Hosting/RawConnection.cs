using System.Globalization;
using System.Net;
using System.Net.Sockets;
using System.Text;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>A connection that sends exactly the bytes it is told, when it is told: what a well-behaved client library would not do.</summary>
internal sealed class RawConnection : IDisposable
{
    private readonly Socket socket;
    private readonly NetworkStream stream;
    private readonly StreamReader reader;

    private RawConnection(Socket socket)
    {
        this.socket = socket;
        stream = new(socket, ownsSocket: true);
        reader = new(stream, Encoding.UTF8);
    }

    public static async Task<RawConnection> OpenAsync(Uri server)
    {
        var opened = new Socket(AddressFamily.InterNetwork, SocketType.Stream, ProtocolType.Tcp) { NoDelay = true };
        await opened.ConnectAsync(IPAddress.Loopback, server.Port, HttpSteps.Ct);
        return new(opened);
    }

    /// <summary>The head of a bulk upload with the coordinator's key.</summary>
    /// <param name="length">Content-Length, or <c>null</c> for chunks.</param>
    /// <param name="headers">Further header lines, each with its line end.</param>
    /// <param name="type">Media type of the body.</param>
    public static string BulkHead(long? length, string headers = "", string type = "text/csv") =>
        Head("POST", "/api/v1/stations/north/days", length, $"Content-Type: {type}\r\n{headers}");

    /// <summary>The head of a request with the coordinator's key that closes the connection behind itself.</summary>
    public static string Head(string method, string path, long? length, string headers) => string.Create(
        CultureInfo.InvariantCulture,
        $"{method} {path} HTTP/1.1\r\nHost: localhost\r\nAuthorization: Bearer {ServerHost.CoordinatorKey}\r\nConnection: close\r\n{headers}{(length is null ? "Transfer-Encoding: chunked" : $"Content-Length: {length}")}\r\n\r\n");

    /// <summary>One chunk of a chunked body.</summary>
    public static byte[] Chunk(byte[] bytes) =>
        [.. Encoding.ASCII.GetBytes(bytes.Length.ToString("x", CultureInfo.InvariantCulture) + "\r\n"), .. bytes, .. "\r\n"u8];

    public ValueTask SendAsync(ReadOnlyMemory<byte> bytes) => stream.WriteAsync(bytes, HttpSteps.Ct);

    public ValueTask SendAsync(string text) => SendAsync(Encoding.UTF8.GetBytes(text));

    /// <summary>Says that no more will be sent; the answer can still be read.</summary>
    public void EndSending() => socket.Shutdown(SocketShutdown.Send);

    /// <summary>Breaks the connection with a reset.</summary>
    public void Reset()
    {
        socket.LingerState = new(enable: true, seconds: 0);
        socket.Close();
    }

    public ValueTask<string?> LineAsync() => reader.ReadLineAsync(HttpSteps.Ct);

    /// <summary>Everything up to the end of the connection.</summary>
    public Task<string> RestAsync() => reader.ReadToEndAsync(HttpSteps.Ct);

    /// <summary>Reads until an answer's line, which begins with a brace; <c>null</c> when the connection ends before.</summary>
    public async Task<string?> ReceiptAsync()
    {
        while (await LineAsync() is { } line)
        {
            if (line.StartsWith('{'))
            {
                return line;
            }
        }

        return null;
    }

    public void Dispose()
    {
        reader.Dispose();
        stream.Dispose();
    }
}
