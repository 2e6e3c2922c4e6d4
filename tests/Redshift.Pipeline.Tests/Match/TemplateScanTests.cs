using CsCheck;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Redshift.Simulation.Random;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Match;

public class TemplateScanTests
{
    private const double PlantedZ = 0.25;

    private static readonly CellTemplate Lined = CellTemplate.For(new Template("lines", ObjectKind.Galaxy, Lines(1)), 0.0003);
    private static readonly CellTemplate Other = CellTemplate.For(new Template("other lines", ObjectKind.Galaxy, Lines(2)), 0.0003);

    private readonly Cells _cells = Data(Lines(1));

    [Fact]
    public void Transform_and_direct_sum_agree_at_all_shifts()
    {
        const int First = -50;
        var best = new float[3000];
        Array.Fill(best, float.NegativeInfinity);
        new TemplateScan(_cells, Lined.Relative.Length).Take(Lined, 0, First, best, new short[best.Length]);
        var greatest = best.Max();
        Gen.Int[0, best.Length - 1].Sample(s => Assert.Equal(TemplateScan.Direct(_cells, Lined, First + s), best[s], 1e-4 * greatest));
    }

    [Fact]
    public void The_planted_template_wins_at_its_redshift()
    {
        var best = new float[2000];
        var which = new short[best.Length];
        Array.Fill(best, float.NegativeInfinity);
        var scan = new TemplateScan(_cells, Lined.Relative.Length);
        scan.Take(Other, 5, 0, best, which);
        scan.Take(Lined, 7, 0, best, which);
        var peak = Array.IndexOf(best, best.Max());
        Assert.Equal(Math.Log(1 + PlantedZ) / Cells.Step, peak, 1.0);
        Assert.Equal(7, which[peak]);
        Assert.Contains((short)5, which);
    }

    [Fact]
    public void Outside_the_data_a_template_says_nothing() =>
        Assert.Equal(0, TemplateScan.Direct(_cells, Lined, 20000));

    /// <summary>Two hundred seeded absorption lines from 3000 Å to 7000 Å, 300 km/s wide, in a flat continuum on the template grid.</summary>
    private static float[] Lines(ulong seed)
    {
        var random = new RandomSource(seed);
        var flux = Enumerable.Repeat(1f, TemplateGrid.Count).ToArray();
        for (var line = 0; line < 200; line++)
        {
            var (centre, depth) = (random.LogUniform(3000, 7000), random.Uniform(0, 0.5));
            var at = (int)((Math.Log(centre) - TemplateGrid.LnStart) / TemplateGrid.Step);
            for (var i = at - 30; i <= at + 30; i++) flux[i] *= (float)(1 - depth * Math.Exp(-0.5 * (i - at) * (i - at) / 40.0));
        }

        return flux;
    }

    private static Cells Data(float[] rest)
    {
        double Flux(double x) => rest[(int)Math.Round((x - Math.Log(1 + PlantedZ) - TemplateGrid.LnStart) / TemplateGrid.Step)];
        return Cells.Build(Spectra.Normalized(LnWavelengths(4000, 8500), Flux, 0.05, 3).Spectra, ModelError.Uniform);
    }
}
