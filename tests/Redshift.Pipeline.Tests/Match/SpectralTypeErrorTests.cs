using Redshift.Pipeline.Match;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Results;
using Redshift.Simulation;
using Xunit;

namespace Redshift.Pipeline.Tests.Match;

public sealed class SpectralTypeErrorTests
{
    private const double ToleranceKmS = 100;
    private const double FloorOfG = 4.5;

    private static readonly float[] Flat = [.. Enumerable.Repeat(1f, TemplateGrid.Count)];
    private static readonly IReadOnlyList<NormalizedSpectrum> Optical = Spectra("fibre");

    [Fact]
    public void A_star_that_stands_alone_is_as_good_as_computed_stars_are() =>
        Assert.Equal(FloorOfG, Error(Optical, Star("G4V", 10))!.Value, 1e-12);

    [Fact]
    public void Other_types_count_by_their_evidence_and_only_in_the_same_place_and_sequence()
    {
        // K1 is seven subclasses from G4, with a weight of e⁻¹ beside 1.
        var spread = 49 * Math.Exp(-1) / (1 + Math.Exp(-1));
        var error = Error(Optical, Star("G4V", 10), Star("K1III", 9), Star("M5V", 10, kmS: 150), Star("DA2", 10), Star("C-N", 10));
        Assert.Equal(Math.Sqrt(spread + FloorOfG * FloorOfG), error!.Value, 1e-12);
    }

    [Fact]
    public void Without_the_lines_that_define_types_it_is_larger() =>
        Assert.Equal(2 * FloorOfG, Error(Spectra("near-infrared"), Star("G4V", 10))!.Value, 1e-12);

    [Fact]
    public void What_has_no_type_has_no_error()
    {
        Assert.Null(Error(Optical, Star("C-N", 10)));
        Assert.Null(Error(Optical, Of(ObjectKind.Galaxy, "", 10, 30000), Star("G4V", 5)));
    }

    private static double? Error(IReadOnlyList<NormalizedSpectrum> spectra, params Hypothesis[] hypotheses) =>
        SpectralTypeError.Of(new(PosteriorSum.Decide(hypotheses, 2000), hypotheses, ModelError.Uniform, 1), spectra, ToleranceKmS);

    private static Hypothesis Star(string type, double lnWeight, double kmS = 0) => Of(ObjectKind.Star, type, lnWeight, kmS);

    private static Hypothesis Of(ObjectKind kind, string type, double lnWeight, double kmS) =>
        new(new(new FitModel { Kind = kind, Name = type, Template = new(type, kind, Flat, type) }, kmS / 299792.458, 1e-5, 50), lnWeight);

    private static IReadOnlyList<NormalizedSpectrum> Spectra(string setup) =>
        Normalizer.Normalize(SimulatedSurvey.Observe(3, setup, "star-k", 0, 12).ToObservation()).Spectra;
}
