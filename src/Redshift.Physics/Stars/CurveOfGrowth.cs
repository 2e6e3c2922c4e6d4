namespace Redshift.Physics.Stars;

/// <summary>
/// Equivalent width of a line whose opacity adds to the continuous one, with the residual flux of Milne &amp; Eddington,
/// 1 − A η/(1 + η): widths in units of A times the Doppler width.
/// </summary>
internal static class CurveOfGrowth
{
    /// <summary>Doppler widths from the centre where damping wings take over from the Gaussian core.</summary>
    public const double WingStart = 2.5;

    private const double FirstLog = -6;
    private const double LogStep = 0.05;
    private static readonly double[] CoreTable =
        [.. Enumerable.Range(0, 400).Select(i => Integrate(Math.Pow(10, FirstLog + (i * LogStep))))];

    /// <summary>Width of the Gaussian core, ∫ η e^(−v²)/(1 + η e^(−v²)) dv, for a central opacity ratio η.</summary>
    public static double Core(double central)
    {
        if (central <= 1e-6)
            return central * Math.Sqrt(Math.PI);
        var place = Math.Min((Math.Log10(central) - FirstLog) / LogStep, CoreTable.Length - 1.001);
        var cell = (int)place;
        return CoreTable[cell] + ((place - cell) * (CoreTable[cell + 1] - CoreTable[cell]));
    }

    /// <summary>Core share that remains visible inside the damping wings.</summary>
    public static double CoreInsideWings(double central, double damping) =>
        Core(central) / (1 + (WingStrength(central, damping) / (WingStart * WingStart)));

    /// <summary>Width of the damping wings k/(v² + v₀²) over 1 + the same.</summary>
    public static double Wings(double central, double damping)
    {
        var k = WingStrength(central, damping);
        return Math.PI * k / Math.Sqrt((WingStart * WingStart) + k);
    }

    /// <summary>k = a η/√π: far from the centre a Voigt profile is k/v².</summary>
    public static double WingStrength(double central, double damping) => damping * central / Math.Sqrt(Math.PI);

    /// <summary>Central opacity ratio that gives a width.</summary>
    public static double Invert(double width, double damping)
    {
        double low = -12, high = 12;
        while (high - low > 1e-3)
        {
            var middle = (low + high) / 2;
            var central = Math.Pow(10, middle);
            var tooWide = CoreInsideWings(central, damping) + Wings(central, damping) > width;
            (low, high) = tooWide ? (low, middle) : (middle, high);
        }

        return Math.Pow(10, low);
    }

    private static double Integrate(double central)
    {
        const double step = 0.02;
        var sum = 0.5 * central / (1 + central);
        for (var v = step; v < 8; v += step)
        {
            var eta = central * Math.Exp(-v * v);
            sum += eta / (1 + eta);
        }

        return 2 * step * sum;
    }
}
