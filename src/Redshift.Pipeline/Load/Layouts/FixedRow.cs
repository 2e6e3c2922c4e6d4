using System.Diagnostics.CodeAnalysis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>One row of an array of many: an order or an arm of a single object.</summary>
internal sealed class FixedRow : NumberArray
{
    private readonly NumberArray _all;
    private readonly int _row;

    /// <summary>Takes a row; arrays that all share stay what they are.</summary>
    [SetsRequiredMembers]
    public FixedRow(NumberArray all, int row)
    {
        _all = all;
        _row = all.Rows == 1 ? 0 : row;
        Place = all.Place;
        Label = all.Label;
    }

    /// <inheritdoc/>
    public override int Length => _all.Length;

    /// <inheritdoc/>
    public override int Rows => 1;

    /// <inheritdoc/>
    public override double[] Read(int row) => _all.Read(_row);
}
