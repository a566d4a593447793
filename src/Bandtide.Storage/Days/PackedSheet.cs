using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Days;

/// <summary>A sheet as stored, with what the table keeps beside it so that most questions need not unpack it.</summary>
/// <param name="Bytes">The packed cells.</param>
/// <param name="Checksum">16 bytes, equal exactly when the cells are.</param>
/// <param name="CellCount">At least 1.</param>
/// <param name="HoursMask">Hours with at least one cell, bit h for hour h.</param>
/// <param name="BandCount">Bands with at least one cell.</param>
internal sealed record PackedSheet(byte[] Bytes, byte[] Checksum, int CellCount, int HoursMask, int BandCount)
{
    public static PackedSheet Of(CellGrid cells, BandPlan plan) =>
        new(SheetCodec.Encode(cells), ChecksumOf(cells, plan), cells.Count, cells.HoursMask(), cells.BandCount);

    public static byte[] ChecksumOf(CellGrid cells, BandPlan plan) => Convert.FromHexString(SheetChecksum.Compute(cells, plan));

    /// <summary>A checksum as receipts show it.</summary>
    public static string Text(byte[]? checksum) => checksum is null ? "" : Convert.ToHexStringLower(checksum);
}
