using System.Buffers.Text;
using System.Security.Cryptography;
using System.Text;
using Bandtide.Storage.Keys;
using Microsoft.Extensions.Options;

namespace Bandtide.Server.Hosting;

/// <summary>Lets the first coordinator in: by a key of the configuration, or by a link that works once.</summary>
/// <remarks>The link's token is kept as a hash in memory alone; a restart makes a new one as long as there is no coordinator.</remarks>
internal sealed class FirstCoordinator(KeyStore keys, IOptions<SetupOptions> options)
{
    private byte[]? token;

    /// <summary>Makes the configured key good, or makes a link.</summary>
    /// <returns>The path of the link, or <c>null</c> when there is a coordinator already.</returns>
    public async Task<string?> PrepareAsync(CancellationToken ct)
    {
        if (options.Value.CoordinatorKey is { } key)
        {
            await keys.EnsureAsync(key, stationId: null, loopbackOnly: false, "from the configuration", ct);
            return null;
        }

        if (await keys.HasCoordinatorAsync(ct))
        {
            return null;
        }

        var text = Base64Url.EncodeToString(RandomNumberGenerator.GetBytes(24));
        token = SHA256.HashData(Encoding.UTF8.GetBytes(text));
        return $"/setup/{text}";
    }

    /// <summary>Whether a text is the link's token, and the link has not been used.</summary>
    public bool IsGood(string text) =>
        token is { } good && CryptographicOperations.FixedTimeEquals(good, SHA256.HashData(Encoding.UTF8.GetBytes(text)));

    /// <summary>Uses the link up.</summary>
    /// <returns>The coordinator's key, or <c>null</c> when the link is not good.</returns>
    public async Task<string?> RedeemAsync(string text, CancellationToken ct)
    {
        if (!IsGood(text) || Interlocked.Exchange(ref token, null) is null)
        {
            return null;
        }

        return (await keys.IssueAsync(stationId: null, "first coordinator", ct)).Key;
    }
}
