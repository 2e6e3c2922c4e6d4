using CsCheck;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Match;

public class TemplateScanTests
{
    private const double PlantedZ = 0.25;
    private const double Spread = 0.35;
    private const double Wide = 0.7;
    private const double Greatest = 0.3;

    private static readonly Template Lined = new("lines", ObjectKind.Galaxy, Lines(1));
    private static readonly Template Apart = new("apart", ObjectKind.Galaxy, Lines(3));

    /// <summary>Ten templates, more than are worked on at once; the ninth is the right one, the last is kept apart.</summary>
    private static readonly TemplateRange Range = new(double.NegativeInfinity, double.PositiveInfinity, 0,
    [
        .. Enumerable.Range(0, 8).Select(i => new SearchedTemplate(new("other lines", ObjectKind.Galaxy, Lines(10 + (ulong)i)), i, Spread, i == 3 ? Greatest : double.PositiveInfinity)),
        new(Lined, 8, Spread, double.PositiveInfinity),
        new(Apart, -1, Wide, double.PositiveInfinity),
    ]);

    private readonly Cells _cells = Data(Lines(1));

    private int Level => LineSpreadLevels.Nearest(_cells.SigmaLn);

    [Fact]
    public void All_shifts_agree_with_the_direct_sum_over_double_cells()
    {
        const int First = -25;
        var (best, which, apart) = Scan(First, 3000);
        var greatest = best.Max();
        Gen.Int[0, best.Length - 1].Sample(s =>
        {
            var evidence = Range.Templates.Select(t => t.GreatestLnShift < (First + s) * 2 * Cells.Step ? double.NegativeInfinity : Direct(t, First + s)).ToArray();
            Assert.Equal(evidence[..9].Max(), best[s], 1e-4 * greatest);
            Assert.Equal(evidence[which[s]], best[s], 1e-4 * greatest);
            Assert.Equal(evidence[9], apart[s], 1e-4 * greatest);
        }, iter: 300);
    }

    [Fact]
    public void The_planted_template_wins_at_its_redshift()
    {
        var (best, which, _) = Scan(0, 1000);
        var peak = Array.IndexOf(best, best.Max());
        Assert.Equal(Math.Log(1 + PlantedZ) / Cells.Step, 2 * peak, 2.0);
        Assert.Equal(8, which[peak]);
        Assert.True(which.Distinct().Count() > 5);
    }

    [Fact]
    public void Outside_the_data_a_template_says_nothing() => Assert.All(Scan(12000, 10).Best, e => Assert.Equal(0, e, 1e-3));

    [Theory]
    [InlineData(4000, 8500)]
    [InlineData(1105, 5000)]
    [InlineData(6000, 30000)]
    public void Few_shifts_are_the_direct_sum_over_double_cells(double shortest, double longest)
    {
        const int First = -17;
        var cells = Data(Lines(1), shortest, longest);
        var level = LineSpreadLevels.Nearest(cells.SigmaLn);
        var templates = Range.Templates.Select(t => t.Template).ToList();
        var rows = StarScan.Of(templates, cells).LnEvidence(cells.Pairs, First, 35);
        Assert.Equal(templates.Count, rows.Length);
        var greatest = rows.Max(r => r.Max(Math.Abs));
        for (var t = 0; t < templates.Count; t++)
            for (var s = 0; s < 35; s++) Assert.Equal(Direct(cells, CellTemplate.Relative(templates[t], level), First + s, Spread), rows[t][s], 1e-4 * greatest);
    }

    private (float[] Best, short[] Which, float[] Apart) Scan(int first, int shifts)
    {
        var (best, which, apart) = (new float[shifts], new short[shifts], new float[shifts]);
        Array.Fill(best, float.NegativeInfinity);
        new TemplateScan(_cells).Take(Range, first, best, which, apart);
        return (best, which, apart);
    }

    private double Direct(SearchedTemplate template, int shift) => Direct(_cells, CellTemplate.Relative(template.Template, Level), shift, template.Spread);

    private static double Direct(Cells cells, float[] relative, int shift, double spread)
    {
        var odd = cells.First & 1;
        return Direct(Pairs(relative, 0, 0.5f), Pairs(cells.TemplateGradient, odd, 1), Pairs(cells.TemplateCurvature, odd, 1), (cells.First - odd) / 2, shift, spread);
    }

    private static float[] Pairs(float[] values, int empty, float factor)
    {
        var pairs = new float[(values.Length + empty + 1) / 2];
        for (var i = 0; i < values.Length; i++) pairs[(i + empty) / 2] += factor * values[i];
        return pairs;
    }

    /// <summary>ln of the likelihood averaged over a normal prior of the strength about one, over that at strength zero.</summary>
    private static double Direct(float[] relative, float[] gradient, float[] curvature, int first, int shift, double spread)
    {
        double num = 0, den = 0, precision = 1 / (spread * spread);
        for (var i = 0; i < gradient.Length; i++)
        {
            var t = first + i - shift;
            if (t < 0 || t >= relative.Length) continue;
            num += relative[t] * gradient[i];
            den += relative[t] * relative[t] * curvature[i];
        }

        double m = den + precision, v = num + precision;
        return 0.5 * v * v / m - 0.5 * precision - 0.5 * Math.Log(m / precision);
    }

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

    private static Cells Data(float[] rest, double shortest = 4000, double longest = 8500)
    {
        double Flux(double x) => rest[(int)Math.Round((x - Math.Log(1 + PlantedZ) - TemplateGrid.LnStart) / TemplateGrid.Step)];
        return Cells.Build(Spectra.Normalized(LnWavelengths(shortest, longest), Flux, 0.05, 3).Spectra, ModelError.Uniform);
    }
}
