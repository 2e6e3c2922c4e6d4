namespace Redshift.Pipeline.Numerics;

/// <summary>Uniform cubic B-splines: the four basis functions that are not zero at a place (de Boor 1978, chapter IX).</summary>
internal readonly struct CubicBSpline
{
    private readonly double _start;
    private readonly double _spacing;

    /// <summary>Lays knots evenly over [start, end], their spacing not above <paramref name="spacing"/>.</summary>
    public CubicBSpline(double start, double end, double spacing)
    {
        var intervals = Math.Max(1, (int)Math.Ceiling((end - start) / spacing - 1e-9));
        _start = start;
        _spacing = Math.Max((end - start) / intervals, 1e-12);
        Count = intervals + 3;
    }

    /// <summary>Number of coefficients.</summary>
    public int Count { get; }

    /// <summary>Fills the four values at x and returns the index of the first coefficient they belong to.</summary>
    public int Evaluate(double x, Span<float> four)
    {
        var u = (x - _start) / _spacing;
        var interval = Math.Clamp((int)Math.Floor(u), 0, Count - 4);
        var t = u - interval;
        double t2 = t * t, t3 = t2 * t, s = 1 - t;
        four[0] = (float)(s * s * s / 6);
        four[1] = (float)((3 * t3 - 6 * t2 + 4) / 6);
        four[2] = (float)((-3 * t3 + 3 * t2 + 3 * t + 1) / 6);
        four[3] = (float)(t3 / 6);
        return interval;
    }
}
