using System.Text.RegularExpressions;
using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Tables;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Finds the observations of a FITS file: which of its units hold spectra, and which of these belong together.</summary>
internal static partial class FitsLayouts
{
    /// <summary>The layouts, in the order of the rows they give.</summary>
    /// <exception cref="LoadException">Nothing is a spectrum, or the structure is ambiguous.</exception>
    /// <param name="file">The file.</param>
    /// <param name="only">Indices or names of the only units to look at; null or empty for all.</param>
    public static IReadOnlyList<Layout> Find(FitsFile file, IReadOnlyList<string>? only = null)
    {
        var tables = TableUnits.Find(file).Where(unit => unit.IsOneOf(only)).ToList();
        List<SpectrumUnit> units = tables.Count > 0 ? tables : [.. ImageUnits.Find(file).Where(unit => unit.IsOneOf(only))];
        if (units.Count == 0) throw NothingFound(file);
        var best = BestForms(units, out var aside);
        var layouts = Combine(best, file);
        return aside.Count == 0 ? layouts : [.. layouts.Select(layout => layout with { Notes = [.. layout.Notes, Aside(aside)] })];
    }

    // A coadd beside its exposures, an optimal beside a summed extraction: the better form of each arm is read.
    private static List<SpectrumUnit> BestForms(List<SpectrumUnit> units, out IReadOnlyList<SpectrumUnit> aside)
    {
        var best = units.GroupBy(static unit => unit.Arm)
            .SelectMany(static arm => arm.Where(unit => unit.Rank == arm.Min(static other => other.Rank)))
            .OrderBy(static unit => unit.Hdu.Index).ToList();
        if (best.Exists(static unit => unit.Arm.Length > 0) && units.Min(static unit => unit.Rank) < 0)
            best = [.. best.Where(static unit => unit.Rank < 0)];
        aside = [.. units.Except(best)];
        return best;
    }

    private static IReadOnlyList<Layout> Combine(List<SpectrumUnit> units, FitsFile file)
    {
        if (units.Count == 1) return [Single(units[0], file)];
        if (units.Select(static unit => unit.Arm).Distinct().Count() == units.Count) return [Arms(units, file)];
        if (AreOrders(units)) return [Orders(units, file)];
        if (AreVersions(units) || AreTargets(units)) return [.. units.Select(unit => Single(unit, file))];
        return [AreExposures(units) ? Exposures(units, file) : Covering(units, file)];
    }

    private static Layout Single(SpectrumUnit unit, FitsFile file)
    {
        var content = unit.Read();
        return new()
        {
            Spectra = content.Spectra,
            Rows = content.Rows,
            Header = ScopeOf(unit.Hdu, file),
            WavelengthHeader = content.WavelengthHdu is { } hdu ? ScopeOf(hdu, file) : null,
            Targets = content.Targets,
            Notes = content.Notes,
            ListsWavelengths = content.ListsWavelengths,
        };
    }

    private static Layout Arms(List<SpectrumUnit> units, FitsFile file)
    {
        var contents = units.Select(static unit => (unit.Arm, Content: unit.Read())).ToList();
        var rows = contents[0].Content.Rows;
        if (contents.Exists(arm => arm.Content.Rows != rows))
        {
            var counts = string.Join(", ", contents.Select(static arm => arm.Content.Rows));
            throw new LoadException(Places(units), $"{counts} rows", "as many in each arm");
        }
        return Single(units[0], file) with
        {
            Spectra = [.. contents.SelectMany(static arm => arm.Content.Labelled(arm.Arm))],
            Targets = contents[0].Content.Targets ?? TargetTable.For(units[0].Hdu, file, rows),
            Notes = [.. contents[0].Content.Notes, new("spectra", Places(units), "the arms that the names give")],
        };
    }

    private static Layout Orders(List<SpectrumUnit> units, FitsFile file) => Single(units[0], file) with
    {
        Spectra = [.. units.SelectMany(static unit => unit.Read().Labelled($"order {OrderOf(unit)}"))],
        Notes = [new("spectra", Places(units), "the orders that the headers number")],
    };

    private static bool AreOrders(List<SpectrumUnit> units) =>
        units.All(static unit => OrderOf(unit) is not null)
        && units.Select(OrderOf).Distinct().Count() == units.Count
        && units.Select(static unit => new HeaderScope([unit.Hdu.Header]).Text("SOURCEID", "SLTNAME", "OBJECT")).Distinct().Count() == 1;

    private static string? OrderOf(SpectrumUnit unit) => new HeaderScope([unit.Hdu.Header]).Text("SPORDER", "ORDER", "ECHORDER");

    private static bool AreVersions(List<SpectrumUnit> units) =>
        units.All(unit => unit.Hdu.Name.Equals(units[0].Hdu.Name, StringComparison.OrdinalIgnoreCase) && unit.Hdu.Name.Length > 0)
        && units.Select(static unit => unit.Hdu.Version).Distinct().Count() == units.Count;

    private static bool AreTargets(List<SpectrumUnit> units)
    {
        var targets = units.Select(TargetOf).ToList();
        return !targets.Contains(null) && targets.Distinct().Count() == units.Count;
    }

    private static string? TargetOf(SpectrumUnit unit) =>
        new HeaderScope([unit.Hdu.Header]).Text("OBJECT", "OBJNAME", "TARGNAME", "TARGET", "TARGETID", "SOURCEID", "SLTNAME");

    private static bool AreExposures(List<SpectrumUnit> units) => units.All(static unit => ExposurePattern().IsMatch(unit.Hdu.Name));

    private static Layout Exposures(List<SpectrumUnit> units, FitsFile file) => Single(units[0], file) with
    {
        Spectra = [.. units.SelectMany(static unit => unit.Read().Labelled(unit.Hdu.Name))],
        Notes = [new("spectra", Places(units), "the exposures that the names count")],
    };

    // A unit that covers all the others, or stands before a set of tables that differ from it but not among themselves, is their
    // sum; without one, nothing says which to take.
    private static Layout Covering(List<SpectrumUnit> units, FitsFile file)
    {
        var layouts = units.Select(unit => Single(unit, file)).ToList();
        var (low, high) = Range(layouts[0]);
        var others = layouts.Skip(1).Select(Range).ToList();
        // Several of one range are rivals; a sum reaches further than at least one of its parts.
        var covers = others.TrueForAll(range => range.Low > low * 0.999 && range.High < high * 1.001)
            && (others.Exists(range => range.Low > low * 1.001 || range.High < high * 0.999) || !AreAlike(units));
        if ((!covers && !IsFirstAmongAlike(units)) || layouts[0].Rows != 1)
            throw new LoadException(Places(units), $"{units.Count} units with spectra of equal standing", "one, or a [[load]] rule that names it");
        var sum = new ReadingNote("spectrum", units[0].Place, $"the sum of {Places(units.Skip(1))}, which are parts or exposures");
        return layouts[0] with { Notes = [.. layouts[0].Notes, sum] };
    }

    private static bool AreAlike(List<SpectrumUnit> units) =>
        units.Select(static unit => unit.Hdu is TableHdu table ? Names(table, int.MaxValue) : "").Distinct().Count() == 1;

    private static bool IsFirstAmongAlike(List<SpectrumUnit> units)
    {
        var columns = units.Select(static unit => unit.Hdu is TableHdu table ? Names(table, int.MaxValue) : "").ToList();
        return columns.Count > 2 && columns[0] != columns[1] && columns.Skip(1).Distinct().Count() == 1;
    }

    private static (double Low, double High) Range(Layout layout)
    {
        var spectrum = layout.Spectra[0];
        var sound = spectrum.Wavelength.Angstroms(0, spectrum.Flux.Length).Where(double.IsFinite).DefaultIfEmpty(0).ToList();
        return (sound.Min(), sound.Max());
    }

    /// <summary>The headers that speak of a unit.</summary>
    public static HeaderScope ScopeOf(Hdu hdu, FitsFile file) =>
        hdu.Index == 0 ? new([hdu.Header]) : new([hdu.Header, file.Hdus[0].Header]);

    private static string Places(IEnumerable<SpectrumUnit> units) => string.Join(", ", units.Select(static unit => unit.Place));

    private static ReadingNote Aside(IReadOnlyList<SpectrumUnit> aside) =>
        new("left aside", Places(aside), "other forms of the same spectrum");

    private static LoadException NothingFound(FitsFile file) =>
        file.Damage is { } damage
            ? new("file", damage.Message, "a complete FITS file")
            : new("file", Describe(file), "a spectrum: an image or a table with flux and wavelengths");

    private static string Names(TableHdu table, int most) =>
        string.Join(", ", table.Columns.Take(most).Select(static column => column.Name));

    private static string Describe(FitsFile file) => string.Join("; ", file.Hdus.Select(static hdu => hdu switch
    {
        ImageHdu { Count: > 0 } image => $"HDU {hdu.Index} {hdu.Name} image {string.Join(" x ", image.Shape)}",
        TableHdu table => $"HDU {hdu.Index} {hdu.Name} table of {table.RowCount} rows with {Names(table, 12)}",
        _ => $"HDU {hdu.Index} {hdu.Name} without data",
    }));

    [GeneratedRegex(@"^(?:exp(?:osure)?|visit|epoch|frame|night|obs|sub)[\W_]*\d+$", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex ExposurePattern();
}
