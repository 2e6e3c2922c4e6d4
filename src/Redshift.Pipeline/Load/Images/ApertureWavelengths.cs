using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Wavelengths of a stack whose rows have a dispersion each.</summary>
internal sealed class ApertureWavelengths(IReadOnlyList<ApertureAxis> axes, int hdu) : WavelengthSource
{
    /// <inheritdoc/>
    public override string Place => $"HDU {hdu} axis";

    /// <summary>The order of a row.</summary>
    public string OrderLabel(int row) => $"order {axes[row].Beam}";

    /// <inheritdoc/>
    public override string Why => axes[0].Why;

    /// <inheritdoc/>
    public override string? Unit => null;

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => null;

    /// <inheritdoc/>
    public override bool IsShared => false;

    /// <inheritdoc/>
    public override bool IsUnitAssumed => false;

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count) => axes[row].Wavelengths(count);
}
