using Redshift.Pipeline.Report.Formats;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report.Formats;

public sealed class VoTableFormatTests : IDisposable
{
    private const string Compare = """
        import csv, sys, warnings
        import numpy as np
        from astropy.io import votable
        from astropy.units import UnitsWarning
        # VOUnits would rather have 0.1nm than Angstrom; observers would not.
        warnings.simplefilter('error')
        warnings.simplefilter('ignore', UnitsWarning)
        with open(sys.argv[1]) as file: rows = list(csv.reader(file))
        file = votable.parse(sys.argv[2], verify='exception')
        table = file.get_first_table()
        print(file.version, table.name, len(table.array), '|', table.description)
        assert len(rows) - 1 == len(table.array)
        for i, row in enumerate(rows[1:]):
            for j, text in enumerate(row):
                value = table.array[i][j]
                if isinstance(value, str): same = value == text
                elif text == '': same = value is np.ma.masked or np.isnan(value)
                else: same = value == float(text)
                if not same: print(rows[0][j], repr(text), repr(value))
        for name in sys.argv[3:]:
            field = table.get_field_by_id_or_name(name)
            print(field.name, field.datatype, field.arraysize, field.unit, field.ucd, '|', field.description)
        """;

    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [AstropyFact]
    public void Catalogue_is_valid_and_holds_the_values_of_the_csv() => Assert.Equal(
        """
        1.4 catalogue 3 | Redshifts, one row a spectrum
        source char * None meta.id;meta.file | File below the common parent of all inputs
        velocity_km_s double None km / s spect.dopplerVeloc.opt | c times z
        lines_matched int None None meta.number;spect.line | How many of these were found
        Z_2 char * None meta.note | Header card Z as it stands in the file

        """,
        Judge(Tables.Catalogue(), "source", "velocity_km_s", "lines_matched", "Z_2"));

    [AstropyFact]
    public void Lines_are_valid_and_hold_the_values_of_the_csv() =>
        Assert.Equal("1.4 lines 2 | Lines, one row a line\n", Judge(Tables.Lines()));

    [AstropyFact]
    public void A_table_without_rows_is_valid() =>
        Assert.Equal("1.4 catalogue 0 | Redshifts, one row a spectrum\n", Judge(Tables.Catalogue([])));

    private string Judge<TRow>(Table<TRow> table, params string[] fields)
    {
        var (csv, xml) = (_folder.File("table.csv"), _folder.File("table.vot"));
        TableFormats.Write(table, "csv", csv);
        TableFormats.Write(table, "votable", xml);
        return ExternalTool.RunPython(Compare, [csv, xml, .. fields]);
    }
}
