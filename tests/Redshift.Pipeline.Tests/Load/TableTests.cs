using Redshift.Fits;
using Redshift.Physics.Air;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

public sealed class TableTests : IDisposable
{
    private static readonly double[] Wavelengths = LoadBench.Linear(5000, 10);

    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Fact]
    public void Survey_table_gives_inverse_variance_mask_and_resolution()
    {
        var inverse = LoadBench.Constant(4);
        inverse[3] = 0;
        var mask = new int[LoadBench.Pixels];
        mask[5] = 1 << 24;
        var observation = _bench.One(writer => writer.WriteTable("COADD", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("flux", LoadBench.Flux()),
            ColumnDefinition.Doubles("loglam", LoadBench.Linear(3.58, 1e-4)),
            ColumnDefinition.Doubles("ivar", inverse),
            ColumnDefinition.Int32s("and_mask", mask),
            ColumnDefinition.Int32s("or_mask", [.. Enumerable.Repeat(1, LoadBench.Pixels)]),
            ColumnDefinition.Doubles("wdisp", LoadBench.Constant(1.1)),
            ColumnDefinition.Doubles("sky", LoadBench.Constant(3)),
            ColumnDefinition.Doubles("model", LoadBench.Constant(3)),
        ]));
        var spectrum = Assert.Single(observation.Spectra);
        Assert.True(spectrum.HasErrors);
        Assert.Equal([4, 4, 4, 0, 4, 0, 4], spectrum.InverseVariance[..7]);
        // σ of 1.1 pixels of ln10·1e-4: FWHM 2.3548·1.1·69.03 km/s.
        Assert.Equal(178.8, spectrum.FwhmKmS![20], 0.1);
        Assert.Equal(ResolutionSource.File, spectrum.ResolutionFrom);
    }

    [Fact]
    public void Quality_that_says_one_is_good_is_understood()
    {
        var quality = Enumerable.Repeat((short)1, LoadBench.Pixels).ToArray();
        quality[7] = 0;
        var spectrum = _bench.One(writer => writer.WriteTable("SCI", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("WAVELENGTH", Wavelengths) with { Unit = "ANGSTROMS" },
            ColumnDefinition.Doubles("FLUX", LoadBench.Flux()) with { Unit = "FLAM" },
            ColumnDefinition.Doubles("STATERROR", LoadBench.Constant(0.5)),
            ColumnDefinition.Doubles("SYSERROR", LoadBench.Constant(50)),
            ColumnDefinition.Doubles("FWHM", LoadBench.Constant(25)) with { Unit = "ANGSTROMS" },
            ColumnDefinition.Int16s("DATAQUAL", quality) with { Comment = "Data quality: 1=good, 0=bad" },
        ])).Spectra[0];
        Assert.Equal(0, spectrum.InverseVariance[7]);
        Assert.Equal(4, spectrum.InverseVariance[8], 1e-12);
        Assert.Equal(25 / 5000.0 * 299792.458, spectrum.FwhmKmS![0], 1.5);
    }

    [Fact]
    public void One_row_of_vectors_is_one_spectrum_and_names_decide_between_its_fluxes()
    {
        const int N = LoadBench.Pixels;
        var observation = _bench.One(writer => writer.WriteTable("SPECTRUM", 1,
        [
            ColumnDefinition.Doubles("WAVE", Wavelengths, N) with { Unit = "Angstrom", Ucd = "em.wl;obs.atmos", Utype = "spec:Data.SpectralAxis.Value" },
            ColumnDefinition.Doubles("FLUX_REDUCED", LoadBench.Constant(1), N) with { Unit = "adu", Ucd = "phot.flux.density;em.wl;src.net;stat.uncalib", Utype = "eso:Data.FluxAxis.Value" },
            ColumnDefinition.Doubles("ERR_REDUCED", LoadBench.Constant(1), N) with { Ucd = "stat.error;phot.flux.density;stat.uncalib", Utype = "eso:Data.FluxAxis.Accuracy.StatError" },
            ColumnDefinition.Doubles("FLUX", LoadBench.Flux(), N) with { Ucd = "phot.flux.density;em.wl;src.net;meta.main", Utype = "spec:Data.FluxAxis.Value" },
            ColumnDefinition.Doubles("ERR", LoadBench.Constant(0.5), N) with { Ucd = "stat.error;phot.flux.density;meta.main", Utype = "spec:Data.FluxAxis.Accuracy.StatError" },
        ], [Card.Of("SPECSYS", "TOPOCENT")]));
        var spectrum = Assert.Single(observation.Spectra);
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
        Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
        Assert.Equal(WavelengthMedium.Air, observation.Medium);
        Assert.False(observation.MediumAssumed);
        Assert.Equal(VelocityFrame.Topocentric, observation.Frame);
        Assert.Equal(AirRefraction.ToVacuum(5000), spectrum.Wavelength[0], 1e-9);
    }

    [Fact]
    public void Plain_flux_wins_over_its_variants_and_vacuum_over_air()
    {
        var observation = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("lambda_air", LoadBench.Linear(4998, 10)),
            ColumnDefinition.Doubles("lambda_vac", Wavelengths),
            ColumnDefinition.Doubles("flux_nocorr", LoadBench.Constant(2)),
            ColumnDefinition.Doubles("flux", LoadBench.Flux()),
            ColumnDefinition.Doubles("error_nocorr", LoadBench.Constant(7)),
            ColumnDefinition.Doubles("error", LoadBench.Constant(0.5)),
        ]));
        Assert.Equal(5000, observation.Spectra[0].Wavelength[0]);
        Assert.Equal(WavelengthMedium.Vacuum, observation.Medium);
        Assert.False(observation.MediumAssumed);
        Assert.Equal(LoadBench.Flux(), observation.Spectra[0].Flux);
        Assert.Equal(4, observation.Spectra[0].InverseVariance[0], 1e-12);
    }

    [Fact]
    public void Optimal_extraction_is_preferred_with_its_own_wavelength_and_noise()
    {
        var observation = _bench.One(writer => writer.WriteTable("SPAT0123", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("BOX_WAVE", LoadBench.Linear(100, 1)),
            ColumnDefinition.Doubles("BOX_COUNTS", LoadBench.Constant(1)),
            ColumnDefinition.Doubles("OPT_COUNTS", LoadBench.Constant(2)),
            ColumnDefinition.Doubles("OPT_COUNTS_IVAR", LoadBench.Constant(99)),
            ColumnDefinition.Doubles("OPT_FLAM", LoadBench.Flux()),
            ColumnDefinition.Doubles("OPT_FLAM_IVAR", LoadBench.Constant(4)),
            ColumnDefinition.Doubles("OPT_WAVE", Wavelengths),
        ]));
        Assert.Equal(LoadBench.Flux(), observation.Spectra[0].Flux);
        Assert.Equal(4, observation.Spectra[0].InverseVariance[0], 1e-12);
        Assert.Equal(5000, observation.Spectra[0].Wavelength[0], 2);
    }

    [Theory]
    [InlineData("FLUX_WEST", "FLUX_EAST")]
    [InlineData("FLUX_A", "FLUX_B")]
    public void Two_fluxes_of_equal_standing_are_refused_with_their_names(string one, string other)
    {
        var reject = LoadBench.Refused(_bench.Fits(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles(one, LoadBench.Flux()), ColumnDefinition.Doubles(other, LoadBench.Flux())])));
        Assert.Equal("HDU 1", reject.Place);
        Assert.Equal($"several candidates for the flux: {one}, {other}", reject.Found);
        Assert.Equal("one, or a [[load]] rule that names it", reject.Expected);
    }

    [Fact]
    public void Rows_with_an_order_number_are_spectra_of_one_observation()
    {
        const int N = LoadBench.Pixels;
        var observation = _bench.One(writer => writer.WriteTable("SCI", 2,
        [
            ColumnDefinition.Int16s("SPORDER", [70, 71]),
            ColumnDefinition.Doubles("WAVELENGTH", [.. Wavelengths, .. LoadBench.Linear(5500, 10)], N) with { Unit = "Angstroms" },
            ColumnDefinition.Doubles("FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)], N),
            ColumnDefinition.Doubles("ERROR", [.. LoadBench.Constant(0.5), .. LoadBench.Constant(0.25)], N),
        ]));
        Assert.Equal(["order 70", "order 71"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
        Assert.Equal(16, observation.Spectra[1].InverseVariance[0], 1e-12);
        Assert.Equal(5500, observation.Spectra[1].Wavelength[0]);
    }

    [Fact]
    public void Rows_whose_ranges_follow_each_other_are_orders()
    {
        const int N = LoadBench.Pixels;
        var observation = _bench.One(static writer => writer.WriteTable("SCI", 2,
        [
            ColumnDefinition.Doubles("WAVE", [.. Wavelengths, .. LoadBench.Linear(5500, 10)], N),
            ColumnDefinition.Doubles("FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)], N),
        ]));
        Assert.Equal(["order 1", "order 2"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
    }

    [Theory]
    [InlineData("EXPNUM", false)]
    [InlineData("APERTURE", true)]
    public void Rows_that_a_column_counts_are_one_object_unless_they_have_targets(string counter, bool hasTargets)
    {
        const int N = LoadBench.Pixels;
        ColumnDefinition[] columns =
        [
            ColumnDefinition.Int16s(counter, [1, 2]), ColumnDefinition.Doubles("WAVE", [.. Wavelengths, .. Wavelengths], N),
            ColumnDefinition.Doubles("FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)], N),
        ];
        var outcomes = _bench.Fits(writer => writer.WriteTable("SCI", 2, hasTargets ? [.. columns, ColumnDefinition.Strings("TARGET", ["a", "b"])] : columns));
        Assert.Equal(hasTargets ? ["a", "b"] : [""], outcomes.Select(static outcome => outcome.Observation!.Target));
        if (!hasTargets) Assert.Equal(["expnum 1", "expnum 2"], outcomes[0].Observation!.Spectra.Select(static spectrum => spectrum.Label));
    }

    [Fact]
    public void Rows_with_targets_are_observations_of_their_own()
    {
        const int N = LoadBench.Pixels;
        var outcomes = _bench.Fits(static writer => writer.WriteTable("SPECTRA", 2,
        [
            ColumnDefinition.Int64s("TARGETID", [39633559463397280, 7]),
            ColumnDefinition.Doubles("RA", [150.5, 151]) with { Unit = "deg" },
            ColumnDefinition.Doubles("DEC", [-2.25, 3]) with { Unit = "deg" },
            ColumnDefinition.Doubles("WAVE", [.. Wavelengths, .. Wavelengths], N),
            ColumnDefinition.Doubles("FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)], N),
        ]));
        Assert.Equal(2, outcomes.Count);
        var first = outcomes[0].Observation!;
        Assert.Equal((0, "39633559463397280", 150.5, -2.25), (first.Row, first.Target, first.RaDeg, first.DecDeg));
        Assert.Equal((1, "7"), (outcomes[1].Observation!.Row, outcomes[1].Observation!.Target));
        Assert.Equal(LoadBench.Flux(level: 20), outcomes[1].Observation!.Spectra[0].Flux);
    }

    [Fact]
    public void First_wavelength_and_step_in_scalar_columns_make_the_axis()
    {
        const int N = LoadBench.Pixels;
        var spectrum = _bench.One(static writer => writer.WriteTable("MELO", 1,
        [
            ColumnDefinition.Doubles("WAVELENGTH", [1150.0]) with { Unit = "ANGSTROM" },
            ColumnDefinition.Doubles("DELTAW", [1.676]) with { Unit = "ANGSTROM" },
            ColumnDefinition.Doubles("FLUX", LoadBench.Flux(), N) with { Unit = "ERG/CM2/S/A" },
            ColumnDefinition.Doubles("SIGMA", LoadBench.Constant(0.5), N),
        ])).Spectra[0];
        Assert.Equal(1150, spectrum.Wavelength[0], 1e-9);
        Assert.Equal(1150 + 63 * 1.676, spectrum.Wavelength[^1], 1e-9);
        Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
    }

    [Fact]
    public void Overlapping_orders_in_one_column_are_taken_apart()
    {
        var spectra = _bench.One(static writer => writer.WriteTable("", 2L * LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("AWAV", [.. LoadBench.Linear(500, 0.1), .. LoadBench.Linear(504, 0.1)]) with { Unit = "1 nm" },
            ColumnDefinition.Doubles("FLUX_NOR", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)]),
        ])).Spectra;
        Assert.Equal(["part 1", "part 2"], spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(AirRefraction.ToVacuum(5040), spectra[1].Wavelength[0], 1e-9);
        Assert.Equal(LoadBench.Flux(level: 20), spectra[1].Flux);
    }

    [Fact]
    public void Repeated_and_unsorted_wavelengths_are_dropped_and_sorted()
    {
        double[] wavelengths = [.. Wavelengths];
        wavelengths[10] = wavelengths[9];
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVE", wavelengths), ColumnDefinition.Doubles("FLUX", LoadBench.Flux())])).Spectra[0];
        Assert.Equal(LoadBench.Pixels - 1, spectrum.Count);
        Assert.All(Enumerable.Range(1, spectrum.Count - 1), i => Assert.True(spectrum.Wavelength[i] > spectrum.Wavelength[i - 1]));
    }

    [Fact]
    public void Errors_that_are_zero_negative_or_not_finite_mask_their_pixels()
    {
        var errors = LoadBench.Constant(0.5);
        (errors[1], errors[2], errors[3], errors[4]) = (0, -1, double.NaN, double.PositiveInfinity);
        var flux = LoadBench.Flux();
        flux[5] = double.NaN;
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("FLUX", flux), ColumnDefinition.Doubles("E_FLUX", errors)])).Spectra[0];
        Assert.Equal([4, 0, 0, 0, 0, 0, 4], spectrum.InverseVariance[..7]);
        Assert.Equal(0, spectrum.Flux[5]);
    }

    [Fact]
    public void Errors_that_are_all_zero_are_none()
    {
        var spectrum = _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("FLUX", LoadBench.Flux()), ColumnDefinition.Doubles("ERR", LoadBench.Constant(0))])).Spectra[0];
        Assert.False(spectrum.HasErrors);
        Assert.Equal(LoadBench.Constant(1), spectrum.InverseVariance);
    }

    [Fact]
    public void Variance_becomes_inverse_variance() => Assert.Equal(4, _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
        [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("FLUX", LoadBench.Flux()), ColumnDefinition.Doubles("FLUX_VAR", LoadBench.Constant(0.25))])).Spectra[0].InverseVariance[0], 1e-12);

    [Fact]
    public void Coadd_is_read_and_its_exposures_are_left_aside()
    {
        var observation = _bench.One(static writer =>
        {
            writer.WriteTable("COADD", LoadBench.Pixels, Columns(LoadBench.Flux()));
            writer.WriteTable("B1-00049985", LoadBench.Pixels, Columns(LoadBench.Constant(1)));
            writer.WriteTable("R1-00049985", LoadBench.Pixels, Columns(LoadBench.Constant(1)));
        });
        Assert.Equal(LoadBench.Flux(), Assert.Single(observation.Spectra).Flux);
        Assert.Contains(observation.Notes, static note => note.Role == "left aside" && note.Choice.Contains("B1-00049985", StringComparison.Ordinal));
    }

    [Fact]
    public void Arms_and_extractions_are_told_by_the_names_of_their_units()
    {
        var observation = _bench.One(static writer =>
        {
            writer.WriteTable("Boxcar-B", LoadBench.Pixels, Columns(LoadBench.Constant(1)));
            writer.WriteTable("Boxcar-R", LoadBench.Pixels, Columns(LoadBench.Constant(1)));
            writer.WriteTable("Horne-B", LoadBench.Pixels, Columns(LoadBench.Flux()));
            writer.WriteTable("Horne-R", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)));
        });
        Assert.Equal(["B", "R"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
    }

    [Fact]
    public void Units_that_count_exposures_are_spectra_of_one_observation()
    {
        var observation = _bench.One(static writer =>
        {
            writer.WriteTable("EXP1", LoadBench.Pixels, Columns(LoadBench.Flux()));
            writer.WriteTable("EXP2", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)));
        });
        Assert.Equal(["EXP1", "EXP2"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
    }

    [Fact]
    public void Units_with_targets_of_their_own_are_observations_of_their_own()
    {
        var outcomes = _bench.Fits(static writer =>
        {
            writer.WriteTable("SLIT1", LoadBench.Pixels, Columns(LoadBench.Flux()), [Card.Of("OBJECT", "a")]);
            writer.WriteTable("SLIT2", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)), [Card.Of("OBJECT", "b")]);
        });
        Assert.Equal(["a", "b"], outcomes.Select(static outcome => outcome.Observation!.Target));
        Assert.Equal(LoadBench.Flux(level: 20), outcomes[1].Observation!.Spectra[0].Flux);
    }

    [Fact]
    public void Units_of_equal_standing_are_refused_with_their_names() =>
        Assert.Equal("HDU 1 (EAST), HDU 2 (WEST)", LoadBench.Refused(_bench.Fits(static writer =>
        {
            writer.WriteTable("EAST", LoadBench.Pixels, Columns(LoadBench.Flux()));
            writer.WriteTable("WEST", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)));
        })).Place);

    [Theory]
    [InlineData("", "", "")]
    [InlineData("col1", "col2", "col3")]
    public void Columns_without_names_are_wavelength_flux_and_error(string first, string second, string third)
    {
        // What makes it an error is that neighbouring fluxes differ by as much.
        double[] flux = [.. Enumerable.Range(0, LoadBench.Pixels).Select(static i => 10 + 0.1 * (i % 2))];
        var errors = LoadBench.Constant(0.1);
        var spectrum = _bench.One(writer => writer.WriteTable("", LoadBench.Pixels,
            [ColumnDefinition.Doubles(first, Wavelengths), ColumnDefinition.Doubles(second, flux), ColumnDefinition.Doubles(third, errors)])).Spectra[0];
        Assert.Equal((5000, 10), (spectrum.Wavelength[0], spectrum.Flux[0]));
        Assert.True(spectrum.HasErrors);
    }

    [Fact]
    public void Arms_side_by_side_in_one_table_are_spectra_of_one_observation()
    {
        var observation = _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("WAVE_B", Wavelengths), ColumnDefinition.Doubles("FLUX_B", LoadBench.Flux()), ColumnDefinition.Doubles("IVAR_B", LoadBench.Constant(4)),
            ColumnDefinition.Doubles("WAVE_R", LoadBench.Linear(7000, 10)), ColumnDefinition.Doubles("FLUX_R", LoadBench.Flux(level: 20)), ColumnDefinition.Doubles("IVAR_R", LoadBench.Constant(9)),
        ]));
        Assert.Equal(["B", "R"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal((7000, 9), (observation.Spectra[1].Wavelength[0], observation.Spectra[1].InverseVariance[0]));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
    }

    [Fact]
    public void Logical_column_masks()
    {
        var spectrum = _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
            [.. Columns(LoadBench.Flux()), ColumnDefinition.Logicals("mask", static row => row == 3)])).Spectra[0];
        Assert.Equal([4, 4, 4, 0, 4], spectrum.InverseVariance[..5]);
    }

    [Fact]
    public void Error_named_after_a_flux_per_wavelength_is_no_error_of_the_wavelength() => Assert.Equal(4, _bench.One(static writer =>
        writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("LAMBDA", Wavelengths), ColumnDefinition.Doubles("F_LAMBDA", LoadBench.Flux()), ColumnDefinition.Doubles("E_F_LAMBDA", LoadBench.Constant(0.5)),
        ])).Spectra[0].InverseVariance[0], 1e-12);

    [Fact]
    public void Flux_comes_before_its_normalised_form() => Assert.Equal(LoadBench.Flux(), _bench.One(static writer =>
        writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("NORM_FLUX", LoadBench.Constant(1)), ColumnDefinition.Doubles("INTENSITY", LoadBench.Flux()),
        ])).Spectra[0].Flux);

    [Fact]
    public void Arm_without_a_name_beside_one_with_a_name_is_an_arm_too()
    {
        var observation = _bench.One(static writer =>
        {
            writer.WriteTable("", LoadBench.Pixels, Columns(LoadBench.Flux()));
            writer.WriteTable("RED", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)));
        });
        Assert.Equal(["", "RED"], observation.Spectra.Select(static spectrum => spectrum.Label));
    }

    [Fact]
    public void Versions_of_one_name_are_observations_of_their_own()
    {
        var outcomes = _bench.Fits(static writer =>
        {
            writer.WriteTable("EXTRACT1D", LoadBench.Pixels, Columns(LoadBench.Flux()), [Card.Of("EXTVER", 1L), Card.Of("SOURCEID", 11L)]);
            writer.WriteTable("EXTRACT1D", LoadBench.Pixels, Columns(LoadBench.Flux(level: 20)), [Card.Of("EXTVER", 2L), Card.Of("SOURCEID", 12L)]);
        });
        Assert.Equal([0, 1], outcomes.Select(static outcome => outcome.Observation!.Row));
        Assert.Equal(LoadBench.Flux(level: 20), outcomes[1].Observation!.Spectra[0].Flux);
    }

    [Fact]
    public void False_answers_in_header_and_table_change_nothing()
    {
        var plain = _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels, Columns(LoadBench.Flux())));
        var told = _bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
            [.. Columns(LoadBench.Flux()), ColumnDefinition.Doubles("Z", LoadBench.Constant(3.7)), ColumnDefinition.Strings("CLASS", 6, static _ => "GALAXY")],
            [Card.Of("OBJECT", "QSO at z = 2.5"), Card.Of("Z", 2.5), Card.Of("REDSHIFT", 2.5), Card.Of("CLASS", "QSO"), Card.Of("SUBCLASS", "BROADLINE"), Card.Of("ZSOURCE", 2.5), Card.Of("VELANGL", 3.0)]));
        Assert.Equal(plain.Spectra[0].Wavelength, told.Spectra[0].Wavelength);
        Assert.Equal(plain.Spectra[0].Flux, told.Spectra[0].Flux);
        Assert.Equal((plain.Frame, plain.Medium), (told.Frame, told.Medium));
        Assert.Equal(plain.Cautions, told.Cautions);
        var pipeline = new ObservationPipeline(new());
        var (answer, again) = (pipeline.Analyze(plain), pipeline.Analyze(told));
        Assert.Equal((answer.Z, answer.ZErr, answer.Kind, answer.Confidence, answer.LnOdds), (again.Z, again.ZErr, again.Kind, again.Confidence, again.LnOdds));
    }

    [Fact]
    public void Rule_reads_what_it_names_and_pipeline_values_override_the_file()
    {
        using var bench = new LoadBench
        {
            Settings = new()
            {
                Resolution = 3000,
                Rules =
                [
                    new() { When = new Dictionary<string, string> { ["INSTRUME"] = "OTHER" }, Flux = "FLUX_WEST" },
                    new() { When = new Dictionary<string, string> { ["INSTRUME"] = "ODD" }, Hdus = ["1"], Wavelength = "LAM", WavelengthUnit = "nm", Flux = "FLUX_EAST", Error = "SCATTER_EAST", Medium = WavelengthMedium.Vacuum, Frame = VelocityFrame.Barycentric },
                ],
            },
        };
        var observation = bench.One(static writer => writer.WriteTable("", LoadBench.Pixels,
        [
            ColumnDefinition.Doubles("LAM", LoadBench.Linear(500, 1)) with { Unit = "Angstrom" },
            ColumnDefinition.Doubles("FLUX_WEST", LoadBench.Constant(3)),
            ColumnDefinition.Doubles("FLUX_EAST", LoadBench.Flux()),
            ColumnDefinition.Doubles("SCATTER_EAST", LoadBench.Constant(0.5)),
        ], [Card.Of("INSTRUME", "ODD"), Card.Of("SPEC_RES", 1000.0)]));
        var spectrum = observation.Spectra[0];
        Assert.Equal(5000, spectrum.Wavelength[0]);
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
        Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
        Assert.Equal(299792.458 / 3000, spectrum.FwhmKmS![0], 1e-3);
        Assert.Equal(ResolutionSource.Pipeline, spectrum.ResolutionFrom);
        Assert.Equal((WavelengthMedium.Vacuum, false, VelocityFrame.Barycentric), (observation.Medium, observation.MediumAssumed, observation.Frame));
        Assert.Empty(observation.Cautions);
    }

    [Fact]
    public void Description_of_a_layout_spells_out_the_roles()
    {
        void Write(FitsWriter writer) => writer.WriteTable("SPEC", LoadBench.Pixels, Columns(LoadBench.Flux()), [Card.Of("INSTRUME", "A \"quoted\" one"), Card.Of("VACUUM", true)]);
        var path = _bench.FileIn("described.fits");
        using (var stream = File.Create(path)) Write(new FitsWriter(stream));
        var rule = Assert.Single(PipelineFile.Parse(SpectrumLoader.Describe(path, 0, new()).Rule!, "pasted.toml").Load.Rules);
        Assert.Equal("A \"quoted\" one", rule.When["INSTRUME"]);
        Assert.Equal(("HDU 1 column WAVE", "Angstrom", "HDU 1 column FLUX", "HDU 1 column IVAR"), (rule.Wavelength, rule.WavelengthUnit, rule.Flux, rule.InverseVariance));
        Assert.Equal((WavelengthMedium.Vacuum, null), (rule.Medium, rule.Frame));
        // The bench loads every file of these tests by its own description again.
        _bench.Path(path);
    }

    private static ColumnDefinition[] Columns(double[] flux) =>
    [
        ColumnDefinition.Doubles("WAVE", Wavelengths) with { Unit = "Angstrom" },
        ColumnDefinition.Doubles("FLUX", flux),
        ColumnDefinition.Doubles("IVAR", LoadBench.Constant(4)),
    ];
}
