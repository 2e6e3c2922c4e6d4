using Redshift.Fits;
using Redshift.Physics.Air;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

/// <summary>Axes of the FITS Standard 4.0, section 8.4, and the legacy ones.</summary>
public sealed class SpectralAxisTests : IDisposable
{
    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    // The example of Greisen et al. 2006, section 10.1: one axis of a radio spectrum stated in every variable. WCSLIB gives for the
    // pixels 30 to 34 these vacuum wavelengths in metres, with twelve digits.
    private static readonly double[] RadioWavelengths = [0.21751265726, 0.217497248069, 0.217481841062, 0.217466436237, 0.217451033595];

    [Theory]
    [InlineData("FREQ", "Hz", 1378471216.4292786, 97647.745732)]
    [InlineData("VOPT-F2W", "m/s", 9120000, -21882.6514422)]
    [InlineData("VOPT-F2W", "km/s", 9120, -21.8826514422)]
    [InlineData("ZOPT-F2W", "", 0.0304210454820715, -7.29926682885e-05)]
    [InlineData("VRAD", "m/s", 8850750.90419305, -20609.6445821)]
    [InlineData("VELO-F2V", "m/s", 8981342.29811221, -21217.5513674)]
    [InlineData("BETA-F2V", "", 0.0299585331733, -7.077413324187e-05)]
    [InlineData("WAVE-F2W", "m", 0.217481841062, -1.540591581764e-05)]
    [InlineData("ENER", "J", 9.133846979816231e-25, 6.47020813209595e-29)] // hν with the exact h of the SI of 2019; WCSLIB has an older one
    [InlineData("WAVN", "m-1", 4.598085040649283, 3.2571781953233793e-4)] // ν/c
    public void Axis_in_any_variable_gives_the_wavelengths_of_the_published_example(string type, string unit, double crval, double cdelt)
    {
        var cards = new List<Card>
        {
            Card.Of("CTYPE1", type), Card.Of("CRVAL1", crval), Card.Of("CDELT1", cdelt), Card.Of("CRPIX1", 32L),
            Card.Of("RESTFRQ", 1.420405752e9), Card.Of("SPECSYS", "BARYCENT"),
        };
        if (unit.Length > 0) cards.Add(Card.Of("CUNIT1", unit));
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], cards));

        Assert.Equal(WavelengthMedium.Vacuum, observation.Medium);
        Assert.Equal(VelocityFrame.Barycentric, observation.Frame);
        var wavelengths = Sorted(observation);
        for (var i = 0; i < RadioWavelengths.Length; i++)
        {
            // The frequency rises with the pixel, so the pixels come out in reverse; the table has twelve digits.
            var found = wavelengths[LoadBench.Pixels - (30 + i)];
            Assert.Equal(1, found / (RadioWavelengths[i] * 1e10), 1e-9);
        }
    }

    // S = S_r exp(w/S_r) with 5000 Å and 1 Å a pixel, evaluated with WCSLIB 7.12.
    [Theory]
    [InlineData(1, 5000)]
    [InlineData(2, 5001.00010001)]
    [InlineData(101, 5101.00670013)]
    [InlineData(1001, 6107.0137908)]
    [InlineData(4001, 11127.7046425)]
    public void Logarithmic_code_follows_the_exponential(int pixel, double expected)
    {
        const int Count = 4001;
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(Count), [Count],
            LoadBench.Axis(5000, 1, Card.Of("CTYPE1", "WAVE-LOG"), Card.Of("CUNIT1", "Angstrom"))));
        Assert.Equal(expected, Sorted(observation)[pixel - 1], 1e-6);
    }

    // The grism of Greisen et al. 2006, section 5 (G = 450/mm, first order, α = 27°, n = 1.765, n' = -1.077e6/m), by WCSLIB 7.12,
    // whose formula for air (Edlén 1953) differs by some 1e-4 Å: most of it cancels on the way to vacuum and back.
    [Theory]
    [InlineData(1, 5298.354966610)]
    [InlineData(500, 6609.151085554)]
    [InlineData(1000, 8089.910076385)]
    [InlineData(1440, 9446.959857841)]
    public void Grism_follows_the_published_example(int pixel, double expectedAir)
    {
        const int Count = 1440;
        double[] parameters = [4.5e5, 1, 27, 1.765, -1.077e6];
        List<Card> cards =
        [
            Card.Of("CTYPE1", "AWAV-GRI"), Card.Of("CUNIT1", "Angstrom"), Card.Of("CRPIX1", 719.8), Card.Of("CRVAL1", 7245.2), Card.Of("CDELT1", 2.956),
            .. parameters.Select((value, i) => Card.Of($"PV1_{i}", value)),
        ];
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(Count), [Count], cards));
        Assert.Equal(WavelengthMedium.Air, observation.Medium);
        Assert.False(observation.MediumAssumed);
        Assert.Equal(AirRefraction.ToVacuum(expectedAir), Sorted(observation)[pixel - 1], 2e-5);
    }

    [Fact]
    public void Tabulated_axis_is_interpolated_in_its_coordinate_array()
    {
        var observation = _bench.One(writer =>
        {
            writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            [
                Card.Of("CTYPE1", "WAVE-TAB"), Card.Of("CRVAL1", 1L), Card.Of("CRPIX1", 1L), Card.Of("CDELT1", 0.5), Card.Of("CUNIT1", "nm"),
                Card.Of("PS1_0", "COORDS"), Card.Of("PS1_1", "WAVELENGTHS"),
            ]);
            var coordinates = Enumerable.Range(0, 40).Select(i => 400 + i * i * 0.5).ToArray();
            writer.WriteTable("COORDS", 1, [ColumnDefinition.Doubles("WAVELENGTHS", coordinates, coordinates.Length) with { Unit = "nm" }]);
        });
        // Pixel 2 lies half way between the first two coordinates, pixel 3 on the second.
        Assert.Equal(4002.5, Sorted(observation)[1], 1e-9);
        Assert.Equal(4005, Sorted(observation)[2], 1e-9);
    }

    [Fact]
    public void Velocities_without_a_rest_wavelength_are_refused()
    {
        var reject = LoadBench.Refused(_bench.Fits(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(1e6, 100, Card.Of("CTYPE1", "VOPT")))));
        Assert.Equal("keyword CTYPE1", reject.Place);
        Assert.Equal("RESTWAV or RESTFRQ", reject.Expected);
    }

    [Fact]
    public void Table_of_coordinates_is_read_through_its_axis_and_not_beside_it()
    {
        const int N = LoadBench.Pixels;
        var observation = _bench.One(static writer =>
        {
            writer.WriteImage("", LoadBench.Flux(), [N],
            [
                Card.Of("CTYPE1", "AWAV-TAB"), Card.Of("CRVAL1", 1L), Card.Of("CRPIX1", 1L), Card.Of("CDELT1", 1.0), Card.Of("CUNIT1", "nm"),
                Card.Of("PS1_0", "COORDS"), Card.Of("PS1_1", "WAVE"),
            ]);
            writer.WriteTable("COORDS", 1, [ColumnDefinition.Doubles("WAVE", LoadBench.Linear(500, 0.1), N) with { Unit = "nm" }]);
        });
        Assert.Equal((WavelengthMedium.Air, false), (observation.Medium, observation.MediumAssumed));
        Assert.Equal(5001.394851, Sorted(observation)[0], 1e-6);
    }

    [Fact]
    public void Air_axis_of_the_standard_comes_out_in_vacuum()
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(500, 0.1, Card.Of("CTYPE1", "AWAV"), Card.Of("CUNIT1", "nm"))));
        // Ciddor 1996: air 5000 Å is vacuum 5001.394851 Å.
        Assert.Equal(5001.394851, Sorted(observation)[0], 1e-6);
    }

    [Fact]
    public void Reference_pixel_that_is_missing_is_the_first()
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            [Card.Of("CRVAL1", 5000.0), Card.Of("CDELT1", 1.0), Card.Of("CUNIT1", "Angstrom"), Card.Of("VACUUM", true)]));
        Assert.Equal(5000, Sorted(observation)[0], 1e-9);
    }

    [Theory]
    [InlineData(2.0, 1.0)] // a leftover CDELT of 1 beside the matrix
    [InlineData(2.0, 5.0)] // the matrix overrides CDELT (FITS Standard 4.0, section 8.2.1)
    public void Matrix_overrides_the_increment(double matrix, double cdelt)
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            LoadBench.Axis(5000, cdelt, Card.Of("CD1_1", matrix), Card.Of("VACUUM", true))));
        Assert.Equal(5000 + 2 * 63, Sorted(observation)[^1], 1e-9);
    }

    [Fact]
    public void Matrix_of_one_beside_an_increment_is_a_leftover()
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            LoadBench.Axis(5000, 2, Card.Of("CD1_1", 1.0), Card.Of("VACUUM", true))));
        Assert.Equal(5000 + 2 * 63, Sorted(observation)[^1], 1e-9);
    }

    [Fact]
    public void Descending_axis_is_turned_round_with_its_flux()
    {
        var flux = LoadBench.Flux();
        var spectrum = _bench.One(writer => writer.WriteImage("", flux, [LoadBench.Pixels],
            [Card.Of("CRVAL1", 7000.0), Card.Of("CD1_1", -2.0), Card.Of("CDELT1", 1.0), Card.Of("CRPIX1", 1L), Card.Of("CUNIT1", "pixel"), Card.Of("VACUUM", true)])).Spectra[0];
        Assert.Equal(7000, spectrum.Wavelength[^1], 1e-9);
        Assert.Equal(6998, spectrum.Wavelength[^2], 1e-9);
        Assert.Equal(flux.Reverse(), spectrum.Flux);
    }

    [Theory]
    [InlineData("LINEAR", 1)]
    [InlineData("", 1)]
    [InlineData("LINEAR", 0)]
    public void Logarithm_is_told_by_its_flag_or_by_its_size_whatever_the_name_says(string type, long flag)
    {
        var spectrum = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(3.5682, 1e-4,
            Card.Of("CTYPE1", type), Card.Of("DC-FLAG", flag), Card.Of("WAT1_001", "wtype=linear label=Wavelength units=Angstroms"), Card.Of("VACUUM", true)))).Spectra[0];
        Assert.Equal(Math.Pow(10, 3.5682), spectrum.Wavelength[0], 1e-8);
        Assert.Equal(Math.Pow(10, 3.5682 + 63e-4), spectrum.Wavelength[^1], 1e-8);
    }

    [Fact]
    public void Coefficient_cards_alone_are_an_axis()
    {
        var spectrum = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], [Card.Of("COEFF0", 3.58), Card.Of("COEFF1", 1e-4)])).Spectra[0];
        Assert.Equal(Math.Pow(10, 3.58), spectrum.Wavelength[0], 1e-8);
    }

    [Theory]
    [InlineData("WAVELENGTH [Ang]", "", "", 5000, 5000)]
    [InlineData("LAMBDA", "", "", 5e-7, 5000)]
    [InlineData("", "", "AA", 5000, 5000)]
    [InlineData("", "", "wavelength of the first pixel in nm", 500, 5000)]
    [InlineData("Wavelength", "", "", 0.55, 5500)]
    [InlineData("Wavelength", "", "", 550, 5500)]
    [InlineData("Wavelength", "pixel", "", 5500, 5500)]
    public void Unit_is_found_where_writers_leave_it(string type, string unit, string comment, double crval, double expected)
    {
        var spectrum = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            [Card.Of("CRVAL1", crval, comment), Card.Of("CDELT1", crval * 1e-4), Card.Of("CRPIX1", 1L), Card.Of("CTYPE1", type), Card.Of("CUNIT1", unit), Card.Of("VACUUM", true)])).Spectra[0];
        Assert.Equal(expected, spectrum.Wavelength[0], 1e-6);
    }

    [Fact]
    public void Apertures_with_dispersion_functions_are_orders_of_one_object()
    {
        // Order 31 linear; order 30 a Chebyshev series 6150 + 150 x, with x from -1 to 1 over the pixels 1 to 64.
        const string Attributes = "wtype=multispec spec1 = \"1 31 0 5800. 3. 64 0. 1. 8.\" spec2 = \"2 30 2 6000. 4.7 64 0. 1. 8. 1. 0. 1 2 1. 64. 6150. 150.\"";
        var cards = Enumerable.Range(0, (Attributes.Length + 67) / 68)
            .Select(i => Card.Of($"WAT2_{i + 1:000}", Attributes.Substring(68 * i, Math.Min(68, Attributes.Length - 68 * i))))
            .Append(Card.Of("VACUUM", true)).ToList();
        var observation = _bench.One(writer => writer.WriteImage("", [.. LoadBench.Flux(), .. LoadBench.Flux()], [LoadBench.Pixels, 2], cards));
        Assert.Equal(["order 31", "order 30"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(5800 + 3 * 63, observation.Spectra[0].Wavelength[^1], 1e-9);
        Assert.Equal(6000, observation.Spectra[1].Wavelength[0], 1e-9);
        Assert.Equal(6300, observation.Spectra[1].Wavelength[^1], 1e-9);
    }

    // Pixel 64 of the range 1 to 127 is at x = 0, where the second Chebyshev polynomial is -1 and the second Legendre polynomial -1/2.
    [Theory]
    [InlineData("0 5800. 3. 64 0. 1. 8.", 5989)]
    [InlineData("0 5800. 3. 64 0.001 1. 8.", 5989 / 1.001)]
    [InlineData("1 3.7 0.0001 64 0. 1. 8.", 5085.105879)]
    [InlineData("2 0. 0. 64 0. 1. 8. 1. 0. 1 3 1. 127. 6000. 100. 10.", 5990)]
    [InlineData("2 0. 0. 64 0. 1. 8. 1. 0. 2 3 1. 127. 6000. 100. 10.", 5995)]
    [InlineData("2 0. 0. 64 0. 1. 8. 1. 0. 3 1 1. 127. 950. 1000. 1050. 1100.", 6150)]
    [InlineData("2 0. 0. 64 0. 1. 8. 1. 0. 4 2 1. 127. 5900. 6010. 6100.", 6010)]
    [InlineData("2 0. 0. 64 0. 1. 8. 0.5 0. 1 2 1. 127. 6000. 100. 0.5 2. 1 2 1. 127. 6000. 100.", 6001)]
    public void Single_aperture_is_evaluated_by_its_own_dispersion(string dispersion, double expected)
    {
        var text = $"wtype=multispec spec1 = \"1 1 {dispersion}\"";
        List<Card> cards = [Card.Of("CTYPE1", "MULTISPE"), Card.Of("CRVAL1", 1.0), Card.Of("CD1_1", 1.0), Card.Of("VACUUM", true)];
        for (var i = 0; 68 * i < text.Length; i++) cards.Add(Card.Of($"WAT2_{i + 1:000}", text[(68 * i)..Math.Min(text.Length, 68 * (i + 1))]));
        var spectrum = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], cards)).Spectra[0];
        Assert.Equal(expected, spectrum.Wavelength[63], 1e-3);
    }

    private static double[] Sorted(Observation observation) => Assert.Single(observation.Spectra).Wavelength;
}
