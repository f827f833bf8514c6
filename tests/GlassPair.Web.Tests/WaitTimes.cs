using System.Runtime.CompilerServices;
using Bunit;

namespace GlassPair.Web.Tests;

internal static class WaitTimes
{
    /// <summary>A busy machine takes its time; a test that waits fails by what it waits for, not by the clock.</summary>
    [ModuleInitializer]
    internal static void Set() => BunitContext.DefaultWaitTimeout = TimeSpan.FromSeconds(20);
}
