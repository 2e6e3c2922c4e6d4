using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Normalize;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public class AirColumnsTests
{
    private static readonly double[] Axis = SyntheticSpectrum.LnWavelengths(5500, 9800);

    private static FitModel Star { get; } = ModelLibrary.Instance.Stars.First(s => s.Name.StartsWith("G4V", StringComparison.Ordinal));

    /// <summary>Air is nothing that a redshift could explain: with all of its bands left in, a featureless spectrum stays featureless.</summary>
    [Fact]
    public void Bands_of_the_air_alone_are_no_evidence_of_anything()
    {
        var fit = new ModelFit(Pixels(x => Through(x, 1, 1)));
        Assert.All(ModelLibrary.Instance.Quasars.Take(6), q =>
            Assert.All(new[] { 0.2, 0.7, 1.2, 1.8, 2.4, 3.1 }, z => Assert.InRange(fit.LnEvidence(q, Math.Log(1 + z)), double.NegativeInfinity, 3)));
    }

    /// <summary>The evidence of a star is the same, but for what the bands hide, whether the spectrum was corrected or not.</summary>
    [Fact]
    public void A_star_is_the_same_star_behind_uncorrected_air()
    {
        double Evidence(double dry, double water) => new ModelFit(Pixels(x => Sun(x) * Through(x, dry, water))).LnEvidence(Star, 0);
        var corrected = Evidence(0, 0);
        Assert.InRange(corrected, 100, double.PositiveInfinity);
        Assert.InRange(Evidence(1, 0.5), 0.85 * corrected, 1.15 * corrected);
        Assert.InRange(Evidence(1, 2), 0.85 * corrected, 1.15 * corrected);
    }

    [Fact]
    public void Outside_the_bands_nothing_is_absorbed()
    {
        foreach (var air in AirTransmission.All)
        {
            var absorbed = air.Absorbed(LineSpreadLevels.Nearest(70 / 299792.458));
            Assert.All(absorbed, a => Assert.InRange(a, -1e-6, 1));
            Assert.All(new[] { 6150.0, 6750, 7050, 7500, 8600, 10400, 12300, 16600, 22200 }, w =>
                Assert.InRange(absorbed[(int)((Math.Log(w) - TemplateGrid.LnStart) / TemplateGrid.Step) - AirTransmission.Offset], 0, 0.003));
        }
    }

    private static double Sun(double x) => At(Star.Template!.Broadened(Level, Stretch.Whole), x, 0);

    private static double Through(double x, double dry, double water) =>
        (1 - dry * At(AirTransmission.All[0].Absorbed(Level), x, AirTransmission.Offset)) * (1 - water * 0.5 * At(AirTransmission.All[1].Absorbed(Level), x, AirTransmission.Offset));

    private static int Level => LineSpreadLevels.Nearest(70 / 299792.458);

    private static double At(float[] values, double x, int offset) => values[Math.Max(0, (int)((x - TemplateGrid.LnStart) / TemplateGrid.Step) - offset)];

    private static FitPixels Pixels(Func<double, double> flux) => FitPixels.Build([Spectra.Run(Axis, flux, 0.02, 5)], ModelError.Uniform, Cells.Step);
}
