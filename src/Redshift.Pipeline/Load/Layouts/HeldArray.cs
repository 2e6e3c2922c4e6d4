namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Values that are in memory already, such as a column of a text file.</summary>
internal sealed class HeldArray(double[] values) : NumberArray
{
    /// <inheritdoc/>
    public override int Length => values.Length;

    /// <inheritdoc/>
    public override int Rows => 1;

    /// <inheritdoc/>
    public override double[] Read(int row) => [.. values];
}
