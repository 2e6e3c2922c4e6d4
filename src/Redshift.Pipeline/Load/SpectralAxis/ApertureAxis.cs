using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>
/// One aperture of the "multispec" coordinate system: linear, logarithmic or a sum of dispersion functions, all from a string in the
/// WAT2 cards.
/// </summary>
/// <remarks>Valdes 1993, ASP Conference Series 52, 467: aperture, beam, type, w1, dw, nw, z, limits, functions.</remarks>
internal sealed partial class ApertureAxis : PixelAxis
{
    private readonly AxisScale _scale;
    private readonly LinearPixels _pixels;
    private readonly double _dopplerFactor;
    private readonly IReadOnlyList<DispersionFunction> _functions;

    private ApertureAxis(ReadOnlySpan<double> numbers)
    {
        Aperture = (int)numbers[0];
        Beam = (int)numbers[1];
        _scale = numbers[2] == 1 ? AxisScale.Log10 : AxisScale.Linear;
        _pixels = new(1, numbers[3], numbers[4]);
        _dopplerFactor = 1 + numbers[6];
        _functions = numbers[2] == 2 ? DispersionFunction.ReadAll(numbers[9..]) : [];
    }

    /// <summary>Number of the aperture.</summary>
    public int Aperture { get; }

    /// <summary>Number of the beam: the order of an echelle spectrum.</summary>
    public int Beam { get; }

    /// <inheritdoc/>
    public override double At(double pixel)
    {
        var value = _functions.Count == 0 ? _pixels.At(pixel) : _functions.Sum(function => function.At(pixel));
        return (_scale == AxisScale.Log10 ? Math.Pow(10, value) : value) / _dopplerFactor;
    }

    /// <summary>The apertures that a header describes, in the order of the image's rows; empty where it describes none.</summary>
    public static IReadOnlyList<ApertureAxis> ReadAll(HeaderScope header)
    {
        var text = Attributes(header);
        if (!text.ContainsAny("multispec")) return [];
        return [.. SpecPattern().Matches(text).Select(match => Parse(match.Groups[2].Value)).OfType<ApertureAxis>()];
    }

    // The string runs on over the cards, and FITS drops blanks at the end of each: 68 characters is what a card holds.
    private static string Attributes(HeaderScope header)
    {
        var text = new StringBuilder();
        for (var i = 1; header.Find(string.Create(CultureInfo.InvariantCulture, $"WAT2_{i:000}")) is { } card; i++)
            text.Append(card.Value.Literal.PadRight(68));
        return text.ToString();
    }

    private static ApertureAxis? Parse(string text)
    {
        var words = text.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        var numbers = new double[words.Length];
        for (var i = 0; i < words.Length; i++)
            if (!double.TryParse(words[i].Replace('D', 'E'), CultureInfo.InvariantCulture, out numbers[i])) return null;
        return numbers.Length < 9 ? null : new(numbers) { Why = "the aperture's own dispersion in the WAT2 cards" };
    }

    [GeneratedRegex(@"spec(\d+)\s*=\s*""([^""]*)""", RegexOptions.CultureInvariant)]
    private static partial Regex SpecPattern();
}
