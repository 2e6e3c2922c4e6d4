namespace Redshift.Pipeline.Load.Assembly;

/// <summary>Pixels of a file in the order in which their vacuum wavelengths strictly increase.</summary>
/// <param name="vacuum">Their vacuum wavelengths in Å.</param>
/// <param name="pixels">Their places in the file's arrays; null where the order is the file's own and complete.</param>
internal sealed class GridRun(double[] vacuum, int[]? pixels)
{
    /// <summary>Vacuum wavelengths in Å, shared by all spectra on this grid.</summary>
    public double[] Vacuum => vacuum;

    /// <summary>The values of these pixels; the given array itself where nothing changes.</summary>
    public T[] Take<T>(T[] values)
    {
        if (pixels is null) return values;
        var taken = new T[pixels.Length];
        for (var i = 0; i < taken.Length; i++) taken[i] = values[pixels[i]];
        return taken;
    }
}
