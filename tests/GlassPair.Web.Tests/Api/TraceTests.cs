using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

public sealed class TraceTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    private const string Doublet =
        """
        "surfaces":[{"radiusMm":187.5,"thicknessMm":8,"glass":"schott/N-BK7"},{"radiusMm":-141.2,"thicknessMm":4,"glass":"schott/F2"},{"radiusMm":-612.4}]
        """;

    [Fact]
    public async Task Trace_Doublet_MatchesPlainGeometry()
    {
        JsonElement answer = await Post(
            "/api/v1/trace", $$"""{{{Doublet}},"nm":[587.5618,486.1327,656.2725],"apertureDiameterMm":40,"fieldDeg":0.5,"pupil":[[0,0],[0,1],[0.7,-0.7],[-1,0]]}""");
        double plane = answer.GetProperty("imagePlaneMm").GetDouble();
        foreach (JsonElement ray in answer.GetProperty("rays").EnumerateArray())
        {
            double[] pupil = Numbers(ray.GetProperty("pupil"));
            (double[] point, double path) = Sphere.Trace(ray.GetProperty("nm").GetDouble(), 20.0 * pupil[0], 20.0 * pupil[1], 0.5, plane);
            double[] got = Numbers(ray.GetProperty("pointMm"));
            Assert.Equal(point[0], got[0], 1e-10);
            Assert.Equal(point[1], got[1], 1e-10);
            Assert.Equal(path, ray.GetProperty("pathMm").GetDouble(), 1e-10);
        }
    }

    // W. T. Welford, Aberrations of Optical Systems, chapter 7: the transverse aberration is the slope of the wavefront, −R ∂W/∂y in the exit pupil.
    // A meridional ray at angle u to the axis turns the path difference by −(y − y₀) cos-projected per unit of sin u.
    [Fact]
    public async Task PathDifference_ChangesAlongThePupil_ByTheTransverseAberration()
    {
        JsonElement answer = await Post(
            "/api/v1/trace", $$"""{{{Doublet}},"nm":[587.5618],"apertureDiameterMm":40,"fieldDeg":0,"pupil":[[0,0.6995],[0,0.7],[0,0.7005]]}""");
        JsonElement[] rays = [.. answer.GetProperty("rays").EnumerateArray()];
        double[] waves = [.. rays.Select(r => r.GetProperty("pathDifferenceWaves").GetDouble())];
        double[] sines = [.. rays.Select(r => Numbers(r.GetProperty("direction"))[1])];
        double slope = (waves[2] - waves[0]) * 587.5618e-6 / (sines[2] - sines[0]);
        double miss = Numbers(rays[1].GetProperty("pointMm"))[1];
        Assert.Equal(-miss, slope, 2e-3 * Math.Abs(miss)); // the sphere about the image is finite: sin u in the image stands for y/R
    }

    [Fact]
    public async Task ThirdOrder_GivesThePathDifference_InTheLimitOfASmallAperture()
    {
        JsonElement answer = await Post("/api/v1/trace", $$"""{{{Doublet}},"nm":[587.5618],"apertureDiameterMm":8,"fieldDeg":0,"pupil":[[0,1]]}""");
        double spherical = answer.GetProperty("thirdOrder").GetProperty("spherical").GetDouble();
        double waves = answer.GetProperty("rays")[0].GetProperty("pathDifferenceWaves").GetDouble();

        // W = S_I/8 at the rim (Welford); Welford's W is positive where the wavefront runs ahead, that is where the path is shorter.
        Assert.Equal(-spherical / 8.0, waves * 587.5618e-6, 1e-2 * Math.Abs(spherical / 8.0));
    }

    [Theory]
    [InlineData("""{"radiusMm":10,"thicknessMm":12,"glass":"schott/N-BK7"},{"radiusMm":-10}""", "[0,1.5]", "missesSurface", 1)]
    [InlineData("""{"radiusMm":null,"thicknessMm":9,"glass":"schott/N-BK7"},{"radiusMm":-10}""", "[0,0.9]", "totalReflection", 2)]
    public async Task Trace_RayThatFails_SaysWhyAndWhere(string surfaces, string pupil, string failure, int surface)
    {
        JsonElement answer = await Post("/api/v1/trace", $$"""{"surfaces":[{{surfaces}}],"nm":[587.5618],"apertureDiameterMm":16,"fieldDeg":0,"pupil":[{{pupil}}]}""");
        JsonElement ray = answer.GetProperty("rays")[0];
        Assert.Equal(failure, ray.GetProperty("failed").GetString());
        Assert.Equal(surface, ray.GetProperty("atSurface").GetInt32());
        Assert.False(ray.TryGetProperty("pointMm", out _));
    }

    /// <summary>The same doublet by vectors from the centers of its spheres; indices from the maker's Sellmeier coefficients of N-BK7 and F2 (data sheets, 2017 edition).</summary>
    private static class Sphere
    {
        private static readonly double[] s_bk7 = [1.03961212, 0.00600069867, 0.231792344, 0.0200179144, 1.01046945, 103.560653];
        private static readonly double[] s_f2 = [1.34533359, 0.00997743871, 0.209073176, 0.0470450767, 0.937357162, 111.886764];

        public static (double[] Point, double Path) Trace(double nm, double x, double y, double degrees, double plane)
        {
            double angle = degrees * Math.PI / 180.0;
            double[] p = [x, y, 0.0];
            double[] k = [0.0, Math.Sin(angle), Math.Cos(angle)];
            double path = Dot(p, k);
            double vertex = 0.0;
            double n = 1.0;
            foreach ((double radius, double thickness, double[]? glass) in new[] { (187.5, 8.0, s_bk7), (-141.2, 4.0, s_f2), (-612.4, 0.0, null) })
            {
                double next = glass is null ? 1.0 : Index(glass, nm / 1000.0);
                double[] fromCenter = [p[0], p[1], p[2] - vertex - radius];
                double b = Dot(fromCenter, k);
                double root = Math.Sqrt((b * b) - Dot(fromCenter, fromCenter) + (radius * radius));
                double length = radius > 0.0 ? -b - root : -b + root;
                p = [.. p.Select((v, i) => v + (length * k[i]))];
                path += n * length;
                double[] normal = [-p[0] / radius, -p[1] / radius, (vertex + radius - p[2]) / radius];
                double cosine = Dot(normal, k);
                double ratio = n / next;
                double turn = Math.Sqrt(1.0 - (ratio * ratio * (1.0 - (cosine * cosine)))) - (ratio * cosine);
                k = [.. k.Select((v, i) => (ratio * v) + (turn * normal[i]))];
                (n, vertex) = (next, vertex + thickness);
            }

            double last = (vertex + plane - p[2]) / k[2];
            return ([p[0] + (last * k[0]), p[1] + (last * k[1])], path + last);
        }

        private static double Index(double[] c, double micrometers)
        {
            double squared = micrometers * micrometers;
            return Math.Sqrt(1.0 + (c[0] * squared / (squared - c[1])) + (c[2] * squared / (squared - c[3])) + (c[4] * squared / (squared - c[5])));
        }

        private static double Dot(double[] a, double[] b) => (a[0] * b[0]) + (a[1] * b[1]) + (a[2] * b[2]);
    }
}
