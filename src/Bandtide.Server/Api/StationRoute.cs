using System.Diagnostics.CodeAnalysis;
using Bandtide.Core;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Server.Security;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>Turns the path values of a station's calls into values, in the contract's order of judgement.</summary>
internal static class StationRoute
{
    /// <summary>A station that anyone may read.</summary>
    public static bool TryFind(NetworkView network, string code, [NotNullWhen(true)] out Station? station, [NotNullWhen(false)] out IResult? problem)
    {
        station = network.FindStation(code);
        problem = station is not null ? null
            : Codes.IsValid(code) ? Problems.NotFound($"There is no station '{code}'.")
            : Problems.Bad("code", "code-syntax", "A station's code is 2 to 24 of a-z, 0-9 and -.");
        return problem is null;
    }

    /// <summary>A station that the caller may write.</summary>
    public static bool TryWrite(
        HttpContext context, NetworkView network, string code, [NotNullWhen(true)] out Station? station, [NotNullWhen(false)] out IResult? problem)
    {
        if (!TryFind(network, code, out station, out problem))
        {
            return false;
        }

        problem = Caller.MayWrite(context, station) ? null : Problems.Forbidden();
        return problem is null;
    }

    /// <summary>A date of the path.</summary>
    public static bool TryDate(string text, out DateOnly date, [NotNullWhen(false)] out IResult? problem)
    {
        problem = DateText.TryParse(text, out date) ? null : Problems.Bad("date", "date-syntax", "A date is written yyyy-MM-dd.");
        return problem is null;
    }
}
