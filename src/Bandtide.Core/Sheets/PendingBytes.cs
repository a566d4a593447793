namespace Bandtide.Core.Sheets;

/// <summary>Bytes that arrived and are not read yet.</summary>
internal sealed class PendingBytes
{
    private byte[] buffer = new byte[16 * 1024];
    private int start;
    private int end;

    public ReadOnlySpan<byte> Unread => buffer.AsSpan(start, end - start);

    public void Append(ReadOnlySpan<byte> chunk)
    {
        if (buffer.Length - end < chunk.Length)
        {
            var unread = end - start;
            var target = buffer.Length - unread < chunk.Length ? new byte[Math.Max(buffer.Length * 2, unread + chunk.Length)] : buffer;
            Buffer.BlockCopy(buffer, start, target, 0, unread);
            (buffer, start, end) = (target, 0, unread);
        }

        chunk.CopyTo(buffer.AsSpan(end));
        end += chunk.Length;
    }

    public void Skip(int count) => start += count;
}
