using Redshift.Physics.Lines;
using Xunit;

namespace Redshift.Physics.Tests.Lines;

public sealed class SkyTests
{
    // Sansonetti, Salit and Reader 1996, Appl. Opt. 35, 74 (mercury); NIST Atomic Spectra Database (oxygen, sodium).
    [Theory]
    [InlineData("Hg I 4358", 4358.335)]
    [InlineData("Hg I 5461", 5460.750)]
    [InlineData("[O I] 5577", 5577.338)]
    [InlineData("Na I D2", 5889.951)]
    [InlineData("[O I] 6300", 6300.304)]
    public void Sky_lines_are_at_their_laboratory_wavelength(string name, double air)
        => Assert.Equal(air, Assert.Single(SkyLines.All, line => line.Name == name).AirAngstrom, 1e-6);

    [Fact]
    public void Sky_lines_ascend_and_have_one_name_each()
    {
        Assert.Equal(SkyLines.All.OrderBy(line => line.VacuumAngstrom), SkyLines.All);
        Assert.Equal(SkyLines.All.Count, SkyLines.All.Select(line => line.Name).Distinct().Count());
        Assert.All(SkyLines.All, line => Assert.Equal((LineFamily.Sky, LineKind.Emission), (line.Family, line.Kind)));
    }

    // The line of the sky and that of a nebula at rest are the same transition.
    [Theory]
    [InlineData("[O I] 6300")]
    [InlineData("[O I] 6364")]
    [InlineData("Na I D1")]
    [InlineData("K I 7699")]
    [InlineData("O I 7774")]
    public void Transitions_of_both_lists_agree(string name)
        => Assert.Equal(LineList.Find(name).VacuumAngstrom, SkyLines.All.Single(line => line.Name == name).VacuumAngstrom, 1e-9);

    // Heads of the oxygen bands in air: A 7593.7, B 6867.2 (Wallace et al. 2011, ApJS 195, 6); 2.09 and 1.89 A more
    // in vacuum.
    [Theory]
    [InlineData("O2 A", 7595.79)]
    [InlineData("O2 B", 6869.10)]
    public void Oxygen_bands_start_at_their_heads(string name, double vacuum)
    {
        TelluricBand band = Assert.Single(TelluricBands.All, b => b.Name == name);
        Assert.Equal(vacuum, band.StartVacuumAngstrom, 0.01);
        Assert.True(band.Contains(vacuum + 10));
        Assert.False(band.Contains(vacuum - 1));
        Assert.False(band.Contains(vacuum + 150));
    }

    [Fact]
    public void Bands_ascend_without_overlap()
    {
        for (int i = 1; i < TelluricBands.All.Count; i++)
            Assert.True(TelluricBands.All[i].StartVacuumAngstrom > TelluricBands.All[i - 1].EndVacuumAngstrom);
    }
}
