using System.Globalization;
using Redshift.Fits;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>A header-data unit that holds spectra, with what its name says of its standing among others.</summary>
internal sealed class SpectrumUnit
{
    private readonly Func<UnitContent> _read;

    /// <summary>Classifies the unit by its name.</summary>
    /// <param name="hdu">The unit.</param>
    /// <param name="read">Reads its layout.</param>
    public SpectrumUnit(Hdu hdu, Func<UnitContent> read)
    {
        Hdu = hdu;
        _read = read;
        var words = RoleGuesser.Qualifiers(new Label(hdu.Name).Words).ToList();
        var arms = words.Where(ArmNames.Contains).ToList();
        Arm = string.Join(' ', arms.Select(static arm => arm.ToUpperInvariant()));
        Rank = words.Except(arms).Sum(static word => Vocabulary.Better.Contains(word) ? -1 : 1);
    }

    /// <summary>The unit.</summary>
    public Hdu Hdu { get; }

    /// <summary>Name of the spectrograph arm, or empty.</summary>
    public string Arm { get; }

    /// <summary>Lower for the better of several forms of the same spectrum, such as a coadd beside its exposures.</summary>
    public int Rank { get; }

    /// <summary>Its place as a rule names it.</summary>
    public string Place => Hdu.Name.Length > 0 ? $"HDU {Hdu.Index} ({Hdu.Name})" : $"HDU {Hdu.Index}";

    /// <summary>Whether it has one of these indices or names; null or no names fit all.</summary>
    public bool IsOneOf(IReadOnlyList<string>? names) => names is not { Count: > 0 }
        || names.Any(name => Hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase) || Hdu.Index.ToString(CultureInfo.InvariantCulture) == name);

    /// <summary>Reads the layout.</summary>
    public UnitContent Read() => _read();
}
