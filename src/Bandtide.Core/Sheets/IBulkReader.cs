namespace Bandtide.Core.Sheets;

/// <summary>Reads a body of many days as it arrives, in memory bounded by one day.</summary>
public interface IBulkReader
{
    /// <summary>Problems with the header, which refuse the whole body; known once its line is complete.</summary>
    IReadOnlyList<SheetProblem> HeaderProblems { get; }

    /// <summary>Whether the header has been read, or there is none to read.</summary>
    bool HeaderRead { get; }

    /// <summary>Whether nothing more will come out, whatever is fed: the header is bad, a quote stays open, or days are too many.</summary>
    bool Stopped { get; }

    /// <summary>Takes the next bytes, cut anywhere.</summary>
    /// <param name="chunk">The bytes.</param>
    /// <param name="completed">Receives every day that is complete now, in the order of the body.</param>
    void Feed(ReadOnlySpan<byte> chunk, ICollection<BulkDay> completed);

    /// <summary>Ends the reading.</summary>
    /// <param name="endedProperly">Whether the body ended as its sender meant; otherwise the last day is not given out.</param>
    /// <param name="completed">Receives what is complete now.</param>
    void Finish(bool endedProperly, ICollection<BulkDay> completed);
}
