namespace Bandtide.Server.Hosting;

/// <summary>A setting that the server cannot start with; the message names its key.</summary>
internal sealed class SettingException(string message) : Exception(message);
