using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>A column of a table with one pixel a row.</summary>
internal sealed class ColumnArray(TableColumn column, int length) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => length;

    /// <inheritdoc/>
    public override int Rows => 1;

    /// <inheritdoc/>
    public override double[] Read(int row) => column.ReadColumn();
}
