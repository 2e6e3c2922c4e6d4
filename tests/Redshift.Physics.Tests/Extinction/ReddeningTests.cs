using Redshift.Physics.Extinction;
using Xunit;

namespace Redshift.Physics.Tests.Extinction;

public sealed class ReddeningTests
{
    // E(B-V) = 2.3292 log10((H alpha / H beta) / 2.86) for the curve of Cardelli et al. 1989, k from an independent
    // program: 2.534245 and 3.607586.
    [Theory]
    [InlineData(2.86, 0)]
    [InlineData(28.6, 2.3292)]
    public void Decrement_gives_the_colour_excess(double ratio, double excess)
        => Assert.Equal(excess, Reddening.FromBalmerDecrement(ratio), 1e-4);

    [Fact]
    public void Decrement_is_explained_by_the_excess_it_gives()
    {
        double excess = Reddening.FromBalmerDecrement(4.5);
        double alpha = Reddening.Transmission(3.1 * excess * ExtinctionCurves.Cardelli(6564.608));
        double beta = Reddening.Transmission(3.1 * excess * ExtinctionCurves.Cardelli(4862.683));
        Assert.Equal(4.5, 2.86 * alpha / beta, 1e-6);
    }

    // Pogson's scale: five magnitudes are a factor of 100.
    [Fact]
    public void Five_magnitudes_are_a_factor_of_one_hundred()
        => Assert.Equal(0.01, Reddening.Transmission(5), 1e-15);
}
