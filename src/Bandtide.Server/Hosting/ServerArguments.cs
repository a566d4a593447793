namespace Bandtide.Server.Hosting;

/// <summary>The command line, taken apart.</summary>
/// <param name="Command">A command on the store and what follows it; empty when the server is to start.</param>
/// <param name="IsDemo">Whether an empty store is to be filled with the demonstration scenario.</param>
/// <param name="Settings">The rest: settings of the configuration.</param>
internal sealed record ServerArguments(IReadOnlyList<string> Command, bool IsDemo, string[] Settings)
{
    private const string Demo = "--demo";

    /// <summary>Takes a command line apart. <c>--demo</c> has no value, which the configuration's own reader would look for.</summary>
    public static ServerArguments Parse(string[] args)
    {
        string[] rest = [.. args.Where(arg => !string.Equals(arg, Demo, StringComparison.Ordinal))];
        return new(StoreCommands.Of(rest) is null ? [] : [.. rest.TakeWhile(arg => !arg.StartsWith('-'))], rest.Length < args.Length, rest);
    }
}
