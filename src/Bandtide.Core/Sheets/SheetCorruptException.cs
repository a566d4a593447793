namespace Bandtide.Core.Sheets;

/// <summary>The stored bytes of a day sheet are not what was written. Nothing was decoded.</summary>
public sealed class SheetCorruptException : Exception
{
    /// <summary>Says what is wrong.</summary>
    public SheetCorruptException(string message)
        : base(message)
    {
    }

    /// <summary>Says what is wrong and what found it.</summary>
    public SheetCorruptException(string message, Exception inner)
        : base(message, inner)
    {
    }

    /// <summary>Without a reason; serializers only.</summary>
    public SheetCorruptException()
    {
    }
}
