namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Times that surveys give in seconds of International Atomic Time since the zero of Modified Julian Dates.</summary>
internal static class AtomicTime
{
    // TAI - UTC from each date on (IERS Bulletin C).
    private static readonly (DateOnly From, int Seconds)[] LeapSeconds =
    [
        (new(2017, 1, 1), 37), (new(2015, 7, 1), 36), (new(2012, 7, 1), 35), (new(2009, 1, 1), 34), (new(2006, 1, 1), 33), (new(1999, 1, 1), 32),
    ];

    /// <summary>UTC of a time in seconds; null before 1999 or in the far future.</summary>
    public static DateTime? ToUtc(double seconds)
    {
        if (seconds is not (> 4e9 and < 8e9)) return null;
        var atomic = new DateTime(1858, 11, 17, 0, 0, 0, DateTimeKind.Utc).AddSeconds(seconds);
        foreach (var (from, leap) in LeapSeconds)
            if (DateOnly.FromDateTime(atomic) >= from) return atomic.AddSeconds(-leap);
        return null;
    }
}
