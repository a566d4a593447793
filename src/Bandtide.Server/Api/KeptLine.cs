using System.IO.Compression;

namespace Bandtide.Server.Api;

/// <summary>A line of an answer that the client has not read yet; packed where many wait, since refusals repeat themselves.</summary>
internal readonly struct KeptLine
{
    private const int Quality = 1;
    private const int Window = 18;

    private readonly byte[] bytes;
    private readonly int length;
    private readonly bool packed;

    private KeptLine(byte[] bytes, int length, bool packed) => (this.bytes, this.length, this.packed) = (bytes, length, packed);

    /// <summary>Bytes of memory it takes.</summary>
    public int Size => bytes.Length;

    /// <summary>Keeps a line as it is.</summary>
    public static KeptLine Plain(byte[] line) => new(line, line.Length, packed: false);

    /// <summary>Keeps a line in less memory.</summary>
    public static KeptLine Packed(byte[] line)
    {
        var target = new byte[BrotliEncoder.GetMaxCompressedLength(line.Length)];
        return BrotliEncoder.TryCompress(line, target, out var written, Quality, Window)
            ? new(target.AsSpan(0, written).ToArray(), line.Length, packed: true)
            : Plain(line);
    }

    /// <summary>The line.</summary>
    public ReadOnlyMemory<byte> Bytes()
    {
        if (!packed)
        {
            return bytes;
        }

        var line = new byte[length];
        return BrotliDecoder.TryDecompress(bytes, line, out var written) && written == length
            ? line
            : throw new InvalidDataException("A line packed by this class does not unpack.");
    }
}
