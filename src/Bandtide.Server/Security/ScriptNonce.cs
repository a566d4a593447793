using System.Security.Cryptography;

namespace Bandtide.Server.Security;

/// <summary>The nonce of one page's own inline scripts, named in its Content-Security-Policy.</summary>
public sealed class ScriptNonce
{
    /// <summary>128 random bits, base64.</summary>
    public string Value { get; } = Convert.ToBase64String(RandomNumberGenerator.GetBytes(16));
}
