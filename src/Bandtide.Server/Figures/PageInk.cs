namespace Bandtide.Server.Figures;

/// <summary>The colours a live chart needs from the page it lies on: the chart paints pixels that no style sheet reaches.</summary>
/// <param name="IsDark">Whether the page is dark.</param>
/// <param name="Paper">The paper.</param>
/// <param name="Ink">Text and rules.</param>
/// <param name="Second">Sunrise and sunset.</param>
/// <param name="MarkLow">Marks on low values.</param>
/// <param name="MarkHigh">Marks on high values.</param>
internal sealed record PageInk(bool IsDark, string Paper, string Ink, string Second, string MarkLow, string MarkHigh);
