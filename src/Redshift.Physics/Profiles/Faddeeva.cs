using System.Numerics;

namespace Redshift.Physics.Profiles;

/// <summary>The Faddeeva function w(z) = exp(-z^2) erfc(-iz) in the upper half plane.</summary>
/// <remarks>
/// Rational approximations in four regions, relative error of the real part below 1e-4 everywhere.
/// Reference: J. Humlicek, J. Quant. Spectrosc. Radiat. Transfer 27, 437 (1982).
/// </remarks>
public static class Faddeeva
{
    /// <summary>w(x + iy).</summary>
    /// <param name="x">Real part of the argument.</param>
    /// <param name="y">Imaginary part of the argument, not negative.</param>
    /// <returns>w; its real part is the Voigt function.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="y"/> is negative.</exception>
    public static Complex W(double x, double y)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(y);
        var t = new Complex(y, -x);
        double distance = Math.Abs(x) + y;
        if (distance >= 15)
            return Wing(t);
        if (distance >= 5.5)
            return Shoulder(t);
        return y >= 0.195 * Math.Abs(x) - 0.176 ? Core(t) : NearRealAxis(t);
    }

    private static Complex Wing(Complex t) => t * 0.5641896 / (0.5 + t * t);

    private static Complex Shoulder(Complex t)
    {
        Complex u = t * t;
        return t * (1.410474 + 0.5641896 * u) / (0.75 + u * (3 + u));
    }

    private static Complex Core(Complex t)
        => (16.4955 + t * (20.20933 + t * (11.96482 + t * (3.778987 + 0.5642236 * t))))
            / (16.4955 + t * (38.82363 + t * (39.27121 + t * (21.69274 + t * (6.699398 + t)))));

    private static Complex NearRealAxis(Complex t)
    {
        Complex u = t * t;
        Complex numerator = t * (36183.31 - u * (3321.9905 - u * (1540.787 - u * (219.0313 - u * (35.76683 - u * (1.320522 - 0.56419 * u))))));
        Complex denominator = 32066.6
            - u * (24322.84 - u * (9022.228 - u * (2186.181 - u * (364.2191 - u * (61.57037 - u * (1.841439 - u))))));
        return Complex.Exp(u) - numerator / denominator;
    }
}
