using Redshift.Physics.Extinction;
using Xunit;

namespace Redshift.Physics.Tests.Extinction;

public sealed class ExtinctionCurvesTests
{
    // The published formulas evaluated in an independent program, R(V) = 3.1.
    [Theory]
    [InlineData(1216.00, 3.504015, 3.504015, 11.975826)]
    [InlineData(1549.00, 2.605810, 2.605810, 10.148008)]
    [InlineData(2175.00, 3.185101, 3.185101, 8.478642)]
    [InlineData(2800.00, 1.947527, 1.947527, 7.264382)]
    [InlineData(3727.00, 1.539170, 1.507126, 5.857799)]
    [InlineData(4102.89, 1.430999, 1.400169, 5.392661)]
    [InlineData(4341.68, 1.345950, 1.338352, 5.123257)]
    [InlineData(4862.68, 1.163738, 1.181128, 4.596509)]
    [InlineData(5008.24, 1.119867, 1.135628, 4.462690)]
    [InlineData(5494.50, 1.000001, 1.000001, 4.052235)]
    [InlineData(6300.00, 0.858536, 0.849207, 3.501697)]
    [InlineData(6564.61, 0.817498, 0.812214, 3.324764)]
    [InlineData(6725.00, 0.792758, 0.790686, 3.224296)]
    [InlineData(7500.00, 0.672451, 0.683063, 2.799384)]
    [InlineData(9071.00, 0.472892, 0.472843, 2.160809)]
    [InlineData(10000.00, 0.404000, 0.404000, 1.877597)]
    [InlineData(12821.60, 0.270766, 0.270766, 1.269035)]
    [InlineData(18756.10, 0.146765, 0.146765, 0.586616)]
    [InlineData(21661.00, 0.116396, 0.116396, 0.388891)]
    public void Curves_are_as_tabulated(double angstrom, double cardelli, double oDonnell, double calzetti)
    {
        Assert.Equal(cardelli, ExtinctionCurves.Cardelli(angstrom), 6e-7);
        Assert.Equal(oDonnell, ExtinctionCurves.ODonnell(angstrom), 6e-7);
        Assert.Equal(calzetti, ExtinctionCurves.Calzetti(angstrom), 6e-7);
    }

    // Cardelli, Clayton and Mathis 1989, table 3, R(V) = 3.1.
    [Theory]
    [InlineData(2.78, 1.569)]
    [InlineData(2.27, 1.322)]
    [InlineData(1.82, 1.000)]
    [InlineData(1.43, 0.751)]
    [InlineData(1.11, 0.479)]
    [InlineData(0.80, 0.282)]
    [InlineData(0.63, 0.190)]
    [InlineData(0.46, 0.114)]
    public void Cardelli_gives_the_published_filter_values(double inverseMicron, double relative)
        => Assert.Equal(relative, ExtinctionCurves.Cardelli(1e4 / inverseMicron), 0.01);

    [Theory]
    [InlineData(1e4 / 1.1, 0.006)]
    [InlineData(1e4 / 3.3, 0.004)]
    [InlineData(1e4 / 5.9, 1e-6)]
    [InlineData(1e4 / 8, 0.01)]
    public void Pieces_of_the_galactic_curve_meet(double joint, double step)
        => Assert.Equal(ExtinctionCurves.Cardelli(joint - 1e-6), ExtinctionCurves.Cardelli(joint + 1e-6), step);

    // Where the medium has larger grains the ultraviolet is dimmed less.
    [Fact]
    public void Ultraviolet_extinction_falls_with_the_ratio()
        => Assert.True(ExtinctionCurves.Cardelli(1549, 5.5) < ExtinctionCurves.Cardelli(1549, 3.1));

    [Theory]
    [InlineData(999)]
    [InlineData(33334)]
    [InlineData(double.NaN)]
    public void Cardelli_outside_its_range_is_refused(double angstrom)
        => Assert.Throws<ArgumentOutOfRangeException>(() => ExtinctionCurves.Cardelli(angstrom));

    [Theory]
    [InlineData(1199)]
    [InlineData(22001)]
    public void Calzetti_outside_its_range_is_refused(double angstrom)
        => Assert.Throws<ArgumentOutOfRangeException>(() => ExtinctionCurves.Calzetti(angstrom));
}
