using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization;
using GlassPair.Web.Hosting;
using GlassPair.Web.Work;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Api;

/// <summary>Registers and maps the HTTP API.</summary>
public static class ApiSetup
{
    /// <summary>Where the API lives.</summary>
    public const string Root = "/api";

    /// <summary>Adds what the API needs.</summary>
    public static IServiceCollection AddGlassPairApi(this IServiceCollection services, IConfiguration configuration)
    {
        services.ConfigureHttpJsonOptions(options =>
        {
            options.SerializerOptions.NumberHandling = JsonNumberHandling.Strict;
            options.SerializerOptions.Converters.Add(new JsonStringEnumConverter(JsonNamingPolicy.CamelCase, allowIntegerValues: false));
        });
        services.Configure<RouteHandlerOptions>(options => options.ThrowOnBadRequest = true);
        services.AddProblemDetails(options => options.CustomizeProblemDetails = context =>
        {
            context.ProblemDetails.Extensions["traceId"] = context.HttpContext.TraceIdentifier;
            if (context.Exception is BadHttpRequestException or ServerBusyException)
            {
                context.ProblemDetails.Detail = context.Exception.Message;
            }

            if (context.Exception is ServerBusyException busy)
            {
                context.HttpContext.Response.Headers.RetryAfter = busy.RetryAfter.TotalSeconds.ToString("0", CultureInfo.InvariantCulture);
            }
        });
        return services;
    }

    /// <summary>Puts the API's error handling into the pipeline.</summary>
    public static WebApplication UseGlassPairApi(this WebApplication app)
    {
        app.UseWhen(context => context.Request.Path.StartsWithSegments(Root), api =>
        {
            api.UseExceptionHandler(new ExceptionHandlerOptions
            {
                StatusCodeSelector = StatusOf,
                SuppressDiagnosticsCallback = context => StatusOf(context.Exception) != StatusCodes.Status500InternalServerError,
            });
            api.UseStatusCodePages();
        });
        return app;
    }

    /// <summary>Maps the API's routes.</summary>
    public static WebApplication MapGlassPairApi(this WebApplication app)
    {
        RouteGroupBuilder api = app.MapGroup($"{Root}/v1");
        api.WithApiLimits(app.Services.GetRequiredService<IOptions<LimitOptions>>().Value);
        RouteGroupBuilder glasses = api.MapGroup("").WithTags("Glasses");
        Only(HttpMethods.Get, glasses, "stocks", GlassEndpoints.ListStocks);
        Only(HttpMethods.Get, glasses, "glasses", GlassEndpoints.ListGlasses);
        Only(HttpMethods.Get, glasses, "glasses/{maker}/{name}", GlassEndpoints.ShowGlass);
        Only(HttpMethods.Get, glasses, "glasses/{maker}/{name}/index", GlassEndpoints.ShowIndex);
        RouteGroupBuilder solutions = api.MapGroup("").WithTags("Solutions");
        Only(HttpMethods.Post, solutions, "pair", SolutionEndpoints.SolvePair);
        Only(HttpMethods.Post, solutions, "triplet", SolutionEndpoints.SolveTriplet);
        Only(HttpMethods.Post, solutions, "shortlist", ShortlistEndpoint.Rank);
        return app;
    }

    /// <summary>Maps a route for one method; the others get 405 with words, also where a fallback route would catch them.</summary>
    private static void Only(string method, RouteGroupBuilder group, string pattern, Delegate handler)
    {
        group.MapMethods(pattern, [method], handler);
        group.Map(pattern, (HttpResponse response) =>
        {
            response.Headers.Allow = method;
            return TypedResults.Problem(detail: $"Use {method} here.", statusCode: StatusCodes.Status405MethodNotAllowed);
        }).ExcludeFromDescription();
    }

    private static int StatusOf(Exception problem) => problem switch
    {
        BadHttpRequestException bad => bad.StatusCode,
        ServerBusyException => StatusCodes.Status503ServiceUnavailable,
        _ => StatusCodes.Status500InternalServerError,
    };
}
