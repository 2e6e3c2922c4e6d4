using Redshift.Physics.Stars;
using Xunit;

namespace Redshift.Physics.Tests.Stars;

public sealed class SpectralTypesTests
{
    [Theory]
    [InlineData("O9V", 9.0)]
    [InlineData("B0III", 10.0)]
    [InlineData("G2V", 42.0)]
    [InlineData("M4Ve", 64.0)]
    [InlineData("DA2.5", 2.5)]
    [InlineData("DB3", 3.0)]
    [InlineData("C-N", null)]
    [InlineData("DA", null)]
    [InlineData("G", null)]
    [InlineData("", null)]
    public void Subclasses_count_along_the_sequence(string type, double? subclass) => Assert.Equal(subclass, SpectralTypes.Subclass(type));

    [Fact]
    public void Cooler_stars_of_the_grid_come_later_and_every_sort_but_carbon_stars_has_a_place()
    {
        foreach (var sort in StellarModel.StandardGrid.Where(p => p.Variant != StellarVariant.Carbon).GroupBy(p => (p.Variant, p.LogGravity, p.Metallicity)))
        {
            var places = sort.OrderByDescending(p => p.TemperatureK).Select(p => SpectralTypes.Subclass(SpectralTypes.Name(p))!.Value).ToArray();
            Assert.Equal(places.Order(), places);
        }
    }
}
