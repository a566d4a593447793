using System.Net;
using Microsoft.AspNetCore.Antiforgery;

namespace Bandtide.Server.Hosting;

/// <summary>The page behind the first coordinator's link.</summary>
internal static class SetupPage
{
    public static void MapSetupPage(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/setup/{token}", Show).ExcludeFromDescription();
        routes.MapPost("/setup/{token}", RedeemAsync).ExcludeFromDescription().DisableAntiforgery();
    }

    private static IResult Show(string token, HttpContext context, FirstCoordinator first, IAntiforgery antiforgery)
    {
        if (!first.IsGood(token))
        {
            return Page("Link not good", "<p>This link has been used, or the server has started again since. A new start prints a new one.</p>", 404);
        }

        var tokens = antiforgery.GetAndStoreTokens(context);
        return Page("First coordinator", $"""
            <p>Make the key of the first coordinator. It is shown once: keep it in a password manager. Whoever has it may register
            stations, make keys and write every station's days.</p>
            <form method="post"><input type="hidden" name="{tokens.FormFieldName}" value="{WebUtility.HtmlEncode(tokens.RequestToken)}">
            <button type="submit">Make the key</button></form>
            """);
    }

    private static async Task<IResult> RedeemAsync(
        string token, HttpContext context, FirstCoordinator first, IAntiforgery antiforgery, CancellationToken ct)
    {
        if (!await IsFromPageAsync(antiforgery, context))
        {
            return Page("Not sent from this page", "<p>Open the link again and use its button.</p>", 400);
        }

        context.Response.Headers.CacheControl = "no-store";
        return await first.RedeemAsync(token, ct) is { } key
            ? Page("Your key", $"<p>Keep it now; it will not be shown again.</p><p><code>{WebUtility.HtmlEncode(key)}</code></p><p><a href=\"/data\">How to use it</a></p>")
            : Page("Link not good", "<p>This link has been used already.</p>", 404);
    }

    private static async Task<bool> IsFromPageAsync(IAntiforgery antiforgery, HttpContext context)
    {
        try
        {
            return await antiforgery.IsRequestValidAsync(context);
        }
        catch (AntiforgeryValidationException)
        {
            // The form could not be read at all.
            return false;
        }
    }

    private static IResult Page(string title, string body, int status = 200) => Results.Content($"""
        <!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
        <title>{title} · Bandtide</title><link rel="stylesheet" href="/css/app.css"></head>
        <body><main><h1>{title}</h1>{body}</main></body></html>
        """, "text/html; charset=utf-8", statusCode: status);
}
