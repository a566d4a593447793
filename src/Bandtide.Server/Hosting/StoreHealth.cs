using Bandtide.Storage.Network;
using Microsoft.Extensions.Diagnostics.HealthChecks;

namespace Bandtide.Server.Hosting;

/// <summary>Whether the store answers: what readiness means. The framework turns an exception into the reason why not.</summary>
internal sealed class StoreHealth(NetworkStore network) : IHealthCheck
{
    /// <inheritdoc/>
    public async Task<HealthCheckResult> CheckHealthAsync(HealthCheckContext context, CancellationToken cancellationToken = default)
    {
        await network.GetAsync(cancellationToken);
        return HealthCheckResult.Healthy("The store answers.");
    }
}
