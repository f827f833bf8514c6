using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization;
using GlassPair.Web.Hosting;
using GlassPair.Web.Work;
using Microsoft.Extensions.Options;
using Scalar.AspNetCore;

namespace GlassPair.Web.Api;

/// <summary>Registers and maps the HTTP API.</summary>
public static class ApiSetup
{
    /// <summary>Where the API lives.</summary>
    public const string Root = "/api";

    /// <summary>What is said to a client that sends anything but JSON.</summary>
    internal const string WrongContentType = "The body must be JSON: send it with the header Content-Type: application/json.";

    /// <summary>Adds what the API needs.</summary>
    public static IServiceCollection AddGlassPairApi(this IServiceCollection services, IConfiguration configuration)
    {
        services.ConfigureHttpJsonOptions(options =>
        {
            options.SerializerOptions.NumberHandling = JsonNumberHandling.Strict;
            options.SerializerOptions.Converters.Add(new JsonStringEnumConverter(JsonNamingPolicy.CamelCase, allowIntegerValues: false));
        });
        services.Configure<RouteHandlerOptions>(options => options.ThrowOnBadRequest = true);
        services.AddProblemDetails(options => options.CustomizeProblemDetails = AddWords);
        services.AddOpenApi("v1", ApiDocument.Configure);
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

    /// <summary>Maps the API's routes, its OpenAPI document, and the reference page.</summary>
    public static WebApplication MapGlassPairApi(this WebApplication app)
    {
        RouteGroupBuilder api = app.MapGroup($"{Root}/v1");
        api.WithApiLimits(app.Services.GetRequiredService<IOptions<LimitOptions>>().Value);
        api.ProducesProblem(StatusCodes.Status400BadRequest).ProducesProblem(StatusCodes.Status429TooManyRequests);

        RouteGroupBuilder glasses = api.MapGroup("").WithTags("Glasses");
        Get(glasses, "stocks", GlassEndpoints.ListStocks);
        Get(glasses, "glasses", GlassEndpoints.ListGlasses, GlassEndpoints.ListParameters).ProducesProblem(StatusCodes.Status404NotFound);
        Get(glasses, "glasses/{maker}/{name}", GlassEndpoints.ShowGlass, GlassEndpoints.GlassParameters).ProducesProblem(StatusCodes.Status404NotFound);
        Get(glasses, "glasses/{maker}/{name}/index", GlassEndpoints.ShowIndex, GlassEndpoints.IndexParameters)
            .ProducesProblem(StatusCodes.Status404NotFound)
            .ProducesProblem(StatusCodes.Status422UnprocessableEntity);
        Post(glasses, "fit", FitEndpoint.Fit, Examples.Fit);

        RouteGroupBuilder solutions = api.MapGroup("").WithTags("Solutions").ProducesProblem(StatusCodes.Status404NotFound);
        Post(solutions, "pair", SolutionEndpoints.SolvePair, Examples.Pair);
        Post(solutions, "triplet", SolutionEndpoints.SolveTriplet, Examples.Triplet);
        Post(solutions, "shortlist", ShortlistEndpoint.Rank, Examples.Shortlist)
            .ProducesProblem(StatusCodes.Status503ServiceUnavailable)
            .ProducesProblem(StatusCodes.Status504GatewayTimeout);

        RouteGroupBuilder lenses = api.MapGroup("").WithTags("Lenses").ProducesProblem(StatusCodes.Status404NotFound);
        Post(lenses, "trace", TraceEndpoint.Trace, Examples.Trace).ProducesProblem(StatusCodes.Status503ServiceUnavailable);

        app.MapOpenApi();
        app.MapScalarApiReference(SecurityHeaders.ReferencePage, (options, context) => options
            .WithTitle("GlassPair API")
            .WithNonce(context.Nonce())
            .DisableDefaultFonts()
            .DisableAgent()
            .DisableMcp()
            .DisableTelemetry()
            .HideDeveloperTools()
            .HideClientButton());
        return app;
    }

    private static RouteHandlerBuilder Get(RouteGroupBuilder group, string pattern, Delegate handler, params QueryParameter[] parameters) =>
        Only(HttpMethods.Get, group, pattern, handler).WithMetadata([.. parameters]);

    private static RouteHandlerBuilder Post(RouteGroupBuilder group, string pattern, Delegate handler, string example) =>
        Only(HttpMethods.Post, group, pattern, handler)
            .WithMetadata(new BodyExample(example))
            .ProducesProblem(StatusCodes.Status413PayloadTooLarge)
            .ProducesProblem(StatusCodes.Status415UnsupportedMediaType)
            .ProducesProblem(StatusCodes.Status422UnprocessableEntity);

    /// <summary>Maps a route for one method; what does not fit gets words, also where a fallback route would catch it.</summary>
    private static RouteHandlerBuilder Only(string method, RouteGroupBuilder group, string pattern, Delegate handler)
    {
        group.Map(pattern, (HttpContext context) =>
        {
            if (context.Request.Method == method)
            {
                return TypedResults.Problem(detail: WrongContentType, statusCode: StatusCodes.Status415UnsupportedMediaType);
            }

            context.Response.Headers.Allow = method;
            return TypedResults.Problem(detail: $"Use {method} here.", statusCode: StatusCodes.Status405MethodNotAllowed);
        }).ExcludeFromDescription();
        return group.MapMethods(pattern, [method], handler).WithName(handler.Method.Name);
    }

    private static int StatusOf(Exception problem) => problem switch
    {
        BadHttpRequestException bad => bad.StatusCode,
        ServerBusyException => StatusCodes.Status503ServiceUnavailable,
        _ => StatusCodes.Status500InternalServerError,
    };

    private static void AddWords(ProblemDetailsContext context)
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
    }
}
