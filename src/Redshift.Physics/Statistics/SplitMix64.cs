namespace Redshift.Physics.Statistics;

/// <summary>The generator of Steele, Lea and Flood (OOPSLA 2014) with Vigna's constants: turns any seed into well-mixed words.</summary>
public static class SplitMix64
{
    /// <summary>Advances the state and gives the next word.</summary>
    public static ulong Next(ref ulong state)
    {
        state += 0x9E3779B97F4A7C15UL;
        var z = state;
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9UL;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EBUL;
        return z ^ (z >> 31);
    }
}
