using GlassPair.Web.Api;
using GlassPair.Web.Components;
using GlassPair.Web.Hosting;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;

if (args is [Health.Switch, string address])
{
    return await Health.AskAsync(address);
}

// Published output has its own wwwroot beside the dll; a build output has not, and needs the
// static-web-assets manifest, which the host loads by itself only in Development.
bool isPublished = Directory.Exists(Path.Combine(AppContext.BaseDirectory, "wwwroot"));
WebApplicationBuilder builder = WebApplication.CreateBuilder(new WebApplicationOptions
{
    Args = args,
    ContentRootPath = isPublished ? AppContext.BaseDirectory : null,
});
if (!isPublished)
{
    builder.WebHost.UseStaticWebAssets();
}

builder.AddGlassPairHosting();
builder.Services.AddGlassPairStocks(builder.Configuration);
builder.Services.AddGlassPairWork(builder.Configuration);
builder.Services.AddGlassPairApi(builder.Configuration);
builder.Services.AddGlassPairPages(builder.Configuration);

try
{
    await using WebApplication app = builder.Build();
    app.UseGlassPairHosting();
    app.UseGlassPairApi();
    app.UseRequestLimits();
    app.UseAntiforgery();
    app.MapStaticAssets();
    app.MapHealth();
    app.MapGlassPairApi();
    app.MapGlassPairPages();
    await app.RunToEndAsync();
    return 0;
}
catch (Exception problem) when (Startup.Explain(problem) is { } words)
{
    await Console.Error.WriteLineAsync(words);
    return 1;
}
