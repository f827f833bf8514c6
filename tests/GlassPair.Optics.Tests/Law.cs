using CsCheck;
using Xunit.Sdk;

namespace GlassPair.Optics.Tests;

/// <summary>A statement that must hold for whatever a generator makes; the same cases in every run.</summary>
internal static class Law
{
    private const uint Stream = 1;
    private const ulong Seed = 20_260_401;

    public static void Holds<T>(Gen<T> generator, Action<T> assert, int cases = 300)
    {
        var random = new PCG(Stream, Seed);
        for (int i = 0; i < cases; i++)
        {
            T value = generator.Generate(random, null, out _);
            try
            {
                assert(value);
            }
            catch (Exception e)
            {
                throw new XunitException($"Case {i}, {value}: {e.Message}", e);
            }
        }
    }
}
