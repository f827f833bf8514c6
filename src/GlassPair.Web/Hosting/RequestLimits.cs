using System.Globalization;
using System.Threading.RateLimiting;
using GlassPair.Web.Api;
using Microsoft.AspNetCore.Http.Metadata;
using Microsoft.AspNetCore.Http.Timeouts;
using Microsoft.AspNetCore.RateLimiting;
using Microsoft.AspNetCore.Server.Kestrel.Core;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Hosting;

/// <summary>Puts the limits of <see cref="LimitOptions"/> on requests.</summary>
public static class RequestLimits
{
    private const string Calls = "api";
    private const int BytesPerKilobyte = 1_024;

    /// <summary>Adds the limits.</summary>
    public static IServiceCollection AddRequestLimits(this IServiceCollection services, IConfiguration configuration)
    {
        services.AddOptions<LimitOptions>().Bind(configuration.GetSection("GlassPair:Limits")).ValidateDataAnnotations().ValidateOnStart();
        services.AddRequestTimeouts();
        services.AddRateLimiter(limiter =>
        {
            limiter.RejectionStatusCode = StatusCodes.Status429TooManyRequests;
            limiter.OnRejected = RefuseAsync;
            limiter.AddPolicy(Calls, context => RateLimitPartition.GetFixedWindowLimiter(
                context.Connection.RemoteIpAddress,
                _ => new FixedWindowRateLimiterOptions { PermitLimit = LimitsOf(context).ApiCallsPerMinute, Window = TimeSpan.FromMinutes(1) }));
        });
        services.AddOptions<KestrelServerOptions>().Configure<IOptions<LimitOptions>>((kestrel, limits) =>
        {
            kestrel.AddServerHeader = false;
            kestrel.Limits.MaxRequestBodySize = limits.Value.BodyKilobytes * BytesPerKilobyte;
            kestrel.Limits.RequestHeadersTimeout = TimeSpan.FromSeconds(10);
            kestrel.Limits.MaxConcurrentUpgradedConnections = limits.Value.ConnectedPages;

            // Long enough to answer in words where a query is too long.
            kestrel.Limits.MaxRequestLineSize = 2 * limits.Value.QueryKilobytes * BytesPerKilobyte;
        });
        return services;
    }

    /// <summary>Enforces the limits.</summary>
    public static WebApplication UseRequestLimits(this WebApplication app)
    {
        app.Use(RefuseLongQueryAsync);
        app.UseRateLimiter();
        app.UseRequestTimeouts();
        return app;
    }

    /// <summary>Puts the limits of the API on routes.</summary>
    public static IEndpointConventionBuilder WithApiLimits(this IEndpointConventionBuilder routes, LimitOptions limits) =>
        routes.RequireRateLimiting(Calls)
            .WithRequestTimeout(new RequestTimeoutPolicy
            {
                Timeout = TimeSpan.FromSeconds(limits.ApiSeconds),
                TimeoutStatusCode = StatusCodes.Status504GatewayTimeout,
            })
            .WithMetadata(new BodyLimit(limits.ApiBodyKilobytes * BytesPerKilobyte));

    private static LimitOptions LimitsOf(HttpContext context) => context.RequestServices.GetRequiredService<IOptions<LimitOptions>>().Value;

    private static async ValueTask RefuseAsync(OnRejectedContext rejected, CancellationToken cancellation)
    {
        HttpContext context = rejected.HttpContext;
        TimeSpan wait = rejected.Lease.TryGetMetadata(MetadataName.RetryAfter, out TimeSpan after) ? after : TimeSpan.FromMinutes(1);
        context.Response.Headers.RetryAfter = Math.Ceiling(wait.TotalSeconds).ToString("0", CultureInfo.InvariantCulture);
        await TypedResults.Problem(
            statusCode: StatusCodes.Status429TooManyRequests,
            detail: FormattableString.Invariant($"One address may make {LimitsOf(context).ApiCallsPerMinute} calls a minute. Go on after the seconds of the header Retry-After."))
            .ExecuteAsync(context);
    }

    private static Task RefuseLongQueryAsync(HttpContext context, RequestDelegate next)
    {
        int longest = LimitsOf(context).QueryKilobytes * BytesPerKilobyte;
        if ((context.Request.QueryString.Value?.Length ?? 0) <= longest)
        {
            return next(context);
        }

        string words = FormattableString.Invariant($"The address is too long: what follows its question mark may hold {longest} characters.");
        IResult answer = context.Request.Path.StartsWithSegments(ApiSetup.Root)
            ? TypedResults.Problem(statusCode: StatusCodes.Status414UriTooLong, detail: words)
            : TypedResults.Text(words, statusCode: StatusCodes.Status414UriTooLong);
        return answer.ExecuteAsync(context);
    }

    private sealed record BodyLimit(long? MaxRequestBodySize) : IRequestSizeLimitMetadata;
}
