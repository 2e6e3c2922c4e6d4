using System.Globalization;
using Parquet;
using Parquet.Schema;

namespace Redshift.Pipeline.Report.Formats;

/// <summary>One column of a Parquet file; unknown values are null.</summary>
internal abstract class ParquetColumn(DataField field)
{
    /// <summary>Name and type.</summary>
    public DataField Field { get; } = field;

    /// <summary>Makes a column.</summary>
    public static ParquetColumn Create(string name, CellType type) => type switch
    {
        CellType.Whole => new Numbers<int>(name),
        CellType.Real => new Numbers<double>(name),
        _ => new Texts(name),
    };

    /// <summary>Writes the cells of a group of rows.</summary>
    public abstract Task WriteAsync(ParquetRowGroupWriter group, string[] cells);

    private sealed class Numbers<T>(string name) : ParquetColumn(new DataField<T?>(name))
        where T : struct, IParsable<T>
    {
        public override async Task WriteAsync(ParquetRowGroupWriter group, string[] cells)
        {
            T?[] values = Array.ConvertAll(cells, cell => cell.Length == 0 ? (T?)null : T.Parse(cell, CultureInfo.InvariantCulture));
            await group.WriteAsync<T>(Field, values.AsMemory()).ConfigureAwait(false);
        }
    }

    private sealed class Texts(string name) : ParquetColumn(new DataField<string>(name))
    {
        public override async Task WriteAsync(ParquetRowGroupWriter group, string[] cells) =>
            await group.WriteAsync(Field, Array.ConvertAll(cells, cell => cell.Length == 0 ? null! : cell)).ConfigureAwait(false);
    }
}
