using CsCheck;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Normalize;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Match;

public class LineScanTests
{
    private const double RedshiftOfLines = 0.3;

    private static readonly double[] Ln = LnWavelengths(5500, 8000);

    private static readonly EmissionGroup Group = new()
    {
        Name = "three lines",
        Lines = [new(5008.24, 1), new(4960.295, 0.336), new(4862.683, 0.2)],
        Mean = 0,
        Spread = 25,
        Absent = 0.5,
    };

    private static readonly NormalizedObservation Observation = Spectra.Normalized(Ln, x => 1 + Group.Lines.Sum(l => 1.5 * l.Share * Line(x, l.RestA * (1 + RedshiftOfLines), 250)), 0.1, 1);

    private static readonly Cells Data = Cells.Build(Observation.Spectra, ModelError.Uniform);

    [Theory]
    [InlineData(0.0004)]
    [InlineData(0.002)]
    public void Slices_add_up_to_the_sum_over_all_cells(double sigma)
    {
        var scanned = new float[1200];
        new LineScan(Data, sigma).Add(Group, 0, scanned);
        Gen.Int[420, scanned.Length - 1].Sample(shift =>
        {
            var expected = BruteForce(sigma, shift);
            // From the shift on at which the first line stands on data; the filter reaches four σ, the sum all cells.
            Assert.Equal(expected, scanned[shift], 0.02 + 3e-3 * Math.Abs(expected));
        });
    }

    [Fact]
    public void A_stride_takes_every_so_manieth_shift()
    {
        float[] all = new float[900], strided = new float[300];
        new LineScan(Data, 0.001).Add(Group, 100, all);
        new LineScan(Data, 0.001, 3).Add(Group, 100, strided);
        Assert.Equal(Enumerable.Range(0, 300).Select(s => all[3 * s]), strided);
    }

    [Fact]
    public void Planted_lines_make_the_highest_peak()
    {
        var scanned = new float[4000];
        new LineScan(Data, Data.SigmaLn).Add(Group, 0, scanned);
        var best = Array.IndexOf(scanned, scanned.Max());
        Assert.Equal(Math.Log(1 + RedshiftOfLines) / Cells.Step, best, 1.0);
    }

    [Fact]
    public void Cells_keep_the_information_of_the_pixels()
    {
        var spectrum = Observation.Spectra[0];
        double weight = 0, signal = 0;
        for (var i = 0; i < spectrum.Count; i++)
        {
            // Lines are wrong by 8 % of what stands above the continuum.
            var share = ModelError.Uniform.Share(spectrum.LnWavelength[i]) * spectrum.Continuum[i];
            var excess = 0.08 * Math.Max(0, spectrum.Flux[i] - spectrum.Continuum[i]);
            var w = 1 / (1 / spectrum.Weight[i] + (share * share + excess * excess) * Math.Max(1, Cells.Step / spectrum.PixelWidth[i]));
            weight += w;
            signal += w * (spectrum.Flux[i] - spectrum.Continuum[i]);
        }

        Assert.Equal(weight, Data.LineCurvature.Sum(c => (double)c), 1e-3 * weight);
        Assert.Equal(signal, Data.LineGradient.Sum(c => (double)c), 1e-3 * weight);
    }

    /// <summary>One normalised Gaussian a line over the whole array; of its own information the smooth continuum leaves 1 − σ/√(σ² + s²).</summary>
    private static double BruteForce(double sigma, int shift)
    {
        double gradient = 0, curvature = 0, level = 0, share = 0;
        foreach (var line in Group.Lines)
        {
            var centre = (int)Math.Floor((Math.Log(line.RestA) - Cells.LnOrigin) / Cells.Step) + shift - Data.First;
            if (centre < 0 || centre >= Data.Count) continue;
            double scale = line.Share / line.RestA, norm = 1 / (sigma * Math.Sqrt(2 * Math.PI));
            for (var k = 0; k < Data.Count; k++)
            {
                var value = scale * norm * Math.Exp(-0.5 * Math.Pow((k - centre) * Cells.Step / sigma, 2));
                gradient += value * Data.LineGradient[k];
                curvature += Kept(sigma) * value * value * Data.LineCurvature[k];
            }

            level += line.Share * Data.Continuum[centre];
            share += line.Share;
        }

        return curvature > 0 ? HalfNormalEvidence.LnMixture(gradient, curvature, 0, Group.Spread * level / share, Group.Absent) : 0;
    }

    private static double Kept(double sigma) => 1 - sigma / Math.Sqrt(sigma * sigma + Math.Pow(0.75 * SmoothFit.KnotSpacing, 2));
}
