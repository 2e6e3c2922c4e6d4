namespace Redshift.Simulation.Light;

/// <summary>Line shapes of unit height as tables over x in units of their width; exact exponentials would dominate the run time.</summary>
internal sealed class Profile
{
    private const int PerUnit = 128;
    private readonly double[] _values;

    private Profile(double reach, Func<double, double> shape)
    {
        Reach = reach;
        _values = new double[(int)(reach * PerUnit) + 2];
        for (var i = 0; i < _values.Length; i++)
            _values[i] = shape((double)i / PerUnit);
        Area = 2 * (_values.Sum() - (_values[0] / 2)) / PerUnit;
    }

    /// <summary>exp(−x²/2).</summary>
    public static Profile Gaussian { get; } = new(5, x => Math.Exp(-x * x / 2));

    /// <summary>Wings of quasar and damped lines: 1/(1+x²) tapered to nothing at 12 widths.</summary>
    public static Profile Lorentzian { get; } = new(12, x => Math.Pow(1 - (x / 12), 2) / (1 + (x * x)));

    /// <summary>Linear Stark wings fall nearly as |x|^−5/2 (Holtsmark); this law joins them to a rounded core.</summary>
    public static Profile Stark { get; } = new(25, x => Math.Pow(1 + (x * x), -1.25) * (1 - (x / 25)));

    /// <summary>Rotation with solid limb darkening 0.6 (Gray, The Observation and Analysis of Stellar Photospheres).</summary>
    public static Profile Rotation { get; } = new(1, x => x >= 1 ? 0 : (0.56 * Math.Sqrt(1 - (x * x))) + (0.44 * (1 - (x * x))));

    /// <summary>Beyond this x the shape is nothing.</summary>
    public double Reach { get; }

    /// <summary>Integral over x.</summary>
    public double Area { get; }

    /// <summary>The shape at x, by linear interpolation.</summary>
    public double At(double x)
    {
        x = Math.Abs(x) * PerUnit;
        var i = (int)x;
        return i + 1 >= _values.Length ? 0 : _values[i] + ((x - i) * (_values[i + 1] - _values[i]));
    }
}
