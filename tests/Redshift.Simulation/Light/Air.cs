namespace Redshift.Simulation.Light;

/// <summary>Air and vacuum wavelengths by Morton 2000 (ApJS 130, 403), the form of Birch and Downs 1994 (Metrologia 31, 315).</summary>
/// <remarks>Below 2000 Å wavelengths are vacuum everywhere, by custom.</remarks>
public static class Air
{
    /// <summary>Air wavelength in Å of a vacuum wavelength in Å.</summary>
    public static double FromVacuum(double vacuum) => vacuum < 2000 ? vacuum : vacuum / Index(vacuum);

    /// <summary>Vacuum wavelength in Å of an air wavelength in Å.</summary>
    public static double ToVacuum(double air)
    {
        if (air < 2000)
            return air;
        var vacuum = air;
        for (var i = 0; i < 4; i++)
            vacuum = air * Index(vacuum);
        return vacuum;
    }

    private static double Index(double vacuum)
    {
        var s2 = 1e8 / (vacuum * vacuum);
        return 1 + 8.34254e-5 + (2.406147e-2 / (130 - s2)) + (1.5998e-4 / (38.9 - s2));
    }
}
