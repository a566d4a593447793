// Stands in for the packed formats until the core has them.
#pragma warning disable
using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Tiles;

namespace Bandtide.Storage
{
    internal static class Prov
    {
        extension(MonthTile)
        {
            public static MonthTile? FromSheets(Measure m, IReadOnlyList<CellGrid> sheets)
            {
                var ids = sheets.SelectMany(g => g.BandIds.ToArray()).Distinct().Order().ToArray();
                var days = new byte[ids.Length * 24]; var sums = new int[days.Length]; var any = false;
                foreach (var g in sheets) for (var h = 0; h < 24; h++) for (var b = 0; b < g.BandCount; b++)
                {
                    var v = m switch { Measure.Occupancy => g[Quantity.Occupancy, h, b], Measure.Signal => g[Quantity.Signal, h, b],
                        Measure.Excess => g[Quantity.Signal, h, b] is var s && s != CellGrid.Missing && g[Quantity.Floor, h, b] is var f && f != CellGrid.Missing ? s - f : CellGrid.Missing,
                        Measure.Level => g[Quantity.Level, h, b], Measure.LevelP90 => g[Quantity.LevelP90, h, b], Measure.Floor => g[Quantity.Floor, h, b], _ => g[Quantity.Steady, h, b] };
                    if (v == CellGrid.Missing) continue;
                    var i = h * ids.Length + Array.BinarySearch(ids, g.BandIds[b]); days[i]++; sums[i] += v; any = true;
                }
                return any ? new(ids, days, sums) : null;
            }
        }
    }
    internal static class MonthTileCodec
    {
        public static byte[] Encode(MonthTile t) { var w = new MemoryStream(); var b = new BinaryWriter(w); b.Write(t.BandCount); foreach (var i in t.BandIds) b.Write(i); b.Write(t.Days); foreach (var s in t.Sums) b.Write(s); return w.ToArray(); }
        public static MonthTile Decode(byte[] x) { var r = new BinaryReader(new MemoryStream(x)); var ids = new short[r.ReadInt32()]; for (var i = 0; i < ids.Length; i++) ids[i] = r.ReadInt16(); var d = r.ReadBytes(ids.Length * 24); var s = new int[d.Length]; for (var i = 0; i < s.Length; i++) s[i] = r.ReadInt32(); return new(ids, d, s); }
    }
}
