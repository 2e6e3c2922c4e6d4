using Redshift.Physics.Profiles;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>The instrumental width of each pixel, in any of the forms in which files state it.</summary>
/// <param name="values">The widths.</param>
/// <param name="role">Their form: FWHM, standard deviation, resolving power or matrix.</param>
/// <param name="statedUnit">The unit that the pipeline file states; null for that of the label.</param>
internal sealed class WidthSource(NumberArray values, Role role, string? statedUnit = null)
{
    // Narrower than a third of a pixel or wider than a third of the wavelength is not a resolution.
    private const double SmallestPart = 1.0 / 3;

    // A "resolution" above this is a resolving power, below it a width in Å.
    private const double LowestPower = 20;

    private readonly SpectralUnit? _unit = SpectralUnit.Parse(statedUnit ?? values.Label.Unit);

    private readonly bool _inPixels = (statedUnit ?? values.Label.Unit).BeginsWithAny("pix")
        || (statedUnit is null && role == Role.Sigma && !values.Label.Words.Contains("wresl"));

    /// <summary>Where it is.</summary>
    public string Place => values.Place;

    /// <summary>The key of a load rule for widths of this form.</summary>
    public string Key => role switch
    {
        Role.Sigma => "sigma",
        Role.Resolution => "resolution",
        _ => "fwhm",
    };

    /// <summary>The unit as a load rule states it; null for resolving powers and matrices.</summary>
    public string? Unit => role == Role.Resolution ? null : _unit?.ToString() ?? (_inPixels ? "pixel" : "Angstrom");

    /// <summary>The widths of one row of many.</summary>
    public WidthSource AtRow(int row) => new(new FixedRow(values, row), role, statedUnit);

    /// <summary>Whether the width is one along the spectrum: a FWHM without a unit may be that of the slit profile.</summary>
    public bool IsSpectral => role != Role.Fwhm || values.Label.Unit.Length > 0;

    /// <summary>Whether it can describe spectra of this length.</summary>
    public bool Fits(int count) =>
        values.Length == count || (role == Role.Resolution && values.Length > count && values.Length % count == 0);

    /// <summary>FWHM in km/s of each pixel in the order of the file, or null where most of the values make no sense.</summary>
    /// <param name="row">Which spectrum.</param>
    /// <param name="angstroms">The wavelengths in the order of the file.</param>
    public float[]? FwhmKmS(int row, double[] angstroms)
    {
        var raw = values.Read(row);
        if (raw.Length < angstroms.Length) return null;
        var widths = raw.Length > angstroms.Length ? ResolutionMatrix.FwhmPixels(raw, angstroms.Length) : raw;
        var isMatrix = widths != raw;
        var fwhm = new float[angstroms.Length];
        var good = 0;
        for (var i = 0; i < fwhm.Length; i++)
        {
            var step = Step(angstroms, i);
            var angstrom = isMatrix ? widths[i] * step : InAngstrom(widths[i], angstroms[i], step);
            var sound = angstrom > SmallestPart * step && angstrom < SmallestPart * angstroms[i];
            fwhm[i] = sound ? (float)(angstrom / angstroms[i] * Velocity.SpeedOfLightKmS) : float.NaN;
            if (sound) good++;
        }
        return 2 * good > fwhm.Length ? Filled(fwhm) : null;
    }

    private double InAngstrom(double value, double angstrom, double step)
    {
        var perSigma = role == Role.Sigma ? LineWidth.FwhmPerSigma : 1;
        if (_unit is { } unit)
        {
            return unit.Quantity switch
            {
                SpectralQuantity.Wavelength => perSigma * unit.ToBase(value),
                SpectralQuantity.Velocity => perSigma * unit.ToBase(value) / 1e3 / Velocity.SpeedOfLightKmS * angstrom,
                _ => double.NaN,
            };
        }
        if (role == Role.Resolution) return value > LowestPower ? angstrom / value : value;
        return perSigma * value * (_inPixels ? step : 1);
    }

    private static double Step(double[] angstroms, int i)
    {
        if (angstroms.Length < 2) return double.NaN;
        var (left, right) = (Math.Max(i - 1, 0), Math.Min(i + 1, angstroms.Length - 1));
        return Math.Abs(angstroms[right] - angstroms[left]) / (right - left);
    }

    private static float[] Filled(float[] fwhm)
    {
        var last = fwhm.First(static value => !float.IsNaN(value));
        for (var i = 0; i < fwhm.Length; i++)
        {
            if (float.IsNaN(fwhm[i])) fwhm[i] = last;
            last = fwhm[i];
        }
        return fwhm;
    }
}
