using System.Data.Common;
using Microsoft.Extensions.Options;

namespace Bandtide.Server.Hosting;

/// <summary>Turns what an operator can mend into a sentence: a wrong setting, a taken port, a store out of reach.</summary>
internal static class StartFailure
{
    /// <summary>The sentence, or <c>null</c> when the exception is a fault of the program.</summary>
    public static string? Describe(Exception failure) => failure switch
    {
        SettingException or UnauthorizedAccessException or IOException => failure.Message,
        OptionsValidationException settings => string.Join(Environment.NewLine, settings.Failures),
        DbException => $"The store cannot be opened: {failure.Message}",
        InvalidOperationException or FormatException when IsAboutSettings(failure.Source) => failure.Message,
        _ => null,
    };

    // Values of the wrong kind, and addresses that cannot be listened on.
    private static bool IsAboutSettings(string? source) =>
        source is "Microsoft.Extensions.Configuration.Binder" or "Microsoft.AspNetCore.Http" or "Microsoft.AspNetCore.Server.Kestrel.Core";
}
