using CsCheck;
using Redshift.Physics.Air;
using Xunit;

namespace Redshift.Physics.Tests.Air;

public sealed class AirRefractionTests
{
    // Ciddor 1996, Appl. Opt. 35, 1566, equation 1 with the coefficients of its appendix A, evaluated in an
    // independent program.
    [Theory]
    [InlineData(2000, 3.237932857, 1999.35262)]
    [InlineData(2500, 3.014808150, 2499.24653)]
    [InlineData(3000, 2.915686330, 2999.12555)]
    [InlineData(3934.777, 2.831221316, 3933.66329)]
    [InlineData(4862.683, 2.793520370, 4861.32498)]
    [InlineData(5000, 2.789738106, 4998.60552)]
    [InlineData(5891.583, 2.771495509, 5889.95060)]
    [InlineData(6564.61, 2.762499945, 6562.79703)]
    [InlineData(10000, 2.741661312, 9997.25909)]
    [InlineData(16900, 2.731583221, 16895.38489)]
    [InlineData(20000, 2.730040577, 19994.54141)]
    public void ToAir_gives_the_tabulated_values(double vacuum, double refractivity, double air)
    {
        Assert.Equal(refractivity, 1e4 * AirRefraction.Refractivity(vacuum), 6e-10);
        Assert.Equal(air, AirRefraction.ToAir(vacuum), 6e-6);
    }

    // The same formula inverted by iteration in an independent program.
    [Theory]
    [InlineData(3000, 3000.874669)]
    [InlineData(4861.333, 4862.691023)]
    [InlineData(5000, 5001.394851)]
    [InlineData(6562.8, 6564.612973)]
    [InlineData(10000, 10002.741653)]
    [InlineData(20000, 20005.460077)]
    public void ToVacuum_gives_the_tabulated_values(double air, double vacuum)
        => Assert.Equal(vacuum, AirRefraction.ToVacuum(air), 6e-7);

    // Birch and Downs 1994, Metrologia 31, 315: an independent determination for the same air, valid 0.35-0.65 micron.
    [Theory]
    [InlineData(3500)]
    [InlineData(5000)]
    [InlineData(6500)]
    public void Refractivity_agrees_with_another_laboratory_within_two_metres_per_second(double vacuum)
    {
        double square = 1e8 / (vacuum * vacuum);
        double other = 8.34254e-5 + 2.406147e-2 / (130 - square) + 1.5998e-4 / (38.9 - square);
        Assert.Equal(other, AirRefraction.Refractivity(vacuum), 2.0 / 299792458);
    }

    [Fact]
    public void Round_trip_returns_the_vacuum_wavelength()
        => Gen.Double[2000, 60000].Sample(vacuum =>
            Math.Abs(AirRefraction.ToVacuum(AirRefraction.ToAir(vacuum)) - vacuum) <= 1e-12 * vacuum);

    [Fact]
    public void Wavelengths_below_2000_angstrom_are_vacuum_both_ways()
        => Gen.Double[100, 1999.35].Sample(wavelength =>
            AirRefraction.ToAir(wavelength) == wavelength && AirRefraction.ToVacuum(wavelength) == wavelength);

    [Fact]
    public void Spans_are_converted_like_single_values_and_in_place()
    {
        double[] vacuum = [.. Enumerable.Range(0, 83).Select(i => 1500 + 97.3 * i)];
        double[] air = new double[vacuum.Length];
        AirRefraction.ToAir(vacuum, air);
        Assert.Equal(vacuum.Select(AirRefraction.ToAir), air);

        double[] again = [.. air];
        AirRefraction.ToVacuum(again, again);
        Assert.Equal(air.Select(AirRefraction.ToVacuum), again);
    }

    [Fact]
    public void Short_destination_is_refused()
        => Assert.Throws<ArgumentException>(() => AirRefraction.ToAir(new double[3], new double[2]));
}
