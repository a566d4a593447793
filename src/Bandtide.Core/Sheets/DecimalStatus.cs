namespace Bandtide.Core.Sheets;

/// <summary>What reading a number gave.</summary>
internal enum DecimalStatus
{
    Ok,
    Syntax,
    NotFinite,
}
