using System.Text.RegularExpressions;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Quality flags of the pixels, and which of their values is the bad one.</summary>
internal sealed partial class MaskSource
{
    private readonly NumberArray _values;
    private readonly bool _zeroIsBad;

    /// <summary>Reads the meaning from the label; without a word on it, non-zero is bad.</summary>
    public MaskSource(NumberArray values)
        : this(values, IsCalledGood(values.Label))
    {
    }

    /// <summary>Takes the meaning that is given.</summary>
    public MaskSource(NumberArray values, bool zeroIsBad)
    {
        _values = values;
        _zeroIsBad = zeroIsBad;
    }

    /// <summary>Where the flags are.</summary>
    public string Place => _values.Place;

    /// <summary>The key of a load rule for flags of this meaning.</summary>
    public string Key => _zeroIsBad ? "good" : "mask";

    /// <summary>Which values are bad, for the notes.</summary>
    public string Why => _zeroIsBad ? "0 is bad" : "other than 0 is bad";

    /// <summary>The flags of one row of many.</summary>
    public MaskSource AtRow(int row) => new(new FixedRow(_values, row), _zeroIsBad);

    /// <summary>Number of flags.</summary>
    public int Length => _values.Length;

    /// <summary>Whether each pixel is good.</summary>
    public bool[] Good(int row) => Array.ConvertAll(_values.Read(row), value => (value == 0 || double.IsNaN(value)) != _zeroIsBad);

    private static bool IsCalledGood(Label label) =>
        label.Words.Any(static word => word is "good" or "goodpix" or "goodpixels") || OneIsGoodPattern().IsMatch(label.Comment);

    [GeneratedRegex(@"\b1\s*(=|is|:|for)\s*(good|ok|valid)|\b0\s*(=|is|:|for)\s*bad", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex OneIsGoodPattern();
}
