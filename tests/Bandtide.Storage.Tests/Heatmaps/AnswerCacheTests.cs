using Bandtide.Storage.Heatmaps;

namespace Bandtide.Storage.Tests.Heatmaps;

public sealed class AnswerCacheTests
{
    // An outcome without cells counts a thousand bytes.
    private const int OutcomeBytes = 1000;

    [Fact]
    public void An_answer_is_found_under_its_question_and_state_alone()
    {
        var cache = new AnswerCache(10 * OutcomeBytes);
        var outcome = new HeatmapOutcome.Refused("region", "rule", "message");
        cache.Add("a", "1", outcome);

        Assert.Same(outcome, cache.Find("a", "1"));
        Assert.Null(cache.Find("a", "2"));
        Assert.Null(cache.Find("b", "1"));
    }

    [Fact]
    public void The_answer_that_was_used_longest_ago_leaves_first()
    {
        var cache = new AnswerCache(2 * OutcomeBytes);
        foreach (var question in new[] { "a", "b" })
        {
            cache.Add(question, "1", new HeatmapOutcome.Refused("region", "rule", question));
        }

        cache.Find("a", "1");
        cache.Add("c", "1", new HeatmapOutcome.Refused("region", "rule", "c"));

        Assert.NotNull(cache.Find("a", "1"));
        Assert.Null(cache.Find("b", "1"));
        Assert.NotNull(cache.Find("c", "1"));
    }
}
