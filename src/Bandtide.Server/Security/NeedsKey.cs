namespace Bandtide.Server.Security;

/// <summary>Marks an endpoint that nobody may call without a key.</summary>
internal sealed class NeedsKey
{
    public static readonly NeedsKey Instance = new();
}
