using System.Text.Json;
using System.Text.Json.Serialization;

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
            if (context.Exception is BadHttpRequestException bad)
            {
                context.ProblemDetails.Detail = bad.Message;
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
                StatusCodeSelector = problem => problem is BadHttpRequestException bad ? bad.StatusCode : StatusCodes.Status500InternalServerError,
                SuppressDiagnosticsCallback = context => context.Exception is BadHttpRequestException,
            });
            api.UseStatusCodePages();
        });
        return app;
    }

    /// <summary>Maps the API's routes.</summary>
    public static WebApplication MapGlassPairApi(this WebApplication app)
    {
        RouteGroupBuilder api = app.MapGroup($"{Root}/v1");
        RouteGroupBuilder glasses = api.MapGroup("").WithTags("Glasses");
        glasses.MapGet("stocks", GlassEndpoints.ListStocks);
        glasses.MapGet("glasses", GlassEndpoints.ListGlasses);
        glasses.MapGet("glasses/{maker}/{name}", GlassEndpoints.ShowGlass);
        glasses.MapGet("glasses/{maker}/{name}/index", GlassEndpoints.ShowIndex);
        RouteGroupBuilder solutions = api.MapGroup("").WithTags("Solutions");
        solutions.MapPost("pair", SolutionEndpoints.SolvePair);
        solutions.MapPost("triplet", SolutionEndpoints.SolveTriplet);
        solutions.MapPost("shortlist", ShortlistEndpoint.Rank);
        return app;
    }
}
