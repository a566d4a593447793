using System.Globalization;
using System.Net;
using System.Text;

namespace Bandtide.Server.Figures;

/// <summary>Writes SVG: numbers with a decimal point, texts escaped.</summary>
internal sealed class SvgWriter
{
    private readonly StringBuilder text = new();

    /// <summary>Writes markup whose holes are numbers and texts; texts are escaped, numbers get at most three decimals.</summary>
    public SvgWriter Add(FormattableString markup)
    {
        ArgumentNullException.ThrowIfNull(markup);
        text.AppendFormat(Escaping.Instance, markup.Format, markup.GetArguments());
        return this;
    }

    /// <summary>Writes markup that was made by this class before.</summary>
    public SvgWriter AddRaw(string markup)
    {
        text.Append(markup);
        return this;
    }

    /// <summary>What was written.</summary>
    public override string ToString() => text.ToString();

    private sealed class Escaping : IFormatProvider, ICustomFormatter
    {
        public static Escaping Instance { get; } = new();

        public object? GetFormat(Type? formatType) => formatType == typeof(ICustomFormatter) ? this : null;

        public string Format(string? format, object? arg, IFormatProvider? formatProvider) => arg switch
        {
            double number => number.ToString(format ?? "0.###", CultureInfo.InvariantCulture),
            IFormattable other => other.ToString(format, CultureInfo.InvariantCulture),
            _ => WebUtility.HtmlEncode(arg?.ToString()) ?? "",
        };
    }
}
