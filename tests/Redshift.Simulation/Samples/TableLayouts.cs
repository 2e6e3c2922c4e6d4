using Redshift.Fits;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Samples;

/// <summary>Spectra as FITS tables.</summary>
internal static class TableLayouts
{
    /// <summary>One pixel a row: log10 of the vacuum wavelength, flux, inverse variance, mask.</summary>
    public static void PixelARow(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var writer = new FitsWriter(stream);
        writer.WriteHeader("", cards);
        writer.WriteTable("SPECTRUM", spectrum.Flux.Length,
        [
            ColumnDefinition.Singles("LOGLAM", [.. spectrum.Wavelength.Select(value => (float)Math.Log10(value))]) with { Unit = "log10(Angstrom)" },
            ColumnDefinition.Singles("FLUX", ImageLayouts.Floats(spectrum.Flux)) with { Unit = "1e-17 erg/s/cm2/Angstrom" },
            ColumnDefinition.Singles("IVAR", ImageLayouts.Floats(spectrum.InverseVariance!)),
            ColumnDefinition.Int16s("MASK", Mask(spectrum)) with { Comment = "non-zero is bad" },
        ]);
    }

    /// <summary>One row whose cells hold the whole spectrum; wavelengths in vacuum nanometres.</summary>
    public static void VectorCells(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var count = spectrum.Flux.Length;
        var writer = new FitsWriter(stream);
        writer.WriteHeader("", cards);
        writer.WriteTable("SPECTRUM", 1,
        [
            ColumnDefinition.Doubles("WAVE", [.. spectrum.Wavelength.Select(value => Math.Round(value / 10, 6))], count) with { Unit = "nm", Ucd = "em.wl" },
            ColumnDefinition.Singles("FLUX", ImageLayouts.Floats(spectrum.Flux), count) with { Unit = "erg/s/cm2/Angstrom", Ucd = "phot.flux.density;em.wl" },
            ColumnDefinition.Singles("ERR", ImageLayouts.Errors(spectrum), count) with { Unit = "erg/s/cm2/Angstrom", Ucd = "stat.error;phot.flux.density;em.wl" },
        ]);
    }

    /// <summary>One echelle order a row, in air.</summary>
    public static void Orders(Stream stream, IReadOnlyList<SimulatedSpectrum> orders, IEnumerable<Card> cards)
    {
        var count = orders.Max(order => order.Flux.Length);
        var writer = new FitsWriter(stream);
        writer.WriteHeader("", cards);
        writer.WriteTable("ORDERS", orders.Count,
        [
            ColumnDefinition.Int32s("ORDER", row => int.Parse(orders[(int)row].Label.AsSpan(6), System.Globalization.CultureInfo.InvariantCulture)),
            ColumnDefinition.Doubles("WAVELENGTH", count, row => Padded([.. orders[(int)row].Wavelength.Select(value => Math.Round(Air.FromVacuum(value), 5))], count, double.NaN)) with { Unit = "Angstrom" },
            ColumnDefinition.Singles("FLUX", count, row => Padded(ImageLayouts.Floats(orders[(int)row].Flux), count, float.NaN)) with { Unit = "adu" },
            ColumnDefinition.Singles("ERROR", count, row => Padded(ImageLayouts.Errors(orders[(int)row]), count, float.NaN)) with { Unit = "adu" },
        ],
        [Card.Of("AIRORVAC", "air")]);
    }

    /// <summary>Three arms, each with its own images; one object a row.</summary>
    public static void Arms(Stream stream, IReadOnlyList<SimulatedObservation> objects, IReadOnlyList<string> targets, IEnumerable<Card> cards)
    {
        var writer = new FitsWriter(stream);
        writer.WriteHeader("", cards);
        writer.WriteTable("TARGETS", objects.Count, [ColumnDefinition.Int64s("TARGETID", row => 7100 + row), ColumnDefinition.Strings("NAME", targets)]);
        for (var arm = 0; arm < objects[0].Spectra.Count; arm++)
            Arm(writer, [.. objects.Select(o => o.Spectra[arm])]);
    }

    private static void Arm(FitsWriter writer, SimulatedSpectrum[] rows)
    {
        var (label, count) = (rows[0].Label, rows[0].Flux.Length);
        long[] shape = [count, rows.Length];
        writer.WriteImage($"{label}_WAVELENGTH", [.. rows[0].Wavelength.Select(value => Math.Round(value, 6))], [count], [Card.Of("BUNIT", "Angstrom"), Card.Of("AIRORVAC", "vac")]);
        writer.WriteImage($"{label}_FLUX", [.. rows.SelectMany(row => ImageLayouts.Floats(row.Flux))], shape, [Card.Of("BUNIT", "1e-17 erg/s/cm2/Angstrom")]);
        writer.WriteImage($"{label}_IVAR", [.. rows.SelectMany(row => ImageLayouts.Floats(row.InverseVariance!))], shape);
        writer.WriteImage($"{label}_MASK", [.. rows.SelectMany(Mask)], shape);
    }

    private static short[] Mask(SimulatedSpectrum spectrum) => Array.ConvertAll(spectrum.InverseVariance!, value => (short)(value > 0 ? 0 : 4));

    private static T[] Padded<T>(T[] values, int count, T filling) => [.. values, .. Enumerable.Repeat(filling, count - values.Length)];
}
