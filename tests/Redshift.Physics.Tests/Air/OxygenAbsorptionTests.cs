using Redshift.Physics.Air;
using Xunit;

namespace Redshift.Physics.Tests.Air;

public class OxygenAbsorptionTests
{
    /// <summary>Where the bands begin, in air: the limits of Wallace et al. 2011 (ApJS 195, 6), which Fraunhofer's A and B have had since 1814.</summary>
    [Theory]
    [InlineData(7593.7)]
    [InlineData(6867.2)]
    [InlineData(6276.6)]
    public void Bands_begin_at_their_published_heads(double headAir)
    {
        var near = OxygenAbsorption.Lines.Select(l => AirRefraction.ToAir(1e8 / l.Wavenumber)).Where(w => Math.Abs(w - headAir) < 30);
        Assert.Equal(headAir, near.Min(), 1.5);
    }

    /// <summary>Bands end where the atlas lets them end: what is beyond takes less than a per cent.</summary>
    [Theory]
    [InlineData(7593.7, 7703)]
    [InlineData(6867.2, 6944)]
    public void Nearly_all_of_a_band_lies_within_its_published_limits(double from, double to)
    {
        double Absorbed(double low, double high) => Enumerable.Range(0, (int)((high - low) / 0.01))
            .Sum(i => 0.01 * (1 - Math.Exp(-OxygenAbsorption.Depth(1e8 / AirRefraction.ToVacuum(low + 0.01 * i)))));
        var inside = Absorbed(from - 1.5, to);
        Assert.InRange(Absorbed(from - 60, from - 1.5) / inside, 0, 0.01);
        Assert.InRange(Absorbed(to, to + 60) / inside, 0, 0.03);
    }

    /// <summary>Lines of even levels do not exist: two oxygen-16 nuclei have no spin (Herzberg 1950, Spectra of Diatomic Molecules).</summary>
    [Fact]
    public void Pairs_of_lines_in_the_band_A_are_two_levels_apart()
    {
        var down = OxygenAbsorption.Lines.Where(l => l.Wavenumber is > 13020 and < 13100).Select(l => l.Wavenumber).ToList();
        var steps = down.Skip(2).Zip(down, (next, line) => next - line).ToList();
        Assert.NotEmpty(steps);
        // With all levels the steps would be half of 4B to 9B.
        Assert.All(steps, s => Assert.InRange(s, 4 * 1.39, 9 * 1.39));
    }
}
