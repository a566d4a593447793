using System.Buffers.Binary;
using System.Diagnostics.CodeAnalysis;
using System.Numerics;
using System.Text;

namespace Bandtide.Core.Bands;

/// <summary>Bands by the UTF-8 bytes of their code: an open-addressed table at most a quarter full.</summary>
internal sealed class Utf8CodeIndex
{
    private readonly (byte[] Code, Band Band)[] slots;
    private readonly int shift;

    public Utf8CodeIndex(IReadOnlyCollection<Band> bands)
    {
        var size = BitOperations.RoundUpToPowerOf2((uint)bands.Count * 4 + 1);
        slots = new (byte[], Band)[size];
        shift = 64 - BitOperations.Log2(size);
        foreach (var band in bands)
        {
            var code = Encoding.UTF8.GetBytes(band.Code);
            var slot = Slot(code);
            while (slots[slot].Code is not null)
            {
                slot = (slot + 1) & (slots.Length - 1);
            }

            slots[slot] = (code, band);
        }
    }

    public bool TryGet(ReadOnlySpan<byte> code, [MaybeNullWhen(false)] out Band band)
    {
        for (var slot = Slot(code); slots[slot].Code is { } candidate; slot = (slot + 1) & (slots.Length - 1))
        {
            if (code.SequenceEqual(candidate))
            {
                band = slots[slot].Band;
                return true;
            }
        }

        band = null;
        return false;
    }

    // First and last eight bytes and the length tell nearly all codes apart; the rest only shares a slot.
    private int Slot(ReadOnlySpan<byte> code)
    {
        ulong first, last;
        if (code.Length >= 8)
        {
            first = BinaryPrimitives.ReadUInt64LittleEndian(code);
            last = BinaryPrimitives.ReadUInt64LittleEndian(code[^8..]);
        }
        else if (code.Length >= 4)
        {
            first = BinaryPrimitives.ReadUInt32LittleEndian(code);
            last = BinaryPrimitives.ReadUInt32LittleEndian(code[^4..]);
        }
        else
        {
            first = code.IsEmpty ? 0u : code[0];
            last = code.IsEmpty ? 0u : code[^1];
        }

        var mixed = (first ^ BitOperations.RotateLeft(last, 29) ^ (ulong)code.Length) * 0x9E3779B97F4A7C15;
        return (int)(mixed >> shift);
    }
}
