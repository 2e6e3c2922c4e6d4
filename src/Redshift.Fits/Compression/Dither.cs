namespace Redshift.Fits;

/// <summary>
/// The sequence of random numbers by which quantised values were shifted (section 10.2.1 and appendix I), and the walk through it.
/// </summary>
internal static class Dither
{
    public const int Length = 10000;

    private static readonly float[] Numbers = Generate();

    /// <summary>Where the walk of a tile starts.</summary>
    /// <param name="tile">0-based tile number.</param>
    /// <param name="seed">ZDITHER0, from 1.</param>
    public static (int Seed, int Next) Start(long tile, long seed)
    {
        var start = (int)((Int128)tile + seed - 1).Modulo(Length);
        return (start, FirstOf(start));
    }

    /// <summary>The number at the walk's place, which is then moved on.</summary>
    public static float Take(ref (int Seed, int Next) walk)
    {
        var number = Numbers[walk.Next++];
        if (walk.Next < Length) return number;
        walk.Seed = (walk.Seed + 1) % Length;
        walk.Next = FirstOf(walk.Seed);
        return number;
    }

    private static int FirstOf(int seed) => (int)(Numbers[seed] * 500);

    private static Int128 Modulo(this Int128 value, int divisor) => (value % divisor + divisor) % divisor;

    // The "minimal standard" generator of Park & Miller 1988, Comm. ACM 31, 1192, as the FITS standard prescribes.
    private static float[] Generate()
    {
        const double Multiplier = 16807;
        const double Modulus = 2147483647;
        var numbers = new float[Length];
        double state = 1;
        for (var i = 0; i < Length; i++)
        {
            state = Multiplier * state % Modulus;
            numbers[i] = (float)(state / Modulus);
        }

        return numbers;
    }
}
