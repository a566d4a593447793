namespace Bandtide.Storage.Heatmaps;

/// <summary>Finished outcomes by question and state, the least recently used leaving first.</summary>
internal sealed class AnswerCache(long capacityBytes)
{
    private const int BytesPerCell = 40;
    private const int BytesPerAnswer = 1000;

    private readonly Lock gate = new();
    private readonly Dictionary<(string Query, string Revision), LinkedListNode<Entry>> answers = [];
    private readonly LinkedList<Entry> byUse = [];
    private long bytes;

    public HeatmapOutcome? Find(string query, string revision)
    {
        lock (gate)
        {
            if (!answers.TryGetValue((query, revision), out var node))
            {
                return null;
            }

            byUse.Remove(node);
            byUse.AddFirst(node);
            return node.Value.Outcome;
        }
    }

    public void Add(string query, string revision, HeatmapOutcome outcome)
    {
        var size = BytesPerAnswer + (outcome is HeatmapOutcome.Answered { Answer: var answer } ? answer.Heatmap.Cells.Length * BytesPerCell : 0);
        lock (gate)
        {
            if (size > capacityBytes || answers.ContainsKey((query, revision)))
            {
                return;
            }

            answers.Add((query, revision), byUse.AddFirst(new Entry(query, revision, outcome, size)));
            bytes += size;
            while (bytes > capacityBytes)
            {
                var oldest = byUse.Last!.Value;
                byUse.RemoveLast();
                answers.Remove((oldest.Query, oldest.Revision));
                bytes -= oldest.Bytes;
            }
        }
    }

    private sealed record Entry(string Query, string Revision, HeatmapOutcome Outcome, int Bytes);
}
