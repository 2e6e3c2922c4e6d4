namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>One weighted dispersion function of an aperture.</summary>
/// <remarks>Function types 1 to 5 of the multispec description: Chebyshev, Legendre, cubic spline, linear spline, coordinates of the pixels.</remarks>
internal sealed class DispersionFunction
{
    private readonly double _weight;
    private readonly double _zero;
    private readonly int _type;
    private readonly double _low;
    private readonly double _high;
    private readonly double[] _coefficients;

    private DispersionFunction(double weight, double zero, int type, double low, double high, double[] coefficients)
    {
        _weight = weight;
        _zero = zero;
        _type = type;
        _low = low;
        _high = high;
        _coefficients = coefficients;
    }

    /// <summary>Reads all functions of an aperture.</summary>
    /// <exception cref="LoadException">A function is cut short or of an unknown type.</exception>
    public static IReadOnlyList<DispersionFunction> ReadAll(ReadOnlySpan<double> numbers)
    {
        var functions = new List<DispersionFunction>();
        while (numbers.Length > 3) functions.Add(ReadOne(ref numbers));
        return functions;
    }

    /// <summary>The contribution to the wavelength at a pixel.</summary>
    public double At(double pixel) => _weight * (_zero + _type switch
    {
        1 => Polynomial(Normalised(pixel), legendre: false),
        2 => Polynomial(Normalised(pixel), legendre: true),
        3 => CubicSpline(pixel),
        4 => Interpolated((pixel - _low) / (_high - _low) * (_coefficients.Length - 1)),
        _ => Interpolated(pixel - 1),
    });

    private double Normalised(double pixel) => (2 * pixel - (_high + _low)) / (_high - _low);

    // Both families obey a three-term recurrence.
    private double Polynomial(double x, bool legendre)
    {
        double previous = 1, current = x, sum = _coefficients[0];
        for (var k = 1; k < _coefficients.Length; k++)
        {
            sum += _coefficients[k] * current;
            var next = legendre ? ((2 * k + 1) * x * current - k * previous) / (k + 1) : 2 * x * current - previous;
            (previous, current) = (current, next);
        }
        return sum;
    }

    private double Interpolated(double place)
    {
        var left = Math.Clamp((int)Math.Floor(place), 0, _coefficients.Length - 2);
        return _coefficients[left] + (place - left) * (_coefficients[left + 1] - _coefficients[left]);
    }

    private double CubicSpline(double pixel)
    {
        var pieces = _coefficients.Length - 3;
        var place = (pixel - _low) / (_high - _low) * pieces;
        var piece = Math.Clamp((int)Math.Floor(place), 0, pieces - 1);
        double a = piece + 1 - place, b = place - piece;
        return _coefficients[piece] * a * a * a
            + _coefficients[piece + 1] * (1 + 3 * a * (1 + a * b))
            + _coefficients[piece + 2] * (1 + 3 * b * (1 + a * b))
            + _coefficients[piece + 3] * b * b * b;
    }

    private static DispersionFunction ReadOne(ref ReadOnlySpan<double> numbers)
    {
        var (weight, zero, type, size) = (numbers[0], numbers[1], (int)numbers[2], (int)numbers[3]);
        var count = type switch { 1 or 2 or 5 => size, 3 => size + 3, 4 => size + 1, _ => -1 };
        var start = type == 5 ? 4 : 6;
        if (count < 2 || (long)start + count > numbers.Length)
            throw new LoadException("WAT2 cards", $"a dispersion function of type {type} with {numbers.Length} numbers", "a complete function of type 1 to 5");
        var (low, high) = type == 5 ? (1, size) : (numbers[4], numbers[5]);
        var function = new DispersionFunction(weight, zero, type, low, high, numbers.Slice(start, count).ToArray());
        numbers = numbers[(start + count)..];
        return function;
    }
}
