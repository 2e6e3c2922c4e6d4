using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Columns that nobody names: the first is the wavelength, the second the flux, the third perhaps its error.</summary>
internal static partial class ColumnsByPlace
{
    /// <summary>Whether no column has a name, or all have names that only count them.</summary>
    public static bool AreNameless(IReadOnlyList<NumberArray> arrays) =>
        arrays.Count is 2 or 3 && arrays.All(static array => NumberPattern().IsMatch(array.Label.Name) && array.Label is { Ucd: "", Utype: "" });

    /// <summary>The roles of columns without telling names.</summary>
    /// <exception cref="LoadException">The first column is no wavelength.</exception>
    public static SpectrumSources Read(IReadOnlyList<NumberArray> arrays)
    {
        RequireWavelengths(arrays[0].Read(0), arrays[0].Place);
        return new()
        {
            Wavelength = new ArrayWavelengths(arrays[0]),
            Flux = arrays[1],
            Noise = arrays.Count == 3 && LooksLikeError(arrays[1].Read(0), arrays[2].Read(0)) ? (Role.Error, arrays[2]) : null,
        };
    }

    private static void RequireWavelengths(double[] values, string place)
    {
        int rising = 0, falling = 0;
        for (var i = 1; i < values.Length; i++)
        {
            if (values[i] > values[i - 1]) rising++;
            if (values[i] < values[i - 1]) falling++;
        }
        var isOrdered = Math.Min(rising, falling) * 10 <= values.Length && Math.Max(rising, falling) * 2 >= values.Length;
        if (!isOrdered || values.Any(static value => value <= 0))
            throw new LoadException(place, "numbers that are not in order or not positive", "wavelengths");
    }

    // A third column without a name is an error if it is positive and speaks of the scatter from pixel to pixel.
    private static bool LooksLikeError(double[] flux, double[] third)
    {
        if (third.Any(static value => value < 0) || third.Count(static value => value > 0) * 2 < third.Length) return false;
        var ratios = new List<double>();
        for (var i = 2; i < flux.Length; i++)
            if (third[i - 1] > 0) ratios.Add(Math.Abs(flux[i - 1] - (flux[i - 2] + flux[i]) / 2) / third[i - 1]);
        ratios.Sort();
        return ratios.Count > 0 && ratios[ratios.Count / 2] is > 0.05 and < 5;
    }

    [GeneratedRegex(@"^(?:col(?:umn)?[\W_]*)?\d*$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex NumberPattern();
}
