namespace Bandtide.Server.Api;

/// <summary>Where the API stands.</summary>
internal static class Routes
{
    public const string Base = "/api/v1";
}
