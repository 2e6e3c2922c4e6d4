using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>A column of logical values or bits as zeros and ones: a cell for each pixel, or a cell with all pixels of a spectrum.</summary>
/// <param name="column">The column.</param>
/// <param name="length">Pixels of a spectrum.</param>
/// <param name="rows">Number of spectra; null where each pixel has a row.</param>
internal sealed class FlagArray(TableColumn column, int length, int? rows) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => length;

    /// <inheritdoc/>
    public override int Rows => rows ?? 1;

    /// <inheritdoc/>
    public override double[] Read(int row) => rows is null
        ? [.. Enumerable.Range(0, length).Select(pixel => Cell(pixel).Any(static flag => flag) ? 1.0 : 0)]
        : [.. Cell(row).Select(static flag => flag ? 1.0 : 0)];

    private IEnumerable<bool> Cell(int row) => column.Type == ColumnType.Bit
        ? column.ReadBits(row)
        : column.ReadLogicals(row).Select(static flag => flag == true);
}
