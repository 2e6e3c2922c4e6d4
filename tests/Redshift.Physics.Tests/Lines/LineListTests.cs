using Redshift.Physics.Hydrogen;
using Redshift.Physics.Lines;
using Xunit;

namespace Redshift.Physics.Tests.Lines;

public sealed class LineListTests
{
    // Published in the other medium than the one the list holds: NIST Atomic Spectra Database for the optical,
    // Morton 2003, ApJS 149, 205 for Ca II and the ultraviolet. The two should be one line within the digits printed.
    [Theory]
    [InlineData("[O II] 3726", 3727.092, 3726.032)]
    [InlineData("[O II] 3729", 3729.875, 3728.815)]
    [InlineData("[Ne III] 3869", 3869.86, 3868.76)]
    [InlineData("[O III] 4363", 4364.436, 4363.210)]
    [InlineData("[O III] 4959", 4960.295, 4958.911)]
    [InlineData("[O III] 5007", 5008.240, 5006.843)]
    [InlineData("He I 5876", 5877.243, 5875.62)]
    [InlineData("[O I] 6300", 6302.046, 6300.304)]
    [InlineData("[N II] 6548", 6549.86, 6548.05)]
    [InlineData("[N II] 6583", 6585.27, 6583.45)]
    [InlineData("He I 6678", 6679.996, 6678.15)]
    [InlineData("[S II] 6716", 6718.294, 6716.440)]
    [InlineData("[S II] 6731", 6732.674, 6730.816)]
    [InlineData("He I 7065", 7067.125, 7065.19)]
    [InlineData("[Ar III] 7136", 7137.77, 7135.79)]
    [InlineData("[S III] 9069", 9071.1, 9068.6)]
    [InlineData("[S III] 9531", 9533.2, 9530.6)]
    [InlineData("He I 10830", 10833.306, 10830.34)]
    [InlineData("Ca II K", 3934.777, 3933.663)]
    [InlineData("Ca II H", 3969.591, 3968.469)]
    [InlineData("Na I D2", 5891.583, 5889.951)]
    [InlineData("Na I D1", 5897.558, 5895.924)]
    [InlineData("Mg I b1", 5185.048, 5183.604)]
    [InlineData("Ca II 8542", 8544.437, 8542.09)]
    [InlineData("Mg II 2796", 2796.3543, 2795.528)]
    public void Published_pairs_are_one_line(string name, double vacuum, double air)
    {
        SpectralLine line = LineList.Find(name);
        Assert.Equal(vacuum, line.VacuumAngstrom, 0.03);
        Assert.Equal(air, line.AirAngstrom, 0.03);
    }

    // Level differences of the NIST Atomic Spectra Database, cm^-1: Ca II 25414.40 and 25191.51, Na I 16973.36619 and
    // 16956.17025.
    [Theory]
    [InlineData("Ca II K", 25414.40)]
    [InlineData("Ca II H", 25191.51)]
    [InlineData("Na I D2", 16973.36619)]
    [InlineData("Na I D1", 16956.17025)]
    public void Resonance_lines_are_at_their_level_difference(string name, double waveNumber)
        => Assert.Equal(1e8 / waveNumber, LineList.Find(name).VacuumAngstrom, 0.002);

    [Theory]
    [InlineData("H alpha", 6564.608)]
    [InlineData("Ly alpha", 1215.670)]
    [InlineData("Pa beta", 12821.587)]
    [InlineData("Br gamma", 21661.196)]
    [InlineData("He II 4686", 4687.017)]
    [InlineData("He II 1640", 1640.417)]
    public void Lines_of_one_electron_are_computed(string name, double vacuum)
    {
        SpectralLine line = LineList.Find(name);
        Assert.Equal(vacuum, line.VacuumAngstrom, 6e-4);
        Assert.StartsWith("computed", line.Source, StringComparison.Ordinal);
    }

    [Fact]
    public void Hydrogen_is_never_stored()
        => Assert.All(
            LineList.All.Where(line => line.Family == LineFamily.Hydrogen),
            line => Assert.Contains(
                HydrogenSeries.All,
                series => series.Lines(40).Any(computed => computed.Name == line.Name && computed.VacuumAngstrom == line.VacuumAngstrom)));

    [Fact]
    public void Lines_ascend_and_none_is_listed_twice()
    {
        IReadOnlyList<SpectralLine> lines = LineList.All;
        for (int i = 1; i < lines.Count; i++)
            Assert.True(lines[i].VacuumAngstrom - lines[i - 1].VacuumAngstrom > 0.05, $"{lines[i - 1].Name} and {lines[i].Name}");
        Assert.Equal(lines.Count, lines.Select(line => line.Name).Distinct().Count());
    }

    [Fact]
    public void Every_line_is_fully_described()
        => Assert.All(LineList.All.Concat(SkyLines.All), line =>
        {
            Assert.False(string.IsNullOrWhiteSpace(line.Source));
            Assert.True(line.Name.All(char.IsAscii));
            Assert.NotEqual(LineUses.None, line.Uses);
            Assert.InRange(line.VacuumAngstrom, 900, 50000);
            Assert.True(line.OscillatorStrength is null or (> 0 and < 2));
        });

    [Fact]
    public void Forbidden_lines_are_bracketed_and_in_emission()
        => Assert.All(LineList.All.Where(line => line.Family == LineFamily.Forbidden), line =>
        {
            Assert.Contains(']', line.Name);
            Assert.Equal(LineKind.Emission, line.Kind);
        });

    [Fact]
    public void For_gives_the_lines_of_any_of_the_kinds()
    {
        SpectralLine[] lines = [.. LineList.For(LineUses.Star | LineUses.Nebula)];
        Assert.Contains(LineList.Find("Ca II K"), lines);
        Assert.Contains(LineList.Find("[O III] 5007"), lines);
        Assert.DoesNotContain(LineList.Find("Si II 1260"), lines);
    }

    [Fact]
    public void Unknown_name_is_refused()
        => Assert.Throws<KeyNotFoundException>(() => LineList.Find("Nebulium"));
}
