using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

/// <summary>Load rules that spell out the roles of files whose names and units say nothing.</summary>
public sealed class RuleTests
{
    private const int N = LoadBench.Pixels;

    private static readonly double[] Wavelengths = LoadBench.Linear(5000, 10);

    [Fact]
    public void Every_role_of_a_table_of_meaningless_names_can_be_spelled_out()
    {
        var good = Enumerable.Repeat((short)1, N).ToArray();
        good[3] = 0;
        var observation = Read("""
            wavelength = "column A"
            wavelength_unit = "nm"
            flux = "column B"
            flux_unit = "mJy"
            variance = "column C"
            good = "column D"
            fwhm = "column E"
            width_unit = "nm"
            medium = "vacuum"
            frame = "barycentric"
            target = "card WHO"
            ra = "card WHERE1"
            dec = "card WHERE2"
            angle_unit = "hour"
            """, writer => writer.WriteTable("", N,
            [
                ColumnDefinition.Doubles("A", LoadBench.Linear(500, 1)), ColumnDefinition.Doubles("B", LoadBench.Flux()),
                ColumnDefinition.Doubles("C", LoadBench.Constant(0.25)), ColumnDefinition.Int16s("D", good), ColumnDefinition.Doubles("E", LoadBench.Constant(2.5)),
            ], [Card.Of("WHO", "Somebody"), Card.Of("WHERE1", 12.5), Card.Of("WHERE2", -5.25)]));
        var spectrum = Assert.Single(observation.Spectra);
        Assert.Equal(5000, spectrum.Wavelength[0]);
        Assert.Equal("erg/s/cm2/Angstrom", spectrum.FluxUnit);
        // 10 mJy at 5000 A with a variance of a quarter.
        Assert.Equal(1.199169832e-14, spectrum.Flux[0], 1e-22);
        Assert.Equal(20, spectrum.Flux[0] * Math.Sqrt(spectrum.InverseVariance[0]), 1e-8);
        Assert.Equal(0, spectrum.InverseVariance[3]);
        Assert.Equal(25 / 5000.0 * Velocity.SpeedOfLightKmS, spectrum.FwhmKmS![0], 1e-3);
        Assert.Equal(("Somebody", 187.5, -5.25), (observation.Target, observation.RaDeg, observation.DecDeg));
        Assert.Equal((WavelengthMedium.Vacuum, false, VelocityFrame.Barycentric), (observation.Medium, observation.MediumAssumed, observation.Frame));
        Assert.Empty(observation.Cautions);
    }

    [Theory]
    [InlineData("resolution = \"HDU 1 column E\"", 900, 299792.458 / 900)]
    [InlineData("sigma = \"HDU 1 column E\"\nwidth_unit = \"pixel\"", 1.5, 2.354820045 * 1.5 * 10 / 5000 * 299792.458)]
    [InlineData("fwhm = \"HDU 1 column E\"\nwidth_unit = \"km/s\"", 800, 800)]
    [InlineData("resolution = 1500", 7, 299792.458 / 1500)]
    [InlineData("fwhm_a = 2.5", 7, 2.5 / 5000 * 299792.458)]
    public void Width_can_be_stated_in_every_form(string rule, double value, double expected)
    {
        var spectrum = Read(rule, writer => writer.WriteTable("", N,
            [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("FLUX", LoadBench.Flux()), ColumnDefinition.Doubles("E", LoadBench.Constant(value))])).Spectra[0];
        Assert.Equal(expected, spectrum.FwhmKmS![0], 1e-3);
    }

    [Fact]
    public void Arms_of_odd_names_become_spectra_of_one_observation()
    {
        var observation = Read("""
            [[load.arm]]
            name = "left"
            wavelength = "HDU 1"
            flux = "HDU 2"
            error = "HDU 3"
            resolution = 2000
            [[load.arm]]
            name = "right"
            wavelength = "HDU 4"
            flux = "HDU 5"
            fwhm_a = 3
            """, static writer =>
        {
            writer.WriteHeader("");
            writer.WriteImage("P", Wavelengths, [N]);
            writer.WriteImage("Q", LoadBench.Flux(), [N]);
            writer.WriteImage("S", LoadBench.Constant(0.5), [N]);
            writer.WriteImage("T", LoadBench.Linear(6000, 10), [N]);
            writer.WriteImage("U", LoadBench.Flux(level: 20), [N]);
        });
        Assert.Equal(["left", "right"], observation.Spectra.Select(static spectrum => spectrum.Label));
        Assert.Equal(LoadBench.Flux(level: 20), observation.Spectra[1].Flux);
        Assert.Equal((true, false), (observation.Spectra[0].HasErrors, observation.Spectra[1].HasErrors));
        Assert.Equal(299792.458 / 2000, observation.Spectra[0].FwhmKmS![0], 1e-3);
        Assert.Equal(3 / observation.Spectra[1].Wavelength[0] * 299792.458, observation.Spectra[1].FwhmKmS![0], 1e-3);
    }

    [Fact]
    public void Arm_can_state_its_resolution_alone()
    {
        var observation = Read("[[load.arm]]\nname = \"R\"\nresolution = 3000", static writer =>
        {
            foreach (var (arm, first) in new[] { ("B", 3600.0), ("R", 5760) })
            {
                writer.WriteImage($"{arm}_WAVELENGTH", LoadBench.Linear(first, 10), [N]);
                writer.WriteImage($"{arm}_FLUX", LoadBench.Flux(), [N]);
            }
        });
        Assert.Null(observation.Spectra[0].FwhmKmS);
        Assert.Equal(299792.458 / 3000, observation.Spectra[1].FwhmKmS![0], 1e-3);
    }

    [Fact]
    public void Rows_can_be_orders_of_one_object_numbered_from_one()
    {
        var observation = Read("flux = \"HDU 0\"\nwavelength = \"HDU 1\"\norder = \"row\"", static writer =>
        {
            writer.WriteImage("", [.. Enumerable.Range(1, 12).SelectMany(static row => LoadBench.Flux(level: row))], [N, 12]);
            writer.WriteImage("L", [.. Enumerable.Range(1, 12).SelectMany(static row => LoadBench.Linear(4000 + 100 * row, 1))], [N, 12]);
        });
        Assert.Equal(12, observation.Spectra.Count);
        Assert.Equal(("order 12", 5200), (observation.Spectra[11].Label, Math.Round(observation.Spectra[11].Wavelength[0])));
    }

    [Fact]
    public void Columns_of_one_name_can_be_told_by_their_numbers()
    {
        var spectrum = Read("flux = \"HDU 1 column 3\"\nwavelength = \"HDU 1 column 1\"", static writer => writer.WriteTable("", N,
            [ColumnDefinition.Doubles("X", Wavelengths), ColumnDefinition.Doubles("Y", LoadBench.Constant(1)), ColumnDefinition.Doubles("Y", LoadBench.Flux())])).Spectra[0];
        Assert.Equal(LoadBench.Flux(), spectrum.Flux);
    }

    [Fact]
    public void Column_of_positions_in_hours_and_of_fibres_can_be_named()
    {
        using var bench = Bench("fibre = \"HDU 1 column WHAT\"\ntarget = \"HDU 1 column WHO\"\nra = \"HDU 1 column X\"\ndec = \"HDU 1 column Y\"\nangle_unit = \"hour\"");
        var outcomes = bench.Fits(static writer =>
        {
            writer.WriteImage("", [.. LoadBench.Flux(), .. LoadBench.Flux()], [N, 2], LoadBench.Axis(5000, 1));
            writer.WriteTable("PLATE", 2,
            [
                ColumnDefinition.Int64s("ID", [1, 2]), ColumnDefinition.Strings("WHO", ["a", "b"]), ColumnDefinition.Strings("WHAT", ["object", "blank sky"]),
                ColumnDefinition.Doubles("X", [12.5, 12.6]), ColumnDefinition.Doubles("Y", [-5.25, -5.3]),
            ]);
        });
        Assert.Equal(("a", 187.5, -5.25), (outcomes[0].Observation!.Target, outcomes[0].Observation!.RaDeg, outcomes[0].Observation!.DecDeg));
        Assert.Contains("sky-fibre", outcomes[1].Observation!.Cautions);
    }

    [Theory]
    [InlineData("flux = \"HDU 1 column NONE\"", "HDU 1 column NONE")]
    [InlineData("flux = \"HDU 7\"", "HDU 7")]
    [InlineData("hdu = \"ELSEWHERE\"\nflux = \"FLUX\"", "HDU ELSEWHERE")]
    [InlineData("order = \"HDU 1 column NONE\"\nflux = \"FLUX\"\nwavelength = \"WAVE\"", "HDU 1 column NONE")]
    [InlineData("mask = \"HDU 0 row 3\"", "HDU 0 row 3")]
    [InlineData("[[load.arm]]\nname = \"a\"\nflux = \"HDU 1 column FLUX\"\nwavelength = \"HDU 1 column WAVE\"\n[[load.arm]]\nname = \"b\"", "no flux of arm b")]
    public void Rule_that_names_what_is_not_there_is_refused(string rule, string missing)
    {
        using var bench = Bench(rule);
        var reject = LoadBench.Refused(bench.Fits(static writer => writer.WriteTable("", N,
            [ColumnDefinition.Doubles("WAVE", Wavelengths), ColumnDefinition.Doubles("FLUX", LoadBench.Flux())])));
        Assert.Equal(("pipeline file, [[load]]", $"{missing}, which the file does not have"), (reject.Place, reject.Found));
    }

    private static Observation Read(string rule, Action<FitsWriter> write)
    {
        using var bench = Bench(rule);
        return bench.One(write);
    }

    private static LoadBench Bench(string rule) => new() { Settings = PipelineFile.Parse("[[load]]\n" + rule, "odd.toml").Load };
}
