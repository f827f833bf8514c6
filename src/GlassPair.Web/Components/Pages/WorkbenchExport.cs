using System.Globalization;
using CsvHelper;
using GlassPair.Catalogue;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;

namespace GlassPair.Web.Components.Pages;

/// <summary>The ranking as a file: the rows that an address shows, in its order, with every figure in full precision.</summary>
public static class WorkbenchExport
{
    private static readonly CsvWriterOptions _options = CsvWriterOptions.Default with { Injection = CsvInjection.Escape, CommentPrefix = '#' };

    /// <summary>Maps <c>/export/shortlist.csv</c>, to keep, and <c>/export/shortlist.tsv</c>, to paste into a spreadsheet.</summary>
    public static void Map(IEndpointRouteBuilder routes)
    {
        routes.MapGet("/export/shortlist.csv", (HttpContext context, StockLibrary library, WorkbenchAnswers answers) =>
            AnswerAsync(context, library, answers, "text/csv", WriteFile)).ExcludeFromDescription();
        routes.MapGet("/export/shortlist.tsv", (HttpContext context, StockLibrary library, WorkbenchAnswers answers) =>
            AnswerAsync(context, library, answers, "text/tab-separated-values", WriteTable)).ExcludeFromDescription();
    }

    /// <summary>Writes the file: requirement, stock and cautions as comment lines, then one pair a row with the unit of each column in its heading.</summary>
    public static void WriteFile(WorkbenchAnswer answer, WorkbenchState state, string address, Stream to)
    {
        using CsvWriter writer = CsvWriter.Create(to, _options with { WriteByteOrderMark = true }, leaveOpen: true);
        foreach (string line in HeadOf(answer, address))
        {
            writer.WriteComment(" " + line);
        }

        WriteRows(writer, RankingView.Of(answer.Pairs, state), RankingColumn.All.Where(c => c.Key != RankingColumn.BarKey), inFull: true);
    }

    /// <summary>Writes the columns that the page shows, as it shows them, separated by tabs.</summary>
    public static void WriteTable(WorkbenchAnswer answer, WorkbenchState state, string address, Stream to)
    {
        using CsvWriter writer = CsvWriter.Create(to, _options with { Separator = '\t', NewLine = "\n" }, leaveOpen: true);
        IEnumerable<RankingColumn> shown = state.Columns is { } keys ? RankingColumn.All.Where(c => keys.Contains(c.Key)) : RankingColumn.Usual;
        WriteRows(writer, RankingView.Of(answer.Pairs, state), shown.Where(c => c.Key != RankingColumn.BarKey), inFull: false);
    }

    private static async Task<IResult> AnswerAsync(
        HttpContext context, StockLibrary library, WorkbenchAnswers answers, string contentType, Action<WorkbenchAnswer, WorkbenchState, string, Stream> write)
    {
        string query = context.Request.QueryString.Value ?? "";
        WorkbenchState state = WorkbenchAddress.Read(query).State;
        Stock stock = state.StockId is { } id && library.TryFind(id, out Stock? named) ? named : library.Current;
        var reading = FormReading.Of(state, stock);
        if (reading.Request is not { } request)
        {
            string[] problems = [.. reading.Problems.Select(p => $"{p.Field.Label}: {p.Problem}"), .. reading.GlassProblem is { } glass ? new[] { glass } : []];
            return Results.Problem(problems.Length > 0 ? string.Join(" ", problems) : "Focal length and f-number are needed.", statusCode: StatusCodes.Status400BadRequest);
        }

        try
        {
            WorkbenchAnswer answer = await answers.AnswerAsync(state, request, stock, context.RequestAborted);
            string address = $"{context.Request.Scheme}://{context.Request.Host}{context.Request.PathBase}/{WorkbenchAddress.Write(state with { StockId = stock.Id })}";
            using var bytes = new MemoryStream();
            write(answer, state, address, bytes);
            string name = FormattableString.Invariant($"glass-pairs-{request.Requirement.FocalLength:0.###}mm-f{request.Requirement.FNumber:0.###}.{(contentType == "text/csv" ? "csv" : "tsv")}");
            return Results.File(bytes.ToArray(), contentType + "; charset=utf-8", contentType == "text/csv" ? name : null);
        }
        catch (ServerBusyException busy)
        {
            context.Response.Headers.RetryAfter = Math.Ceiling(busy.RetryAfter.TotalSeconds).ToString(CultureInfo.InvariantCulture);
            return Results.Problem(busy.Message, statusCode: StatusCodes.Status503ServiceUnavailable);
        }
    }

    private static IEnumerable<string> HeadOf(WorkbenchAnswer answer, string address)
    {
        ShortlistRequest request = answer.Shortlist.Request;
        Requirement requirement = request.Requirement;
        yield return "Glass pairs, ranked";
        yield return $"Requirement: {RequirementText.Of(requirement)}; color {(requirement.Balance == ColorBalance.EndsUnited ? "ends united" : "band balanced")} over {requirement.Band.Samples.Length} samples, {requirement.Band.ShortEnd}, {requirement.Band.Design}, {requirement.Band.LongEnd}";
        yield return FormattableString.Invariant($"Data: Abbe tolerance {request.Quality.AbbeTolerance * 100:0.####} %, index precision {request.Quality.IndexPrecision:0.#######}");
        yield return $"Stock: {answer.Stock.Title}, {answer.Stock.Id}";
        yield return $"Ranked: {FigureText.Count(answer.Pairs.Length)} of {FigureText.Count(answer.Shortlist.CombinationsFeasible)} pairs within the limits, {FigureText.Count(answer.Shortlist.CombinationsHolding)} of which hold";
        yield return $"The same on the page: {address}";
        yield return "Design estimates for a qualified optical engineer to check. Catalogue data are nominal: the maker's data sheet and the melt certificate decide.";
        yield return "Glass dust, and some glasses, contain lead or other hazardous substances: follow the maker's safety data sheet and local rules.";
    }

    private static void WriteRows(CsvWriter writer, IEnumerable<RankedPair> pairs, IEnumerable<RankingColumn> columns, bool inFull)
    {
        RankingColumn[] shown = [.. columns];
        writer.WriteHeader(["rank", "positive glass", "positive maker", "negative glass", "negative maker", .. shown.Select(HeadingOf), "also sold as"]);
        foreach (RankedPair pair in pairs)
        {
            writer.WriteField(pair.Candidate?.Rank);
            writer.WriteField(pair.Positive.Glass.Name);
            writer.WriteField(pair.Positive.Glass.Maker);
            writer.WriteField(pair.Negative.Glass.Name);
            writer.WriteField(pair.Negative.Glass.Maker);
            foreach (RankingColumn column in shown)
            {
                if (column.Key == RankingColumn.SupplyKey)
                {
                    writer.WriteField($"{FigureText.Of(pair.Positive.Glass.Supply)}, {FigureText.Of(pair.Negative.Glass.Supply)}");
                }
                else if (column.Value is { } value)
                {
                    writer.WriteField(inFull || value(pair) is null ? value(pair) : Shown(column, pair));
                }
                else
                {
                    writer.WriteField(column.Text(pair));
                }
            }

            writer.WriteField(string.Join(", ", pair.Candidate?.SameAs ?? []));
            writer.EndRecord();
        }
    }

    /// <summary>What the table shows, as a number: to its decimals.</summary>
    private static double? Shown(RankingColumn column, RankedPair pair) =>
        double.TryParse(column.Text(pair).Replace("f/", "", StringComparison.Ordinal).Replace('−', '-'), NumberStyles.Float, CultureInfo.InvariantCulture, out double shown) ? shown : column.Value!(pair);

    private static string HeadingOf(RankingColumn column) => column.Unit.Length > 0 ? $"{column.Title} ({column.Unit})" : column.Title;
}
