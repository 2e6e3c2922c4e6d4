using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Formats;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Tests.Report.Formats;

/// <summary>Tables with every column filled in one row and nearly none in another, and with awkward names and texts.</summary>
internal static class Tables
{
    // Header cards with blanks in the name, and with the name of a column of ours in capitals.
    private static readonly string[] Keep = ["AIRMASS", "ESO TEL AIRM START", "Z"];

    public static Table<ObservationResult> Catalogue() => Catalogue([Examples.Full(), Examples.Nothing(), Awkward()]);

    public static Table<ObservationResult> Catalogue(IEnumerable<ObservationResult> rows) =>
        new("catalogue", "Redshifts, one row a spectrum", CatalogueColumns.With(Keep), rows);

    public static Table<LineRow> Lines() => new(
        "lines", "Lines, one row a line", LineColumns.All,
        [new(Examples.Observation(), Examples.HAlpha()), new(Examples.Observation(row: 7), Examples.HAlpha() with { Flux = null, Line = "[O III] 5007" })]);

    private static ObservationResult Awkward() => Examples.Full() with
    {
        Observation = Examples.Observation("a & <b>/\"c\".fits") with { Target = "=1+1, \u00e9\u0007", Kept = [new("Z", "5 > 4")] },
        Z = -0.00000001,
        Resolution = double.NaN,
    };
}
