using System.Diagnostics.CodeAnalysis;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>An array under another label, where the unit stands elsewhere in the file.</summary>
internal sealed class Relabelled : NumberArray
{
    private readonly NumberArray _array;

    /// <summary>Gives an array a label.</summary>
    [SetsRequiredMembers]
    public Relabelled(NumberArray array, Label label)
    {
        _array = array;
        Place = array.Place;
        Label = label;
    }

    /// <inheritdoc/>
    public override int Length => _array.Length;

    /// <inheritdoc/>
    public override int Rows => _array.Rows;

    /// <inheritdoc/>
    public override double[] Read(int row) => _array.Read(row);
}
