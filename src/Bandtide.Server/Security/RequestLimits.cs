using System.Net;
using System.Threading.RateLimiting;
using Microsoft.Extensions.Options;

namespace Bandtide.Server.Security;

/// <summary>Token buckets per key and, for refused keys alone, per address.</summary>
internal sealed class RequestLimits(IOptions<RateLimitOptions> options) : IDisposable
{
    private readonly PartitionedRateLimiter<int> keys = Buckets<int>(options.Value.KeyPerSecond, options.Value.KeyBurst);
    private readonly PartitionedRateLimiter<IPAddress> failures = Buckets<IPAddress>(options.Value.FailuresPerSecond, options.Value.FailureBurst);

    /// <summary>Counts a request with a good key; the time to wait when there are too many.</summary>
    public TimeSpan? Exceeded(int keyId) => Exceeded(keys, keyId);

    /// <summary>Counts a refused key; the time to wait when there are too many.</summary>
    public TimeSpan? FailuresExceeded(IPAddress? address) => Exceeded(failures, address ?? IPAddress.None);

    public void Dispose()
    {
        keys.Dispose();
        failures.Dispose();
    }

    private static TimeSpan? Exceeded<T>(PartitionedRateLimiter<T> limiter, T partition)
    {
        using var lease = limiter.AttemptAcquire(partition);
        return lease.IsAcquired ? null
            : lease.TryGetMetadata(MetadataName.RetryAfter, out var wait) ? wait
            : TimeSpan.FromSeconds(1);
    }

    private static PartitionedRateLimiter<T> Buckets<T>(int perSecond, int burst)
        where T : notnull => PartitionedRateLimiter.Create<T, T>(partition => RateLimitPartition.GetTokenBucketLimiter(partition, _ => new()
        {
            TokenLimit = burst,
            TokensPerPeriod = perSecond,
            ReplenishmentPeriod = TimeSpan.FromSeconds(1),
            QueueLimit = 0,
        }));
}
