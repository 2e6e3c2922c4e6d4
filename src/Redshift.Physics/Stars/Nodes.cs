namespace Redshift.Physics.Stars;

/// <summary>
/// Coarse wavelengths at which slowly varying quantities of a star are tabulated: continuous opacity, continuum flux, depth of strong
/// lines.
/// </summary>
internal static class Nodes
{
    public const int Count = 520;
    private const double Step = 0.0068;
    private static readonly double First = Math.Log(800);

    /// <summary>Vacuum wavelength of a node in Å.</summary>
    public static double Wavelength(int node) => Math.Exp(First + (node * Step));

    /// <summary>Place of ln λ (vacuum, Å) between nodes.</summary>
    public static double Place(double lnWavelength) => Math.Clamp((lnWavelength - First) / Step, 0, Count - 1.001);

    /// <summary>Value at a place, linear between nodes.</summary>
    public static double At(double[] values, double place)
    {
        var node = (int)place;
        return values[node] + ((place - node) * (values[node + 1] - values[node]));
    }
}
