using System.Globalization;
using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>Reads the spectral axis that a header describes: by the standard, or in the ways that came before it.</summary>
internal static class AxisReader
{
    private static readonly string[] Variables = ["WAVE", "AWAV", "FREQ", "WAVN", "ENER", "VRAD", "VOPT", "ZOPT", "VELO", "BETA"];

    /// <summary>The axis, or null where the header gives no reference value and increment for it.</summary>
    /// <param name="header">The unit's own header.</param>
    /// <param name="axis">1-based axis of the image.</param>
    /// <param name="length">Number of pixels, to judge by size what is not stated.</param>
    /// <param name="file">The file, for coordinates in a table; null where there is none.</param>
    /// <exception cref="LoadException">The header describes an axis that cannot be evaluated.</exception>
    public static PixelAxis? Read(HeaderScope header, int axis, int length, FitsFile? file)
    {
        var type = TypeOf(header, axis);
        if (IsUncalibrated(header, axis) && AlternateOf(header, axis) is { } alternate) return Read(alternate, axis, length, file);
        if (type is { } known && IsTable(known.Code)) return TableAxisReader.Read(header, axis, known.Variable, file);
        if (LinearPart(header, axis) is not { } pixels) return LogarithmCards(header);
        return type is { } standard
            ? Standard(header, axis, standard.Variable, standard.Code, pixels, length)
            : LegacyAxis.Read(header, axis, pixels, length);
    }

    /// <summary>Whether the first description of an axis tells no wavelengths: there is none, or it counts pixels.</summary>
    public static bool IsUncalibrated(HeaderScope header, int axis) => TypeOf(header, axis) is null
        && (LinearPart(header, axis) is { } pixels ? LegacyAxis.CountsPixels(pixels) : LogarithmCards(header) is null);

    // Where the first description counts pixels, another may tell wavelengths.
    private static HeaderScope? AlternateOf(HeaderScope header, int axis)
    {
        for (var version = 'A'; version <= 'Z'; version++)
            if (header.Alternate(version) is var alternate && TypeOf(alternate, axis) is not null) return alternate;
        return null;
    }

    /// <summary>Whether CTYPE names a celestial, time or other axis that is not spectral.</summary>
    public static bool IsForeign(HeaderScope header, int axis)
    {
        var type = header.Text(HeaderScope.Indexed("CTYPE", axis))?.ToUpperInvariant() ?? "";
        string[] foreign = ["RA-", "RA ", "DEC", "GLON", "GLAT", "ELON", "ELAT", "TIME", "STOKES", "SLIT", "OFFSET", "XPOS", "YPOS"];
        return type == "RA" || foreign.Any(name => type.StartsWith(name, StringComparison.Ordinal));
    }

    /// <summary>Reference pixel, value and increment as the file states them, with CD before PC and CDELT.</summary>
    public static LinearPixels? LinearPart(HeaderScope header, int axis)
    {
        if (header.Number(HeaderScope.Indexed("CRVAL", axis)) is not { } value || Increment(header, axis) is not { } increment) return null;
        // The standard's default for CRPIX is 0, but writers that leave it out mean the first pixel.
        return new(header.Number(HeaderScope.Indexed("CRPIX", axis)) ?? 1, value, increment);
    }

    private static double? Increment(HeaderScope header, int axis)
    {
        var cdelt = header.Number(HeaderScope.Indexed("CDELT", axis));
        var matrix = header.Number($"CD{axis}_{axis}");
        // A matrix element of exactly 1 beside a different CDELT is a leftover of the untransformed frame.
        if (matrix is { } cd && cd != 0 && !(cd == 1 && cdelt is { } other && other != 0 && other != 1)) return cd;
        if (cdelt is not { } step || step == 0) return matrix is { } zero && zero != 0 ? zero : null;
        return step * (header.Number($"PC{axis}_{axis}") is { } pc && pc != 0 ? pc : 1);
    }

    // Surveys state log10 of the first wavelength and the step in these two cards, with or without a FITS axis.
    private static LinearAxis? LogarithmCards(HeaderScope header) =>
        header.Number("COEFF0") is { } first && header.Number("COEFF1") is { } step && step > 0
            ? new(new(1, first, step), SpectralUnit.Angstrom.On(AxisScale.Log10), null) { Why = "COEFF0 and COEFF1, log10 of angstroms" }
            : null;

    private static (SpectralVariable Variable, string Code)? TypeOf(HeaderScope header, int axis)
    {
        var type = header.Text(HeaderScope.Indexed("CTYPE", axis))?.ToUpperInvariant() ?? "";
        if (type.Length < 4 || (type.Length > 4 && type[4] != '-')) return null;
        var place = Array.IndexOf(Variables, type[..4]);
        if (place < 0) return null;
        return (Enum.Parse<SpectralVariable>(Variables[place], ignoreCase: true), type.Length > 4 ? type[4..].Trim('-', ' ') : "");
    }

    private static bool IsTable(string code) => code == "TAB";

    private static PixelAxis Standard(HeaderScope header, int axis, SpectralVariable variable, string code, LinearPixels pixels, int length)
    {
        var (unit, where) = UnitOf(header, axis, variable, pixels, length);
        if (unit.Scale != AxisScale.Linear || MistakenForLogarithm(header, unit, pixels, length))
            return new LinearAxis(pixels, unit.On(unit.Scale == AxisScale.Linear ? AxisScale.Log10 : unit.Scale), MediumOf(variable))
            {
                Why = $"CTYPE{axis} {variable.ToString().ToUpperInvariant()} on a logarithmic axis",
            };
        var scaled = new LinearPixels(pixels.ReferencePixel, unit.ToBase(pixels.ReferenceValue), unit.ToBase(pixels.Increment));
        var why = $"CTYPE{axis} {header.Text(HeaderScope.Indexed("CTYPE", axis))}, unit from {where}";
        if (code is "GRI" or "GRA") return Grism(header, axis, variable, code, scaled, why);
        var sampled = Sampled(variable, code, axis);
        var needsRest = SpectralScale.NeedsRest(variable) || SpectralScale.NeedsRest(sampled);
        return new WcsAxis(variable, sampled, code == "LOG", scaled, needsRest ? RestWavelength(header, variable, axis) : 1) { Why = why };
    }

    private static WavelengthMedium MediumOf(SpectralVariable variable) =>
        variable == SpectralVariable.Awav ? WavelengthMedium.Air : WavelengthMedium.Vacuum;

    // A wavelength of 3.6 with steps of 0.0001 is log10 of angstroms whatever CUNIT says.
    private static bool MistakenForLogarithm(HeaderScope header, SpectralUnit unit, LinearPixels pixels, int length) =>
        unit is { Quantity: SpectralQuantity.Wavelength, Factor: 1 }
        && (LegacyAxis.IsFlaggedLogarithmic(header, pixels) || LooksLogarithmic(pixels, length));

    private static bool LooksLogarithmic(LinearPixels pixels, int length)
    {
        var (low, high) = Ends(pixels, length);
        return WavelengthGuess.LooksLogarithmic(low, high);
    }

    /// <summary>The smaller and the larger end of the linear coordinate.</summary>
    public static (double Low, double High) Ends(LinearPixels pixels, int length)
    {
        var (first, last) = (pixels.At(1), pixels.At(length));
        return (Math.Min(first, last), Math.Max(first, last));
    }

    private static (SpectralUnit Unit, string Where) UnitOf(HeaderScope header, int axis, SpectralVariable variable, LinearPixels pixels, int length)
    {
        var quantity = SpectralScale.QuantityOf(variable);
        if (UnitText.Find(header, axis) is { } stated && stated.Unit.Quantity == quantity) return stated;
        if (quantity == SpectralQuantity.Wavelength)
        {
            var (low, high) = Ends(pixels, length);
            return (WavelengthGuess.Unit(low, high), "the size of the values");
        }
        return (DefaultUnit(quantity), "the standard's default");
    }

    // FITS Standard 4.0, table 25: SI units.
    private static SpectralUnit DefaultUnit(SpectralQuantity quantity) => quantity switch
    {
        SpectralQuantity.Wavenumber => new(quantity, 0.01),
        SpectralQuantity.Energy => SpectralUnit.Parse("J")!.Value,
        _ => new(quantity, 1),
    };

    private static SpectralVariable Sampled(SpectralVariable variable, string code, int axis) => code switch
    {
        "" or "LOG" => variable,
        [var x, '2', _] => x switch
        {
            'F' => SpectralVariable.Freq,
            'W' => SpectralVariable.Wave,
            'V' => SpectralVariable.Velo,
            'A' => SpectralVariable.Awav,
            _ => throw Unknown(code, axis),
        },
        _ => throw Unknown(code, axis),
    };

    private static LoadException Unknown(string code, int axis) =>
        new($"keyword CTYPE{axis}", $"the algorithm code {code}", "none, LOG, TAB, GRI, GRA or one like F2W");

    private static double RestWavelength(HeaderScope header, SpectralVariable variable, int axis)
    {
        if (header.Number("RESTWAV") is { } metres && metres > 0) return metres * 1e10;
        if (header.Number("RESTFRQ", "RESTFREQ") is { } hertz && hertz > 0) return SpectralUnit.LightAngstromPerSecond / hertz;
        throw new LoadException($"keyword CTYPE{axis}", $"{variable.ToString().ToUpperInvariant()} without a rest wavelength", "RESTWAV or RESTFRQ");
    }

    private static GrismAxis Grism(HeaderScope header, int axis, SpectralVariable variable, string code, LinearPixels pixels, string why)
    {
        double[] parameters = [0, 0, 0, 1, 0, 0, 0];
        for (var i = 0; i < parameters.Length; i++)
            parameters[i] = header.Number(string.Create(CultureInfo.InvariantCulture, $"PV{axis}_{i}")) ?? parameters[i];
        var rest = SpectralScale.NeedsRest(variable) ? RestWavelength(header, variable, axis) : 1;
        return new(variable, code == "GRA", pixels, rest, parameters) { Why = why };
    }
}
