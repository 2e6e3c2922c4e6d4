using Redshift.Fits;

namespace Redshift.Simulation.Samples;

/// <summary>The invented observatory of the samples and the cards its instruments write.</summary>
internal static class Observatory
{
    /// <summary>Cards that say who observed what, when and with what.</summary>
    /// <param name="target">Name of the object.</param>
    /// <param name="instrument">Name of the spectrograph.</param>
    /// <param name="raDeg">Right ascension, degrees.</param>
    /// <param name="decDeg">Declination, degrees.</param>
    /// <param name="start">Start of the exposure, UTC.</param>
    /// <param name="seconds">Exposure time.</param>
    public static IEnumerable<Card> Cards(string target, string instrument, double raDeg, double decDeg, string start, double seconds) =>
    [
        Card.Of("OBJECT", target),
        Card.Of("TELESCOP", "Vessamoor 1.1 m"),
        Card.Of("INSTRUME", instrument),
        Card.Of("RA", raDeg, "[deg] J2000"),
        Card.Of("DEC", decDeg, "[deg] J2000"),
        Card.Of("DATE-OBS", start, "start of exposure, UTC"),
        Card.Of("EXPTIME", seconds, "[s]"),
    ];

    /// <summary>Where the observatory would stand: cards for velocity corrections.</summary>
    public static IEnumerable<Card> Site() =>
    [
        Card.Of("OBSGEO-L", -12.25, "[deg] east longitude"),
        Card.Of("OBSGEO-B", 38.5, "[deg] latitude"),
        Card.Of("OBSGEO-H", 640.0, "[m] height"),
    ];
}
