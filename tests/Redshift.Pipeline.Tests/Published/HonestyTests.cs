using Redshift.Fits;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Pipeline.Tests.Load;
using Redshift.Pipeline.Tests.Match;
using Redshift.Pipeline.Tests.Normalize;
using Redshift.Simulation;
using Xunit;

namespace Redshift.Pipeline.Tests.Published;

/// <summary>What is not in the pixels is not in the answer.</summary>
public class HonestyTests
{
    private readonly ObservationPipeline _pipeline = new(new PipelineSettings());

    /// <summary>
    /// Errors right, too small, too large, absent; a flux of any unit. Darkness also fits the trough shortward of Lyman alpha of a quasar
    /// at the end of the grid, which must not count as its features.
    /// </summary>
    [Theory]
    [InlineData(1.0, 1.0)]
    [InlineData(1e-17, 1e-17)]
    [InlineData(30.0, 10.0)]
    [InlineData(1.0, 2.0)]
    [InlineData(250.0, null)]
    public void Noise_alone_is_nothing(double sigma, double? stated)
    {
        const int Seeds = 8;
        var ln = SyntheticSpectrum.LnWavelengths(3700, 9200);
        var results = Enumerable.Range(1, Seeds).Select(seed => SyntheticSpectrum.Noisy(ln, _ => 0, sigma, (ulong)seed))
            .Select(noise => _pipeline.Analyze(SyntheticSpectrum.Observation(SyntheticSpectrum.Spectrum(ln, noise, stated)))).ToList();
        Assert.All(results, r => Assert.Equal((Verdict.Nothing, null), (r.Verdict, r.Z)));
    }

    [Fact]
    public void Cards_that_claim_a_redshift_change_nothing()
    {
        using var bench = new LoadBench();
        var simulated = SimulatedSurvey.Observe(7, "fibre", "galaxy-star-forming", 0.35, 6).Spectra[0];
        Observation Written(params Card[] cards) => bench.One(writer => writer.WriteTable("COADD", simulated.Flux.Length,
        [
            ColumnDefinition.Doubles("WAVELENGTH", simulated.Wavelength) with { Unit = "Angstrom" },
            ColumnDefinition.Doubles("FLUX", simulated.Flux),
            ColumnDefinition.Doubles("IVAR", simulated.InverseVariance!),
        ], cards));
        var plain = _pipeline.Analyze(Written());
        var claimed = _pipeline.Analyze(Written(
            Card.Of("Z", 2.5), Card.Of("REDSHIFT", 2.5), Card.Of("CLASS", "QSO"), Card.Of("OBJTYPE", "QUASAR"), Card.Of("SUBCLASS", "BROADLINE"), Card.Of("Z_ERR", 1e-5)));
        Assert.Equal(0.35, plain.Z!.Value, 0.002);
        Assert.Equal((plain.Kind, plain.Z, plain.ZErr, plain.Confidence, plain.Verdict), (claimed.Kind, claimed.Z, claimed.ZErr, claimed.Confidence, claimed.Verdict));
        Assert.Equal(plain.Candidates, claimed.Candidates);
    }
}
