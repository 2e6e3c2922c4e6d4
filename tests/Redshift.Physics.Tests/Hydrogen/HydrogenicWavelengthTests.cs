using Redshift.Physics.Constants;
using Redshift.Physics.Hydrogen;
using Xunit;

namespace Redshift.Physics.Tests.Hydrogen;

/// <summary>
/// Wavelengths against an independent computation of the same centroids with the constants of CODATA 2018, whose
/// levels agree with Kramida 2010, At. Data Nucl. Data Tables 96, 586 to 6e-5 cm^-1. All within 0.02 km/s.
/// </summary>
public sealed class HydrogenicWavelengthTests
{
    private const double ToleranceKmS = 0.02;

    [Theory]
    [InlineData(2, 1, 1215.6700, 0)]
    [InlineData(3, 1, 1025.7222, 0)]
    [InlineData(4, 1, 972.5367, 0)]
    [InlineData(5, 1, 949.7430, 0)]
    [InlineData(6, 1, 937.8034, 0)]
    [InlineData(7, 1, 930.7482, 0)]
    [InlineData(8, 1, 926.2256, 0)]
    [InlineData(9, 1, 923.1503, 0)]
    [InlineData(10, 1, 920.9630, 0)]
    [InlineData(3, 2, 6564.6081, 6562.7951)]
    [InlineData(4, 2, 4862.6829, 4861.3249)]
    [InlineData(5, 2, 4341.6837, 4340.4634)]
    [InlineData(6, 2, 4102.8922, 4101.7346)]
    [InlineData(7, 2, 3971.1951, 3970.0719)]
    [InlineData(8, 2, 3890.1507, 3889.0486)]
    [InlineData(9, 2, 3836.4719, 3835.3838)]
    [InlineData(10, 2, 3798.9758, 3797.8974)]
    [InlineData(11, 2, 3771.7012, 3770.6299)]
    [InlineData(12, 2, 3751.2175, 3750.1515)]
    [InlineData(13, 2, 3735.4296, 3734.3677)]
    [InlineData(14, 2, 3722.9967, 3721.9380)]
    [InlineData(15, 2, 3713.0266, 3711.9705)]
    [InlineData(16, 2, 3704.9064, 3703.8524)]
    [InlineData(4, 3, 18756.1332, 18751.0131)]
    [InlineData(5, 3, 12821.5872, 12818.0807)]
    [InlineData(6, 3, 10941.0905, 10938.0944)]
    [InlineData(7, 3, 10052.1281, 10049.3731)]
    [InlineData(8, 3, 9548.5900, 9545.9713)]
    [InlineData(9, 3, 9231.5474, 9229.0147)]
    [InlineData(10, 3, 9017.3849, 9014.9101)]
    [InlineData(11, 3, 8865.2168, 8862.7832)]
    [InlineData(12, 3, 8752.8755, 8750.4722)]
    [InlineData(13, 3, 8667.3984, 8665.0182)]
    [InlineData(14, 3, 8600.7536, 8598.3915)]
    [InlineData(5, 4, 40522.6231, 40511.5750)]
    [InlineData(6, 4, 26258.6717, 26251.5092)]
    [InlineData(7, 4, 21661.1962, 21655.2854)]
    [InlineData(8, 4, 19450.8711, 19445.5619)]
    [InlineData(9, 4, 18179.0840, 18174.1209)]
    [InlineData(10, 4, 17366.8503, 17362.1082)]
    [InlineData(11, 4, 16811.1114, 16806.5205)]
    [InlineData(12, 4, 16411.6742, 16407.1919)]
    [InlineData(13, 4, 16113.7137, 16109.3125)]
    [InlineData(14, 4, 15884.8801, 15880.5411)]
    public void Hydrogen_lines_are_at_the_computed_centroids(int upper, int lower, double vacuum, double air)
        => AssertWavelengths(HydrogenicAtom.Hydrogen.Line(upper, lower), vacuum, air);

    [Theory]
    [InlineData(2, 1, 303.7822, 0)]
    [InlineData(3, 2, 1640.4172, 0)]
    [InlineData(4, 2, 1215.1341, 0)]
    [InlineData(4, 3, 4687.0172, 4685.7057)]
    [InlineData(5, 3, 3204.0274, 3203.1017)]
    [InlineData(6, 3, 2734.1061, 2733.2970)]
    [InlineData(5, 4, 10126.3852, 10123.6100)]
    [InlineData(6, 4, 6561.9095, 6560.0973)]
    [InlineData(7, 4, 5413.0254, 5411.5209)]
    [InlineData(8, 4, 4860.6769, 4859.3194)]
    [InlineData(9, 4, 4542.8640, 4541.5907)]
    [InlineData(10, 4, 4339.8911, 4338.6713)]
    [InlineData(11, 4, 4201.0150, 4199.8316)]
    [InlineData(12, 4, 4101.1978, 4100.0406)]
    public void Ionized_helium_lines_are_at_the_computed_centroids(int upper, int lower, double vacuum, double air)
        => AssertWavelengths(HydrogenicAtom.HeliumPlus.Line(upper, lower), vacuum, air);

    // The table's last digit, 0.00005 A, is worth up to 0.05 km/s at 300 A.
    private static void AssertWavelengths(HydrogenicLine line, double vacuum, double air)
    {
        double expectedAir = air == 0 ? vacuum : air;
        Assert.Equal(vacuum, line.VacuumAngstrom, 0.00006 + vacuum * ToleranceKmS / Codata2022.SpeedOfLightKmS);
        Assert.Equal(expectedAir, line.AirAngstrom, 0.00006 + vacuum * ToleranceKmS / Codata2022.SpeedOfLightKmS);
    }
}
