namespace Redshift.Simulation.Light;

/// <summary>A piecewise linear law through given points, constant beyond its ends.</summary>
public sealed class Curve(params (double X, double Y)[] points)
{
    /// <summary>The value at <paramref name="x"/>.</summary>
    public double At(double x)
    {
        if (x <= points[0].X)
            return points[0].Y;
        for (var i = 1; i < points.Length; i++)
        {
            if (x < points[i].X)
                return Between(points[i - 1], points[i], x);
        }
        return points[^1].Y;
    }

    private static double Between((double X, double Y) a, (double X, double Y) b, double x) =>
        a.Y + ((b.Y - a.Y) * (x - a.X) / (b.X - a.X));
}
