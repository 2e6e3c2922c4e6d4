using System.Globalization;
using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>A unit of a spectral coordinate, in any of the spellings that files hold.</summary>
/// <param name="Quantity">What it measures.</param>
/// <param name="Factor">Multiplier to the unit of <see cref="SpectralQuantity"/>.</param>
/// <param name="Scale">Whether values are logarithms of a number in this unit.</param>
internal readonly partial record struct SpectralUnit(SpectralQuantity Quantity, double Factor, AxisScale Scale = AxisScale.Linear)
{
    /// <summary>Speed of light in Å/s, exact.</summary>
    public const double LightAngstromPerSecond = 2.99792458e18;

    /// <summary>hc in eV Å, exact from the SI constants of 2019.</summary>
    public const double PlanckLightElectronvoltAngstrom = 12398.419843320026;

    // Five times as fast as Math.Pow, and as exact for exponents of this size.
    private const double Ln10 = 2.302585092994045684;

    private static readonly Dictionary<string, (SpectralQuantity Quantity, double Factor)> Known = BuildKnown();

    /// <summary>Angstrom.</summary>
    public static SpectralUnit Angstrom { get; } = new(SpectralQuantity.Wavelength, 1);

    /// <summary>The same unit on another scale.</summary>
    public SpectralUnit On(AxisScale scale) => this with { Scale = scale };

    /// <summary>Reads a unit; null where the text is none of a spectral coordinate.</summary>
    public static SpectralUnit? Parse(string text)
    {
        var inner = Unwrap(text.Trim(), out var scale);
        var (factor, name) = SplitMultiplier(inner);
        var key = Normalise(name);
        return Known.TryGetValue(key, out var known) ? new(known.Quantity, factor * known.Factor, scale) : null;
    }

    /// <summary>The value in the unit of its quantity.</summary>
    public double ToBase(double value) => Factor * Scale switch
    {
        AxisScale.Log10 => Math.Exp(Ln10 * value),
        AxisScale.Ln => Math.Exp(value),
        _ => value,
    };

    /// <summary>Wavelength in Å, in the medium to which the value refers; NaN for velocities, which need a rest wavelength.</summary>
    public double ToAngstrom(double value) => Quantity switch
    {
        SpectralQuantity.Wavelength => ToBase(value),
        SpectralQuantity.Frequency => LightAngstromPerSecond / ToBase(value),
        SpectralQuantity.Wavenumber => 1e8 / ToBase(value),
        SpectralQuantity.Energy => PlanckLightElectronvoltAngstrom / ToBase(value),
        _ => double.NaN,
    };

    /// <summary>The unit in the form in which a pipeline file states it.</summary>
    public override string ToString()
    {
        var name = Quantity switch
        {
            SpectralQuantity.Wavelength => WavelengthName(Factor),
            SpectralQuantity.Frequency => Scaled("Hz"),
            SpectralQuantity.Wavenumber => Scaled("cm-1"),
            SpectralQuantity.Energy => Scaled("eV"),
            SpectralQuantity.Velocity => Factor == 1e3 ? "km/s" : Scaled("m/s"),
            _ => "",
        };
        return Scale switch
        {
            AxisScale.Log10 => $"log10({name})",
            AxisScale.Ln => $"ln({name})",
            _ => name,
        };
    }

    private string Scaled(string name) => Factor == 1 ? name : string.Create(CultureInfo.InvariantCulture, $"{Factor:R} {name}");

    private static string WavelengthName(double factor) => factor switch
    {
        1 => "Angstrom",
        10 => "nm",
        1e4 => "um",
        1e10 => "m",
        _ => string.Create(CultureInfo.InvariantCulture, $"{factor:R} Angstrom"),
    };

    private static string Unwrap(string text, out AxisScale scale)
    {
        var match = LogarithmPattern().Match(text);
        scale = !match.Success ? AxisScale.Linear
            : match.Groups["base"].Value.Equals("ln", StringComparison.OrdinalIgnoreCase) ? AxisScale.Ln : AxisScale.Log10;
        var inner = match.Success ? match.Groups["unit"].Value : text;
        return inner.Trim(' ', '[', ']', '(', ')', '\'', '"');
    }

    private static (double Factor, string Name) SplitMultiplier(string text)
    {
        var match = MultiplierPattern().Match(text);
        if (!match.Success) return (1, text);
        var name = match.Groups["name"].Value;
        if (match.Groups["power"].Success)
            return (Math.Pow(10, int.Parse(match.Groups["power"].Value, CultureInfo.InvariantCulture)), name);
        return (double.Parse(match.Groups["number"].Value, CultureInfo.InvariantCulture), name);
    }

    private static string Normalise(string name) => name.ToLowerInvariant()
        .Replace("**", "", StringComparison.Ordinal).Replace("^", "", StringComparison.Ordinal)
        .Replace("(", "", StringComparison.Ordinal).Replace(")", "", StringComparison.Ordinal)
        .Replace(" ", "", StringComparison.Ordinal).Replace("_", "", StringComparison.Ordinal)
        .TrimEnd('.');

    private static Dictionary<string, (SpectralQuantity, double)> BuildKnown()
    {
        var known = new Dictionary<string, (SpectralQuantity, double)>(StringComparer.Ordinal);
        Add(SpectralQuantity.Wavelength, 1, "a", "aa", "å", "\u212b", "ang", "angs", "angst", "angstr", "angstrom", "angstroms",
            "ångström", "ångströms", "ångstrom", "ångstroms", "angström", "angströms", "angstroem", "angstroems");
        Add(SpectralQuantity.Wavelength, 10, "nm", "nanometer", "nanometers", "nanometre", "nanometres");
        Add(SpectralQuantity.Wavelength, 1e4, "um", "µm", "\u03bcm", "micron", "microns", "micrometer", "micrometers", "micrometre", "micrometres");
        Add(SpectralQuantity.Wavelength, 1e7, "mm", "millimeter", "millimetre");
        Add(SpectralQuantity.Wavelength, 1e8, "cm", "centimeter", "centimetre");
        Add(SpectralQuantity.Wavelength, 1e10, "m", "meter", "meters", "metre", "metres");
        Add(SpectralQuantity.Frequency, 1, "hz", "hertz");
        Add(SpectralQuantity.Frequency, 1e3, "khz");
        Add(SpectralQuantity.Frequency, 1e6, "mhz");
        Add(SpectralQuantity.Frequency, 1e9, "ghz");
        Add(SpectralQuantity.Frequency, 1e12, "thz");
        Add(SpectralQuantity.Wavenumber, 1, "cm-1", "1/cm", "/cm", "kayser", "kaysers");
        Add(SpectralQuantity.Wavenumber, 0.01, "m-1", "1/m", "/m");
        Add(SpectralQuantity.Wavenumber, 1e4, "um-1", "1/um", "/um", "micron-1", "1/micron", "µm-1");
        Add(SpectralQuantity.Energy, 1, "ev");
        Add(SpectralQuantity.Energy, 1e3, "kev");
        Add(SpectralQuantity.Energy, 1e6, "mev");
        Add(SpectralQuantity.Energy, 1 / 1.602176634e-19, "j", "joule");
        Add(SpectralQuantity.Energy, 1e-7 / 1.602176634e-19, "erg", "ergs");
        Add(SpectralQuantity.Velocity, 1, "m/s", "ms-1", "m.s-1");
        Add(SpectralQuantity.Velocity, 1e3, "km/s", "kms-1", "km.s-1", "kms");
        return known;

        void Add(SpectralQuantity quantity, double factor, params ReadOnlySpan<string> names)
        {
            foreach (var name in names) known[name] = (quantity, factor);
        }
    }

    [GeneratedRegex(@"^(?<base>log10|log|lg|ln|dex)\s*(?<unit>[\(\[ ].+)$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex LogarithmPattern();

    [GeneratedRegex(@"^(?:10\s*(?:\*\*|\^)\s*\(?(?<power>[+-]?\d{1,3})\)?|(?<number>\d*\.?\d+\.?(?:[eE][+-]?\d{1,3})?))\s*\*?\s*(?<name>[^\d\s*/].*)$",
        RegexOptions.CultureInvariant)]
    private static partial Regex MultiplierPattern();
}
