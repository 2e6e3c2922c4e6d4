using System.Globalization;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Gas of a galaxy that happens to lie in front of a quasar: its resonance lines stand at a smaller redshift than the quasar's own lines,
/// and alone they would pass for a galaxy behind its own gas.
/// </summary>
/// <param name="LnShift">ln(1+z) of the gas.</param>
internal sealed record InterveningGas(double LnShift)
{
    /// <summary>
    /// ln of the chance of such a system within a search cell: some tenths of strong Mg II or C IV systems a unit of redshift
    /// (common practice), some thousand cells a unit.
    /// </summary>
    private const double LnChance = -8;

    /// <summary>What the gas lets pass of a featureless spectrum.</summary>
    public static Template Transmission { get; } = new("gas", ObjectKind.Unknown, Compute());

    /// <summary>The model as seen through the gas.</summary>
    public FitModel Before(FitModel quasar) => quasar with
    {
        Name = string.Create(CultureInfo.InvariantCulture, $"{quasar.Name}, behind gas at z {Math.Exp(LnShift) - 1:F4}"),
        Gas = this,
        LnPrior = quasar.LnPrior + LnChance,
    };

    private static float[] Compute()
    {
        var flux = new float[TemplateGrid.Count];
        Array.Fill(flux, 1f);
        InterstellarAbsorption.Apply(flux, 1, 0);
        return flux;
    }
}
