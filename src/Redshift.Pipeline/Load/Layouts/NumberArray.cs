using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>One array of numbers in a file: the same for all spectra, or one for each.</summary>
internal abstract class NumberArray
{
    /// <summary>Where it is, in the words of a load rule: <c>HDU 1 column FLUX</c>, <c>HDU 0 row 2</c>.</summary>
    public required string Place { get; init; }

    /// <summary>What the file says of it.</summary>
    public required Label Label { get; init; }

    /// <summary>Number of values of one spectrum.</summary>
    public abstract int Length { get; }

    /// <summary>Number of spectra; 1 where all share the array.</summary>
    public abstract int Rows { get; }

    /// <summary>The values of one spectrum; the caller owns the array.</summary>
    public abstract double[] Read(int row);
}
