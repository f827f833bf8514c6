using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;

namespace GlassPair.Web.Components.Charts;

/// <summary>Keeps a fault of the chart library from the rest of the page, and tells the chart of it.</summary>
public sealed class PictureBoundary : ErrorBoundary
{
    /// <summary>Called when the library has failed.</summary>
    [Parameter] public EventCallback Failed { get; set; }

    /// <inheritdoc/>
    protected override async Task OnErrorAsync(Exception exception)
    {
        await base.OnErrorAsync(exception);
        await Failed.InvokeAsync();
    }
}
