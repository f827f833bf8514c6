using System.Diagnostics.CodeAnalysis;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Finds stocks and glasses by the names that a client gives, or the problem to answer with.</summary>
internal static class StockLookup
{
    /// <summary>Finds a stock by its id; null means the default one.</summary>
    public static bool TryFindStock(
        this StockLibrary library, string? id, [NotNullWhen(true)] out Stock? stock, [NotNullWhen(false)] out ProblemHttpResult? problem)
    {
        problem = null;
        stock = library.Current;
        if (id is null || library.TryFind(id, out stock))
        {
            return true;
        }

        problem = Problems.UnknownStock(id, library.All.Select(s => s.Id));
        return false;
    }

    /// <summary>Finds every glass of a list.</summary>
    public static bool TryFindAll(
        this Stock stock, IEnumerable<string> ids, out Glass[] glasses, [NotNullWhen(false)] out ProblemHttpResult? problem)
    {
        List<Glass> found = [];
        List<string> unknown = [];
        foreach (string id in ids)
        {
            if (stock.TryFind(id, out Glass? glass))
            {
                found.Add(glass);
            }
            else
            {
                unknown.Add(id);
            }
        }

        glasses = [.. found];
        problem = unknown.Count > 0 ? Problems.UnknownGlasses(stock, unknown) : null;
        return problem is null;
    }
}
