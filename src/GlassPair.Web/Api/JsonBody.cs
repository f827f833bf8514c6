using System.Reflection;
using System.Text.Json;
using Microsoft.AspNetCore.Http.Json;
using Microsoft.AspNetCore.Http.Metadata;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Api;

/// <summary>A request's body as far as it could be read, with everything that is wrong in it.</summary>
/// <typeparam name="T">What the body should be.</typeparam>
public sealed class JsonBody<T> : IBindableFromHttpContext<JsonBody<T>>, IEndpointParameterMetadataProvider
    where T : class
{
    private static readonly JsonDocumentOptions Strict = new() { MaxDepth = 16 };

    private JsonBody(T value, FieldFaults faults) => (Value, Faults) = (value, faults);

    /// <summary>Gets the value; a faulty field has its default.</summary>
    public T Value { get; }

    /// <summary>Gets what is wrong.</summary>
    public FieldFaults Faults { get; }

    /// <summary>Reads the body; <see cref="BadHttpRequestException"/> where it is not JSON by its content type (415), or too large (413).</summary>
    static async ValueTask<JsonBody<T>?> IBindableFromHttpContext<JsonBody<T>>.BindAsync(HttpContext context, ParameterInfo parameter)
    {
        if (!context.Request.HasJsonContentType())
        {
            throw new BadHttpRequestException(ApiSetup.WrongContentType, StatusCodes.Status415UnsupportedMediaType);
        }

        JsonSerializerOptions options = context.RequestServices.GetRequiredService<IOptions<JsonOptions>>().Value.SerializerOptions;
        var faults = new FieldFaults();
        try
        {
            using JsonDocument document = await JsonDocument.ParseAsync(context.Request.Body, Strict, context.RequestAborted);
            return new JsonBody<T>(StrictJson.Read<T>(document.RootElement, options, faults), faults);
        }
        catch (JsonException problem)
        {
            faults.Add(FieldFaults.Body, $"Not JSON: {problem.Message}");
            return new JsonBody<T>(StrictJson.Empty<T>(options), faults);
        }
    }

    /// <inheritdoc/>
    static void IEndpointParameterMetadataProvider.PopulateMetadata(ParameterInfo parameter, EndpointBuilder builder) =>
        builder.Metadata.Add(new AcceptsMetadata(["application/json"], typeof(T)));
}
