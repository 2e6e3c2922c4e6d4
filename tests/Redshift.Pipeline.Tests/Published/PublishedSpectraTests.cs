using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Published;

/// <summary>Open data of others, read from their files, moved by the test to a dozen velocities or redshifts.</summary>
public class PublishedSpectraTests
{
    private static readonly (double From, double To) Everything = (0, double.PositiveInfinity);

    private static readonly (double From, double To) Optical = (3600, 9200);

    private readonly ObservationPipeline _pipeline = new(new PipelineSettings());

    public static TheoryData<int> Velocities => [-500, -433, -311, -207, -98, 0, 55, 150, 222, 303, 404, 500];

    public static TheoryData<double> Redshifts => [0.3, 0.5, 0.7, 0.9, 1.1, 1.3, 1.5, 1.8, 2.1, 2.4, 2.8, 3.2, 3.6, 4.0];

    /// <summary>
    /// The white dwarf GRW+70 5824, DA3: flux standard of the Hubble telescope, STIS and NICMOS, in vacuum (Bohlin &amp; Gordon, as its header
    /// says). Its Balmer lines stand within 100 km/s of rest.
    /// </summary>
    [SynphotTheory]
    [MemberData(nameof(Velocities))]
    public void White_dwarf_standard_is_found_at_its_velocity(int kmS)
    {
        var standard = SynphotData.Read("grw_70d5824_stisnic_005.fits");
        foreach (var range in new[] { Everything, Optical })
        {
            var result = Moved(standard, kmS / Velocity.SpeedOfLightKmS, range);
            Assert.Equal(ObjectKind.Star, result.Kind);
            Assert.StartsWith("DA", result.SpectralType, StringComparison.Ordinal);
            Assert.InRange(Velocity.SpeedOfLightKmS * result.Z!.Value - kmS, -150, 150);
        }
    }

    /// <summary>
    /// A model atmosphere of Kurucz (1993), sampled at some 1,000 km/s a pixel. The name of the file says 4,500 K, but its flux falls from
    /// 3610 Å to 5510 Å by 4.6, as that of a body of 45,000 K does. No spectrograph has blurred it: its sharpest lines are its steps of 20 Å, as
    /// whoever measures it would state. The opacity of each line is spread over a whole step: the centroids of its hydrogen lines against a
    /// straight continuum stand at +118 (Hβ), +41 (Hγ), +74 (Hδ) and −275 km/s (Hα).
    /// </summary>
    [SynphotTheory]
    [MemberData(nameof(Velocities))]
    public void Hot_model_atmosphere_is_found_at_its_velocity(int kmS)
    {
        var result = Moved(SynphotData.Read("k93_4500_0_5_rn_box.fits", fwhmA: 20), kmS / Velocity.SpeedOfLightKmS, Everything);
        Assert.Equal(ObjectKind.Star, result.Kind);
        Assert.Matches("^(O|B0)", result.SpectralType);
        Assert.InRange(Velocity.SpeedOfLightKmS * result.Z!.Value - kmS, -150, 150);
    }

    /// <summary>
    /// The same model atmosphere, with a sharpness that is guessed from its steps as that of a spectrograph would be: its velocity is right within
    /// the error that is stated for so few pixels, and within a sixth of a pixel.
    /// </summary>
    [SynphotTheory]
    [MemberData(nameof(Velocities))]
    public void Hot_model_atmosphere_of_unstated_sharpness_is_found_within_its_error(int kmS)
    {
        var result = Moved(SynphotData.Read("k93_4500_0_5_rn_box.fits"), kmS / Velocity.SpeedOfLightKmS, Everything);
        Assert.Equal(ObjectKind.Star, result.Kind);
        var off = Math.Abs(Velocity.SpeedOfLightKmS * result.Z!.Value - kmS);
        Assert.InRange(off, 0, Velocity.SpeedOfLightKmS * result.ZErr!.Value);
        Assert.InRange(off, 0, 200);
    }

    /// <summary>
    /// The composite of the Large Bright Quasar Survey (Francis et al. 1991, ApJ 373, 465), 4 Å. Below the Lyman limit it holds light
    /// of quasars at low redshift, which would not reach us from high redshift. With all its lines it is found within 150 km/s; what an
    /// optical spectrograph sees of it, to what Dawson et al. 2016 (AJ 151, 44) ask for: 300 km/s, and 400 more a unit beyond z = 1.5.
    /// </summary>
    [SynphotTheory]
    [MemberData(nameof(Redshifts))]
    public void Composite_quasar_is_found_at_its_redshift(double z)
    {
        var composite = SynphotData.Read("qso_template_001.dat");
        foreach (var (range, greatestKmS) in new[] { ((From: 920 * (1 + z), To: double.PositiveInfinity), 150.0), ((Math.Max(920 * (1 + z), 3600), 10000), 300 + 400 * Math.Max(0, z - 1.5)) })
        {
            var result = Moved(composite, z, range);
            Assert.Equal(ObjectKind.Quasar, result.Kind);
            Assert.InRange(Velocity.SpeedOfLightKmS * (result.Z!.Value - z) / (1 + z), -greatestKmS, greatestKmS);
        }
    }

    private ObservationResult Moved(Observation observation, double z, (double From, double To) range) =>
        _pipeline.Analyze(observation with { Spectra = [.. observation.Spectra.Select(s => Moved(s, 1 + z, range))] });

    private static Spectrum Moved(Spectrum spectrum, double factor, (double From, double To) range)
    {
        int[] kept = [.. Enumerable.Range(0, spectrum.Count).Where(i => spectrum.Wavelength[i] * factor > range.From && spectrum.Wavelength[i] * factor < range.To)];
        return new()
        {
            Wavelength = Array.ConvertAll(kept, i => factor * spectrum.Wavelength[i]),
            Flux = Array.ConvertAll(kept, i => spectrum.Flux[i]),
            InverseVariance = Array.ConvertAll(kept, i => spectrum.InverseVariance[i]),
            HasErrors = spectrum.HasErrors,
            FwhmKmS = spectrum.FwhmKmS is { } fwhm ? Array.ConvertAll(kept, i => fwhm[i]) : null,
            ResolutionFrom = spectrum.ResolutionFrom,
        };
    }
}
