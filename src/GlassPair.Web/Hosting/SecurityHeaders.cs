using System.Security.Cryptography;

namespace GlassPair.Web.Hosting;

/// <summary>Headers that tell the browser what a page of this site may do.</summary>
public static class SecurityHeaders
{
    /// <summary>Where the reference page of the API lives; it alone writes style elements of its own.</summary>
    public const string ReferencePage = "/api-docs";

    private const int NonceBytes = 16;
    private static readonly object NonceKey = new();

    /// <summary>Gets the request's random word that lets an inline script run.</summary>
    public static string Nonce(this HttpContext context) =>
        (string)(context.Items[NonceKey] ??= Convert.ToBase64String(RandomNumberGenerator.GetBytes(NonceBytes)));

    /// <summary>Adds the headers to every answer, also where an error handler has cleared it.</summary>
    public static IApplicationBuilder UseSecurityHeaders(this WebApplication app)
    {
        bool development = app.Environment.IsDevelopment();
        return app.Use((context, next) =>
        {
            context.Response.OnStarting(() =>
            {
                Write(context, development);
                return Task.CompletedTask;
            });
            return next(context);
        });
    }

    private static void Write(HttpContext context, bool development)
    {
        IHeaderDictionary headers = context.Response.Headers;
        headers.ContentSecurityPolicy = Policy(context, development);
        headers.XContentTypeOptions = "nosniff";
        headers.XFrameOptions = "DENY";
        headers["Referrer-Policy"] = "no-referrer";
        headers["Permissions-Policy"] = "camera=(), geolocation=(), microphone=(), payment=(), usb=()";
        headers["Cross-Origin-Opener-Policy"] = "same-origin";
    }

    private static string Policy(HttpContext context, bool development)
    {
        // The hash is that of the empty text: the charts insert an empty style element and fill it by script.
        string styles = context.Request.Path.StartsWithSegments(ReferencePage)
            ? "style-src 'self' 'unsafe-inline'"
            : "style-src 'self' 'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='; style-src-attr 'unsafe-inline'";

        // The tools that reload a page while one edits it listen on a port of their own.
        string connections = development ? "connect-src 'self' ws://localhost:* wss://localhost:*" : "connect-src 'self'";
        return "default-src 'self'; object-src 'none'; base-uri 'self'; form-action 'self'; frame-ancestors 'none'; "
            + $"img-src 'self' data: blob:; font-src 'self'; {connections}; script-src 'self' 'nonce-{context.Nonce()}'; {styles}";
    }
}
