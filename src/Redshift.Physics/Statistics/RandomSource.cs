namespace Redshift.Physics.Statistics;

/// <summary>The generator xoshiro256** of Blackman and Vigna (2018, arXiv:1805.01407), seeded by SplitMix64 as its authors advise.</summary>
/// <remarks>Written here so that a seed gives the same numbers on every runtime and machine.</remarks>
public sealed class RandomSource
{
    private ulong _s0, _s1, _s2, _s3;
    private double _spare = double.NaN;

    /// <summary>A stream of its own for each seed.</summary>
    public RandomSource(ulong seed)
    {
        var state = seed;
        _s0 = SplitMix64.Next(ref state);
        _s1 = SplitMix64.Next(ref state);
        _s2 = SplitMix64.Next(ref state);
        _s3 = SplitMix64.Next(ref state);
    }

    private RandomSource((ulong, ulong, ulong, ulong) state) => (_s0, _s1, _s2, _s3) = state;

    /// <summary>A stream from the four words of its state, as the published generator is checked.</summary>
    public static RandomSource FromState(ulong s0, ulong s1, ulong s2, ulong s3) => new((s0, s1, s2, s3));

    /// <summary>The stream of one member of a numbered family, independent of how many are drawn.</summary>
    public static RandomSource ForMember(ulong seed, ulong index)
    {
        var state = seed;
        var mixed = SplitMix64.Next(ref state) ^ (index * 0xD1342543DE82EF95UL);
        return new RandomSource(SplitMix64.Next(ref mixed));
    }

    /// <summary>The next 64 bits.</summary>
    public ulong NextBits()
    {
        var result = ulong.RotateLeft(_s1 * 5, 7) * 9;
        var t = _s1 << 17;
        _s2 ^= _s0;
        _s3 ^= _s1;
        _s1 ^= _s2;
        _s0 ^= _s3;
        _s2 ^= t;
        _s3 = ulong.RotateLeft(_s3, 45);
        return result;
    }

    /// <summary>Uniform in [0, 1) with 53 bits.</summary>
    public double Uniform() => (NextBits() >> 11) * (1.0 / (1UL << 53));

    /// <summary>Uniform in [from, to).</summary>
    public double Uniform(double from, double to) => from + ((to - from) * Uniform());

    /// <summary>Uniform in the logarithm between two positive numbers.</summary>
    public double LogUniform(double from, double to) => from * Math.Exp(Uniform() * Math.Log(to / from));

    /// <summary>Standard normal deviate by the polar method of Marsaglia and Bray (1964).</summary>
    public double Normal()
    {
        if (!double.IsNaN(_spare))
        {
            var spare = _spare;
            _spare = double.NaN;
            return spare;
        }
        double u, v, s;
        do
        {
            u = (2 * Uniform()) - 1;
            v = (2 * Uniform()) - 1;
            s = (u * u) + (v * v);
        }
        while (s is >= 1 or 0);
        var factor = Math.Sqrt(-2 * Math.Log(s) / s);
        _spare = v * factor;
        return u * factor;
    }

    /// <summary>Normal deviate.</summary>
    public double Normal(double mean, double sigma) => mean + (sigma * Normal());

    /// <summary>A positive factor whose natural logarithm is normal around 0.</summary>
    public double Scatter(double sigmaLn) => Math.Exp(sigmaLn * Normal());

    /// <summary>Exponential deviate of the given mean.</summary>
    public double Exponential(double mean) => -mean * Math.Log(1 - Uniform());

    /// <summary>Whether an event of this probability happens.</summary>
    public bool Chance(double probability) => Uniform() < probability;

    /// <summary>Uniform integer in [0, count).</summary>
    public int Index(int count) => (int)(Uniform() * count);
}
