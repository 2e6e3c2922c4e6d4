namespace Redshift.Physics.Stars;

/// <summary>Vacuum wavelengths of the lines that the tables give in air.</summary>
internal static class AirWavelength
{
    // Ciddor 1996, Appl. Opt. 35, 1566: the index belongs to the vacuum wavelength, hence the repetition.
    public static double ToVacuum(double air)
    {
        var vacuum = air;
        for (var i = 0; i < 3; i++)
        {
            var s2 = 1e8 / (vacuum * vacuum);
            vacuum = air * (1 + (5792105e-8 / (238.0185 - s2)) + (167917e-8 / (57.362 - s2)));
        }

        return vacuum;
    }
}
