using System.Globalization;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class CellTypeTests
{
    [Fact]
    public void Catalogue_cells_are_of_the_type_of_their_column() => Check(CatalogueColumns.With(["AIRMASS"]), Examples.Full());

    [Fact]
    public void Line_cells_are_of_the_type_of_their_column() =>
        Check(LineColumns.All, new LineRow(Examples.Observation(), Examples.HAlpha()));

    [Fact]
    public void Candidate_cells_are_of_the_type_of_their_column() =>
        Check(CandidateColumns.All, new Candidate(ObjectKind.Galaxy, 0.1, 0.01, "old stars", 3, 0.5));

    private static void Check<TRow>(IReadOnlyList<Column<TRow>> columns, TRow row)
    {
        var filled = columns.Where(column => column.Value(row).Text.Length > 0).ToList();
        Assert.True(filled.Count > 5);
        Assert.All(filled, column => Assert.Equal(column.Type, TypeOf(column.Value(row))));
    }

    private static CellType TypeOf(Cell cell)
    {
        if (!cell.IsNumber)
            return CellType.Text;
        return long.TryParse(cell.Text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out _) ? CellType.Whole : CellType.Real;
    }
}
