namespace Bandtide.Core.Tiles;

/// <summary>The stored bytes of a month tile are not what was written. Nothing was decoded.</summary>
public sealed class TileCorruptException : Exception
{
    /// <summary>Says what is wrong.</summary>
    public TileCorruptException(string message)
        : base(message)
    {
    }

    /// <summary>Says what is wrong and what found it.</summary>
    public TileCorruptException(string message, Exception inner)
        : base(message, inner)
    {
    }

    /// <summary>Without a reason; serializers only.</summary>
    public TileCorruptException()
    {
    }
}
