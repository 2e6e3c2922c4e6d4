using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Tests.Report;

/// <summary>Hand-made results with every field set, or none.</summary>
internal static class Examples
{
    public static Observation Observation(string source = "night1/a.fits", int row = 0) => new()
    {
        Source = source,
        Row = row,
        Spectra = [],
        Target = "M 42, core",
        RaDeg = 83.8220833,
        DecDeg = -5.3911111,
        MidTimeUtc = new DateTime(2026, 1, 2, 3, 4, 5, DateTimeKind.Utc),
        ExposureS = 600,
        Instrument = "=spec",
        Medium = WavelengthMedium.Air,
        MediumAssumed = true,
        Frame = VelocityFrame.Barycentric,
        Cautions = ["check-medium"],
        Kept = [new("AIRMASS", "1.25")],
    };

    public static ObservationResult Full() => new()
    {
        Observation = Observation(),
        Verdict = Verdict.Firm,
        Kind = ObjectKind.Galaxy,
        Z = 0.1,
        ZErr = 0.00012345678,
        ZFile = 0.0999,
        VelocityCorrectionKmS = 29.9792458,
        Confidence = 0.99876,
        KindConfidence = 0.9999,
        LnOdds = 12.34567,
        SpectralType = "G2",
        SpectralTypeErr = 1.26,
        SnrPixel = 10.126,
        SnrAngstrom = 12,
        NoiseScale = 1.1,
        Resolution = 2000,
        ResolutionFrom = ResolutionSource.Keyword,
        LinesExpected = 5,
        LinesMatched = 4,
        ZeroPointKmS = -3.2,
        ZeroPointErrKmS = 1.5,
        Next = new(ObjectKind.Quasar, 0.5, 0.001, "broad lines", 3, 0.001),
        NextConfidence = 0.00123,
        Lines = [HAlpha()],
        Cautions = ["check-medium", "rival-redshift"],
    };

    public static ObservationResult Nothing() => new()
    {
        Observation = Observation("night1/b.fits") with
        {
            Target = "",
            RaDeg = null,
            DecDeg = null,
            MidTimeUtc = null,
            ExposureS = null,
            Instrument = "",
            Medium = WavelengthMedium.Vacuum,
            MediumAssumed = false,
            Frame = VelocityFrame.Unknown,
            Cautions = [],
            Kept = [],
        },
        Verdict = Verdict.Nothing,
        Kind = ObjectKind.Unknown,
    };

    public static LineMeasurement HAlpha() => new()
    {
        Line = "H alpha",
        Family = "hydrogen",
        RestVacuumA = 6564.614,
        RestAirA = 6562.801,
        ObservedVacuumA = 7220.419,
        ObservedErrA = 0.123,
        OffsetKmS = -4.5,
        OffsetErrKmS = 5.1,
        Flux = 1.5e-15,
        FluxErr = 1e-17,
        FluxUnit = "erg/s/cm2/A",
        EquivalentWidthRestA = -25.25,
        EquivalentWidthErrA = 0.5,
        FwhmObservedKmS = 250,
        FwhmIntrinsicKmS = 200,
        LnLikelihoodGain = 512.25,
        State = LineState.Matched,
        Note = "",
    };

    public static ObservationResult Explained() => Full() with
    {
        Candidates =
        [
            new(ObjectKind.Galaxy, 0.0999, 0.0001, "old stars and gas", 540.5, 0.9987),
            new(ObjectKind.Quasar, 0.5, 0.001, "broad lines", 533.8, 0.0012),
        ],
        Lines =
        [
            HAlpha(),
            HAlpha() with
            {
                Line = "[O III] 5007", Family = "forbidden", ObservedVacuumA = 5508.5, OffsetKmS = 12.2, LnLikelihoodGain = 20.5,
                EquivalentWidthRestA = -4, State = LineState.Blended, Note = "with an unknown line",
            },
            HAlpha() with
            {
                Line = "H beta", RestVacuumA = 4862.691, ObservedVacuumA = null, OffsetKmS = null, OffsetErrKmS = null,
                EquivalentWidthRestA = null, LnLikelihoodGain = null, State = LineState.ExpectedMissing,
            },
        ],
        OtherFeaturesLnGain = 15.25,
        PriorAndVolumeLnGain = -7.5,
        Cautions = ["rival-redshift", "word-without-advice"],
    };

    public static FileDescription File() => new(
    [
        new("HDU 1 COADD", "table of 4000 rows and 2 columns", ""),
        new("HDU 1 column LOGLAM", "double", "looks like wavelength by name LOGLAM"),
        new("HDU 1 column FLUX", "single", "looks like flux by name FLUX, in erg/s/cm2/A"),
    ], "[[load]]\nflux = \"HDU 1 column FLUX\"\n");

    public static Observation Read() => Observation() with
    {
        Notes =
        [
            new("wavelength", "HDU 1 column LOGLAM", "unit log10(Angstrom)"),
            new("flux", "HDU 1 column FLUX", "the only column with a flux unit"),
        ],
        Spectra =
        [
            new Spectrum
            {
                Label = "B", Wavelength = [4000, 4001, 4002], Flux = [1, 2, 3], InverseVariance = [1, 0, 1], HasErrors = true,
                FluxUnit = "erg/s/cm2/A",
            },
        ],
    };

    /// <summary>A galaxy with its data, as the pictures need it.</summary>
    public static ObservationResult Drawn()
    {
        var wavelength = Enumerable.Range(0, 3000).Select(i => 4000 + 1.5 * i).ToArray();
        var continuum = wavelength.Select(w => 1e-16 * (2 - w / 9000)).ToArray();
        var model = wavelength.Select((w, i) => continuum[i] * (1 + 3 * Math.Exp(-0.5 * Math.Pow((w - 7220) / 6, 2)))).ToArray();
        var sigma = Array.ConvertAll(continuum, c => c / 20);
        var flux = model.Select((m, i) => m + sigma[i] * Math.Sin(1e4 * i)).ToArray();
        var spectrum = new Spectrum
        {
            Wavelength = wavelength,
            Flux = flux,
            InverseVariance = Array.ConvertAll(sigma, s => 1 / (s * s)),
            HasErrors = true,
            FluxUnit = "erg/s/cm2/A",
        };
        return Explained() with
        {
            Observation = Observation() with { Spectra = [spectrum] },
            Curves = [new(continuum, model, sigma)],
        };
    }
}
