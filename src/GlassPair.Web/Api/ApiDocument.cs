using System.Globalization;
using System.Reflection;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.Json.Serialization.Metadata;
using Microsoft.AspNetCore.OpenApi;
using Microsoft.OpenApi;

namespace GlassPair.Web.Api;

/// <summary>Describes the API as an OpenAPI document.</summary>
internal static class ApiDocument
{
    private const string Suffix = "Json";
    private const string Getter = "Gets ";

    /// <summary>Sets what the framework does not see by itself: ranges of list items, query parameters, examples.</summary>
    public static void Configure(OpenApiOptions options)
    {
        options.CreateSchemaReferenceId = type =>
            OpenApiOptions.CreateDefaultSchemaReferenceId(type) is { } id && id.EndsWith(Suffix, StringComparison.Ordinal)
                ? id[..^Suffix.Length]
                : OpenApiOptions.CreateDefaultSchemaReferenceId(type);
        options.AddDocumentTransformer((document, _, _) =>
        {
            document.Info = new OpenApiInfo
            {
                Title = "GlassPair",
                Version = "1",
                Description =
                    "Chooses the glasses of achromatic objectives. Numbers are written with full double precision; the unit stands in the name of each field; "
                    + "wavelengths are in nm in standard air. A glass is named maker/name, upper and lower case alike. Where a call cannot be answered, "
                    + "the answer is application/problem+json (RFC 9457): detail says why in a sentence, and with status 400 errors names every faulty field by its path, "
                    + "what is wrong, and what is allowed. Figures are design estimates for a qualified optical engineer to check.",
            };
            document.Servers?.Clear();
            foreach (IOpenApiSchema schema in document.Components?.Schemas?.Values ?? [])
            {
                foreach (IOpenApiSchema field in schema.Properties?.Values ?? [])
                {
                    NameIt(field);
                }
            }

            return Task.CompletedTask;
        });
        options.AddSchemaTransformer((schema, context, _) =>
        {
            Describe(schema, context);
            return Task.CompletedTask;
        });
        options.AddOperationTransformer((operation, context, _) =>
        {
            IList<object> metadata = context.Description.ActionDescriptor.EndpointMetadata;
            operation.Responses = SortedByStatus(operation.Responses);
            operation.Parameters = [.. operation.Parameters ?? [], .. metadata.OfType<QueryParameter>().Select(Describe)];
            if (metadata.OfType<BodyExample>().FirstOrDefault() is { } example
                && operation.RequestBody?.Content?.TryGetValue("application/json", out OpenApiMediaType? body) == true)
            {
                body.Example = JsonNode.Parse(example.Json);
            }

            return Task.CompletedTask;
        });
    }

    private static void Describe(OpenApiSchema schema, OpenApiSchemaTransformerContext context)
    {
        if (context.JsonPropertyInfo is { IsRequired: true } or { IsGetNullable: false })
        {
            schema.Type &= ~JsonSchemaType.Null;
        }

        // An answer writes every field.
        if (context.JsonPropertyInfo is null && context.JsonTypeInfo is { Kind: JsonTypeInfoKind.Object, Properties: { Count: > 0 } fields } && fields.All(f => f.Set is null))
        {
            schema.Required = fields.Select(f => f.Name).ToHashSet();
        }

        // That a field may be null stands where the field does, not among the words of the type that it shares with others.
        if (schema.Enum is { } words)
        {
            schema.Enum = [.. words.Where(w => w?.GetValueKind() == JsonValueKind.String)];
        }

        if ((context.JsonPropertyInfo?.AttributeProvider as MemberInfo)?.GetCustomAttribute<ItemRangeAttribute>() is { } range
            && schema.Items is OpenApiSchema items)
        {
            items.Minimum = Text(range.Minimum);
            items.Maximum = Text(range.Maximum);
        }
    }

    /// <summary>"Gets the index." is how code describes a property; a reader of the document looks for "The index.".</summary>
    private static void NameIt(IOpenApiSchema field)
    {
        foreach (IOpenApiSchema part in field.OneOf ?? [])
        {
            NameIt(part);
        }

        if (field.Description?.StartsWith(Getter, StringComparison.Ordinal) == true)
        {
            string rest = field.Description[Getter.Length..];
            bool isWord = rest.Length > 1 && (char.IsLetter(rest[1]) || rest[1] == ' ');
            field.Description = isWord ? char.ToUpperInvariant(rest[0]) + rest[1..] : rest;
        }
    }

    private static OpenApiResponses SortedByStatus(OpenApiResponses? responses)
    {
        var sorted = new OpenApiResponses();
        foreach ((string status, IOpenApiResponse response) in (responses ?? []).OrderBy(r => r.Key, StringComparer.Ordinal))
        {
            sorted.Add(status, response);
        }

        return sorted;
    }

    private static IOpenApiParameter Describe(QueryParameter parameter) => new OpenApiParameter
    {
        Name = parameter.Name,
        In = ParameterLocation.Query,
        Description = parameter.Description,
        Required = parameter.IsRequired,
        Explode = false,
        Schema = parameter.Kind switch
        {
            QueryKind.Whole => new OpenApiSchema
            {
                Type = JsonSchemaType.Integer,
                Minimum = Text(parameter.Minimum),
                Maximum = Text(parameter.Maximum),
                Default = parameter.Usual,
            },
            QueryKind.Number => Number(parameter),
            QueryKind.Numbers => new OpenApiSchema { Type = JsonSchemaType.Array, Items = Number(parameter), MinItems = 1, MaxItems = parameter.Most },
            QueryKind.Words => new OpenApiSchema { Type = JsonSchemaType.Array, Items = new OpenApiSchema { Type = JsonSchemaType.String } },
            _ => new OpenApiSchema { Type = JsonSchemaType.String, MaxLength = StrictJson.LongestText },
        },
    };

    private static OpenApiSchema Number(QueryParameter parameter) =>
        new() { Type = JsonSchemaType.Number, Minimum = Text(parameter.Minimum), Maximum = Text(parameter.Maximum) };

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}

/// <summary>A request body that shows how to call a route.</summary>
/// <param name="Json">The body.</param>
internal sealed record BodyExample(string Json);
