using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

public sealed class ImageTests : IDisposable
{
    private const int N = LoadBench.Pixels;

    private static readonly IReadOnlyList<Card> Axis = LoadBench.Axis(5000, 10, Card.Of("CUNIT1", "Angstrom"), Card.Of("VACUUM", true));

    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Fact]
    public void Three_axes_of_an_extraction_give_the_optimal_spectrum_and_its_sigma()
    {
        var values = LoadBench.Flux().Concat(LoadBench.Constant(1)).Concat(LoadBench.Constant(2)).Concat(LoadBench.Constant(0.5)).ToArray();
        Card[] names = [Card.Of("BANDID1", "spectrum: background fit, weights variance, clean no"), Card.Of("BANDID2", "raw: background fit"), Card.Of("BANDID3", "background: background fit"), Card.Of("BANDID4", "sigma - background fit")];
        foreach (var cards in new[] { [.. Axis, .. names], Axis })
        {
            var spectrum = _bench.One(writer => writer.WriteImage("", values, [N, 1, 4], cards)).Spectra[0];
            Assert.Equal(LoadBench.Flux(), spectrum.Flux);
            Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
        }
    }

    [Fact]
    public void Rows_listed_in_one_card_are_recognised()
    {
        double[] values = [.. LoadBench.Flux(), .. LoadBench.Constant(4), .. LoadBench.Constant(1), .. LoadBench.Constant(0), .. LoadBench.Constant(1)];
        var spectrum = _bench.One(writer => writer.WriteImage("", values, [N, 5],
        [
            Card.Of("EXTEN0", "Flux Inverse Subcontinuum Andmask Ormask"), Card.Of("CRVAL1", 3.5682), Card.Of("CD1_1", 1e-4), Card.Of("CRPIX1", 1L),
            Card.Of("CTYPE1", "LINEAR"), Card.Of("DC-FLAG", 1L), Card.Of("COEFF0", 3.5682), Card.Of("COEFF1", 1e-4), Card.Of("VACUUM", true), Card.Of("HELIO", true),
        ])).Spectra[0];
        Assert.Equal(Math.Pow(10, 3.5682), spectrum.Wavelength[0], 1e-8);
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
        Assert.Equal(LoadBench.Constant(4), spectrum.InverseVariance);
    }

    [Fact]
    public void Rows_of_wavelength_flux_and_error_are_told_by_their_content()
    {
        double[] values = [.. LoadBench.Linear(0.8, 0.01), .. LoadBench.Flux(), .. LoadBench.Constant(0.5)];
        var spectrum = _bench.One(writer => writer.WriteImage("", values, [N, 3], [Card.Of("XUNITS", "um")])).Spectra[0];
        Assert.Equal(8000, spectrum.Wavelength[0], 1);
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
        Assert.Equal(4, spectrum.InverseVariance[0], 1e-12);
    }

    [Fact]
    public void Siblings_for_error_and_bad_pixels_are_found_by_name()
    {
        var bad = LoadBench.Constant(0);
        bad[4] = 1;
        var observation = _bench.One(writer =>
        {
            writer.WriteImage("FLUX", LoadBench.Flux(), [N], Axis);
            writer.WriteImage("ERROR", LoadBench.Constant(0.5), [N], Axis);
            writer.WriteImage("BADPIX", bad, [N], Axis);
        });
        Assert.Equal([4, 4, 4, 4, 0, 4], observation.Spectra[0].InverseVariance[..6]);
    }

    [Theory]
    [InlineData("AIRORVAC", "air", WavelengthMedium.Air)]
    [InlineData("CTYPE1", "AWAV", WavelengthMedium.Air)]
    [InlineData("CTYPE1", "WAVE", WavelengthMedium.Vacuum)]
    [InlineData("COMMENT", "vacuum wavelengths", WavelengthMedium.Vacuum)]
    public void Medium_and_frame_are_looked_for_beside_the_wavelengths(string keyword, string text, WavelengthMedium expected)
    {
        var observation = _bench.One(writer =>
        {
            writer.WriteImage("FLUX", LoadBench.Flux(), [N]);
            writer.WriteImage("WAVELENGTH", LoadBench.Linear(5000, 10), [N], [keyword == "COMMENT" ? Card.Commentary(keyword, text) : Card.Of(keyword, text), Card.Of("SPECSYS", "BARYCENT")]);
        });
        Assert.Equal((expected, false, VelocityFrame.Barycentric), (observation.Medium, observation.MediumAssumed, observation.Frame));
    }

    [Fact]
    public void Three_arms_with_matrices_are_one_observation_a_row()
    {
        // A response of Gaussian shape with σ = 1.2 pixels, averaged over the pixels.
        var matrix = Matrix(1.2);
        var outcomes = _bench.Fits(writer =>
        {
            writer.WriteHeader("");
            writer.WriteTable("FIBERMAP", 2, [ColumnDefinition.Int64s("TARGETID", [101, 102]), ColumnDefinition.Doubles("TARGET_RA", [10.0, 20]), ColumnDefinition.Doubles("TARGET_DEC", [-1.0, 2])]);
            foreach (var (arm, first) in new[] { ("B", 3600.0), ("R", 5760), ("Z", 7520) })
            {
                writer.WriteImage($"{arm}_WAVELENGTH", LoadBench.Linear(first, 0.8), [N], [Card.Of("BUNIT", "Angstrom")]);
                writer.WriteImage($"{arm}_FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux(level: first)], [N, 2], [Card.Of("BUNIT", "10**-17 erg/(s cm2 Angstrom)")]);
                writer.WriteImage($"{arm}_IVAR", [.. LoadBench.Constant(4), .. LoadBench.Constant(9)], [N, 2]);
                writer.WriteImage($"{arm}_MASK", new int[2 * N], [N, 2]);
                writer.WriteImage($"{arm}_RESOLUTION", [.. matrix, .. matrix], [N, 11, 2]);
            }
        });
        Assert.Equal(["101", "102"], outcomes.Select(static outcome => outcome.Observation!.Target));
        var second = outcomes[1].Observation!;
        Assert.Equal((1, 20.0, 2.0), (second.Row, second.RaDeg, second.DecDeg));
        Assert.Equal(["B", "R", "Z"], second.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 5760), second.Spectra[1].Flux);
        Assert.Equal(LoadBench.Constant(9), second.Spectra[1].InverseVariance);
        Assert.Equal(5760, second.Spectra[1].Wavelength[0]);
        var expected = 2.35482 * 1.2 * 0.8 / second.Spectra[1].Wavelength[30] * 299792.458;
        Assert.Equal(expected, second.Spectra[1].FwhmKmS![30], 0.01 * expected);
    }

    [Fact]
    public void Stack_with_a_fibre_table_reads_radians_and_knows_sky_parked_and_broken_fibres()
    {
        var outcomes = _bench.Fits(writer =>
        {
            writer.WriteImage("", [.. LoadBench.Flux(level: 1), .. LoadBench.Flux(level: 2), .. LoadBench.Flux(level: 3), .. LoadBench.Flux(level: 4)], [N, 4], Axis);
            writer.WriteImage("VARIANCE", LoadBench.Constant(0.25, 4 * N), [N, 4]);
            writer.WriteTable("FIBRES", 4,
            [
                ColumnDefinition.Strings("NAME", ["G001", "Sky 12", "PARKED", "G002"]), ColumnDefinition.Strings("TYPE", ["P", "S", "U", "N"]),
                ColumnDefinition.Doubles("RA", [Math.PI / 2, 1.57, 1.58, 1.59]), ColumnDefinition.Doubles("DEC", [-Math.PI / 6, -0.5, -0.5, -0.5]),
            ]);
        });
        var first = outcomes[0].Observation!;
        Assert.Equal("G001", first.Target);
        Assert.Equal(90, first.RaDeg!.Value, 1e-9);
        Assert.Equal(-30, first.DecDeg!.Value, 1e-9);
        Assert.Equal(4, first.Spectra[0].InverseVariance[0], 1e-12);
        Assert.Equal(LoadBench.Flux(level: 2), outcomes[1].Observation!.Spectra[0].Flux);
        Assert.Contains("sky-fibre", outcomes[1].Observation!.Cautions);
        Assert.Equal("a parked fibre", outcomes[2].Reject!.Found);
        Assert.Equal((3, "a broken fibre"), (outcomes[3].Reject!.Row, outcomes[3].Reject!.Found));
    }

    [Theory]
    [InlineData(2, "1 x 64")]
    [InlineData(3, "1 x 1 x 64")]
    public void Axes_of_one_pixel_before_the_spectral_one_are_passed_over(int axis, string shape)
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [.. shape.Split(" x ").Select(long.Parse)],
        [
            Card.Of("CTYPE1", "RA---TAN"), Card.Of("CRVAL1", 150.0), Card.Of("CDELT1", 1e-4), Card.Of($"CTYPE{axis}", "AWAV"), Card.Of($"CUNIT{axis}", "nm"),
            Card.Of($"CRVAL{axis}", 500.0), Card.Of($"CDELT{axis}", 0.1), Card.Of($"CRPIX{axis}", 1L),
        ]));
        Assert.Equal(WavelengthMedium.Air, observation.Medium);
        Assert.Equal(LoadBench.Flux(), Assert.Single(observation.Spectra).Flux);
        Assert.Equal(5001.394851, observation.Spectra[0].Wavelength[0], 1e-6);
    }

    [Theory]
    [InlineData(40)]
    [InlineData(-40)]
    public void Rows_whose_ranges_follow_each_other_are_orders_of_one_object(double step)
    {
        var observation = _bench.One(writer =>
        {
            writer.WriteImage("FLUX", [.. Enumerable.Range(1, 40).SelectMany(static row => LoadBench.Flux(level: row))], [N, 40]);
            writer.WriteImage("WAVE", [.. Enumerable.Range(0, 40).SelectMany(row => LoadBench.Linear(6000 + step * row, 1))], [N, 40]);
        });
        Assert.Equal(40, observation.Spectra.Count);
        Assert.Equal("order 40", observation.Spectra[39].Label);
        Assert.Equal(LoadBench.Flux(level: 40), observation.Spectra[39].Flux);
        Assert.Equal(6000 + 39 * step, observation.Spectra[39].Wavelength[0]);
    }

    [Fact]
    public void Rows_whose_ranges_lie_about_at_random_are_objects_of_their_own()
    {
        var outcomes = _bench.Fits(static writer =>
        {
            writer.WriteImage("FLUX", [.. Enumerable.Range(1, 3).SelectMany(static row => LoadBench.Flux(level: row))], [N, 3]);
            writer.WriteImage("WAVE", [.. LoadBench.Linear(6000, 1), .. LoadBench.Linear(6050, 1), .. LoadBench.Linear(5980, 1)], [N, 3]);
        });
        Assert.Equal([0, 1, 2], outcomes.Select(static outcome => outcome.Observation!.Row));
        Assert.Equal(5980, outcomes[2].Observation!.Spectra[0].Wavelength[0]);
    }

    [Fact]
    public void Image_of_the_statistics_beside_the_data_holds_their_variance() => Assert.Equal(4, _bench.One(static writer =>
    {
        writer.WriteImage("DATA", LoadBench.Flux(), [N], Axis);
        writer.WriteImage("STAT", LoadBench.Constant(0.25), [N], Axis);
    }).Spectra[0].InverseVariance[0], 1e-12);

    [Fact]
    public void Wavelengths_of_a_stack_can_stand_in_a_table()
    {
        var outcomes = _bench.Fits(static writer =>
        {
            writer.WriteImage("", [.. LoadBench.Flux(), .. LoadBench.Flux(level: 20)], [N, 2]);
            writer.WriteTable("TARGETS", 2, [ColumnDefinition.Strings("NAME", ["a", "b"])]);
            writer.WriteTable("GRID", N, [ColumnDefinition.Doubles("WAVE", LoadBench.Linear(500, 1)) with { Unit = "nm" }]);
        });
        Assert.Equal(["a", "b"], outcomes.Select(static outcome => outcome.Observation!.Target));
        Assert.Equal(5000, outcomes[1].Observation!.Spectra[0].Wavelength[0]);
    }

    [Fact]
    public void Axis_that_counts_pixels_is_refused() => Assert.Equal("an axis that counts the pixels", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteImage("", LoadBench.Flux(), [N], LoadBench.Axis(1, 1)))).Found);

    [Fact]
    public void Wavelengths_in_an_alternate_description_are_used_where_the_first_counts_pixels()
    {
        var observation = _bench.One(static writer => writer.WriteImage("", LoadBench.Flux(), [N], LoadBench.Axis(1, 1,
            Card.Of("CTYPE1W", "AWAV"), Card.Of("CUNIT1W", "nm"), Card.Of("CRVAL1W", 500.0), Card.Of("CDELT1W", 0.1), Card.Of("CRPIX1W", 1L))));
        Assert.Equal(WavelengthMedium.Air, observation.Medium);
        Assert.Equal(5001.394851, observation.Spectra[0].Wavelength[0], 1e-6);
    }

    [Fact]
    public void Cube_is_refused() => Assert.Equal("an image of 20 x 20 x 50", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteImage("", new double[20 * 20 * 50], [20, 20, 50], [Card.Of("CTYPE3", "WAVE"), Card.Of("CRVAL3", 5000.0), Card.Of("CDELT3", 1.0)]))).Found);

    [Fact]
    public void Frame_without_anything_that_counts_its_rows_is_refused()
    {
        var reject = LoadBench.Refused(_bench.Fits(static writer => writer.WriteImage("", new double[N * 40], [N, 40], Axis)));
        Assert.Equal("an image of 64 x 40", reject.Found);
        Assert.Equal("a stack with a table of its rows, named bands, or a [[load]] rule", reject.Expected);
    }

    [Fact]
    public void Rule_reads_a_frame_as_a_stack()
    {
        using var bench = new LoadBench { Settings = new() { Rules = [new() { Flux = "HDU 0" }] } };
        var outcomes = bench.Fits(static writer => writer.WriteImage("", [.. Enumerable.Range(1, 12).SelectMany(static row => LoadBench.Flux(level: row))], [N, 12], Axis));
        Assert.Equal(12, outcomes.Count);
        Assert.Equal(LoadBench.Flux(level: 12), outcomes[11].Observation!.Spectra[0].Flux);
    }

    [Fact]
    public void Celestial_image_is_no_spectrum() => Assert.Contains("spectral first axis", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteImage("", new double[N], [N], LoadBench.Axis(150, -0.001, Card.Of("CTYPE1", "RA---TAN"))))).Expected, StringComparison.Ordinal);

    [Fact]
    public void Image_without_wavelengths_is_refused() => Assert.Equal("wavelengths", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteImage("", LoadBench.Flux(), [N]))).Expected);

    [Fact]
    public void Second_coordinate_description_does_not_disturb()
    {
        var spectrum = _bench.One(static writer => writer.WriteImage("FLUX", LoadBench.Flux(), [N],
            [Card.Of("CRPIX3", 1L), Card.Of("CRVAL3", 9944.7), Card.Of("CDELT3", 9.6), .. Axis])).Spectra[0];
        Assert.Equal(5000, spectrum.Wavelength[0]);
    }

    [Fact]
    public void Zeros_at_the_ends_of_a_spectrum_without_errors_are_no_data()
    {
        double[] flux = [0, 0, 0, .. LoadBench.Flux(), 0, 0];
        var spectrum = _bench.One(writer => writer.WriteImage("", flux, [flux.Length], Axis)).Spectra[0];
        Assert.False(spectrum.HasErrors);
        Assert.Equal([0, 0, 0, 1], spectrum.InverseVariance[..4]);
        Assert.Equal([1, 0, 0], spectrum.InverseVariance[^3..]);
    }

    [Fact]
    public void Scaled_integers_are_unpacked()
    {
        var values = Enumerable.Range(0, 200_000).Select(static i => (short)(i % 9000)).ToArray();
        var spectrum = _bench.One(writer => writer.WriteImage("", values, [values.Length],
            [Card.Of("BSCALE", 1e-4), Card.Of("BZERO", 0.0), Card.Of("CTYPE1", "LAMBDA"), Card.Of("CRVAL1", 8.0e-7), Card.Of("CDELT1", 1e-12), Card.Of("CRPIX1", 1L), Card.Of("VACUUM", true)])).Spectra[0];
        Assert.Equal(8000, spectrum.Wavelength[0], 1e-6);
        Assert.Equal(0.8999, spectrum.Flux[8999], 1e-9);
    }

    private static double[] Matrix(double sigma)
    {
        var matrix = new double[11 * N];
        for (var diagonal = 0; diagonal < 11; diagonal++)
            for (var pixel = 0; pixel < N; pixel++)
                matrix[diagonal * N + pixel] = OverPixel(diagonal - 5, sigma);
        return matrix;
    }

    private static double OverPixel(double offset, double sigma)
    {
        var sum = 0.0;
        for (var i = 0; i < 100; i++)
        {
            var x = (offset - 0.5 + (i + 0.5) / 100) / sigma;
            sum += Math.Exp(-x * x / 2) / 100;
        }
        return sum;
    }
}
