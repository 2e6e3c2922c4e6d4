using System.Globalization;
using System.Xml.Linq;
using ParquetSharp;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Formats;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report.Formats;

public sealed class ParquetFormatTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Catalogue_is_read_by_Arrow_with_the_values_of_the_csv() => Check(Tables.Catalogue());

    [Fact]
    public void Lines_are_read_by_Arrow_with_the_values_of_the_csv() => Check(Tables.Lines());

    [Fact]
    public void A_table_of_several_groups_is_read_by_Arrow()
    {
        const int rows = 25_000;
        Redshift.Pipeline.Report.Column<int>[] columns =
        [
            new("n", "", "", "", CellType.Whole, n => n % 7 == 0 ? Cell.Empty : Cell.Of(n)),
            new("x", "", "", "", CellType.Real, n => Cell.Fixed(n / 8.0, 3)),
            new("t", "", "", "", CellType.Text, n => Cell.Of(n % 3 == 0 ? "" : $"t{n}")),
        ];
        Check(new Table<int>("numbers", "", columns, Enumerable.Range(0, rows)));
    }

    [Fact]
    public void Units_and_meanings_go_along()
    {
        using var reader = new ParquetFileReader(Write(Tables.Catalogue()));
        var metadata = reader.FileMetaData.KeyValueMetadata;
        var field = XDocument.Parse(metadata["IVOA.VOTable-Parquet.content"]).Descendants()
            .Single(element => (string?)element.Attribute("name") == "velocity_km_s");

        Assert.Equal("1.0", metadata["IVOA.VOTable-Parquet.version"]);
        Assert.Equal(("km/s", "double", "c times z"), ((string?)field.Attribute("unit"), (string?)field.Attribute("datatype"), field.Value));
    }

    private void Check<TRow>(Table<TRow> table)
    {
        using var reader = new ParquetFileReader(Write(table));
        for (var i = 0; i < table.Columns.Count; i++)
            Assert.Equal(table.Rows.Select(row => Typed(table.Columns[i], row)), Enumerable.Range(0, reader.FileMetaData.NumRowGroups).SelectMany(group => Read(reader, group, i)));
    }

    private static object? Typed<TRow>(Redshift.Pipeline.Report.Column<TRow> column, TRow row) => column.Value(row).Text switch
    {
        "" => null,
        var text when column.Type == CellType.Whole => int.Parse(text, CultureInfo.InvariantCulture),
        var text when column.Type == CellType.Real => double.Parse(text, CultureInfo.InvariantCulture),
        var text => text,
    };

    private static object?[] Read(ParquetFileReader reader, int number, int column)
    {
        using var group = reader.RowGroup(number);
        using var values = group.Column(column);
        var rows = checked((int)group.MetaData.NumRows);
        return values.LogicalReader() switch
        {
            LogicalColumnReader<int?> whole => Array.ConvertAll(whole.ReadAll(rows), value => (object?)value),
            LogicalColumnReader<double?> real => Array.ConvertAll(real.ReadAll(rows), value => (object?)value),
            LogicalColumnReader<string> text => text.ReadAll(rows),
            var other => throw new InvalidOperationException($"a column read by {other}"),
        };
    }

    private string Write<TRow>(Table<TRow> table)
    {
        var path = _folder.File(table.Name + ".parquet");
        TableFormats.Write(table, "parquet", path);
        return path;
    }
}
