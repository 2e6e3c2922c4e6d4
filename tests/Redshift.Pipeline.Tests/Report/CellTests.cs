using CsCheck;
using Redshift.Pipeline.Report;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class CellTests
{
    [Theory]
    [InlineData(0.12345678, 7, "0.1234568")]
    [InlineData(-0.00000001, 7, "0.0000000")]
    [InlineData(-0.0, 3, "0.000")]
    [InlineData(-12.5, 3, "-12.500")]
    [InlineData(1e20, 3, "100000000000000000000.000")]
    [InlineData(double.NaN, 3, "")]
    [InlineData(double.PositiveInfinity, 3, "")]
    public void Fixed_has_exactly_the_decimals(double value, int decimals, string expected) =>
        Assert.Equal(expected, Cell.Fixed(value, decimals).Text);

    [Fact]
    public void Unknown_numbers_are_empty() => Assert.Equal(Cell.Empty, Cell.Fixed(null, 3));

    [Theory]
    [InlineData(1.23456789e-17, "1.23457E-17")]
    [InlineData(-1.23456789e5, "-1.23457E+05")]
    [InlineData(0.0, "0.00000E+00")]
    public void Significant_keeps_six_digits(double value, string expected) =>
        Assert.Equal(expected, Cell.Significant(value).Text);

    [Fact]
    public void Fixed_reads_back_within_half_a_unit_of_the_last_decimal() =>
        Gen.Double[-1e6, 1e6].Sample(value =>
        {
            var back = double.Parse(Cell.Fixed(value, 7).Text, System.Globalization.CultureInfo.InvariantCulture);
            return Math.Abs(back - value) <= 0.5e-7 + Math.Abs(value) * 1e-15;
        });

    [Fact]
    public void Time_is_iso_8601_to_the_millisecond() =>
        Assert.Equal("2026-02-03T04:05:06.789", Cell.Of(new DateTime(2026, 2, 3, 4, 5, 6, 789, DateTimeKind.Utc)).Text);
}
