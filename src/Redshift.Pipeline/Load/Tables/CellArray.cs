using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>A column of a table with one spectrum a row, each cell a vector.</summary>
internal sealed class CellArray(TableColumn column, int length, int rows) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => length;

    /// <inheritdoc/>
    public override int Rows => rows;

    /// <inheritdoc/>
    public override double[] Read(int row) => column.ReadDoubles(row);
}
