using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Wavelengths computed from a header.</summary>
internal sealed class AxisWavelengths(PixelAxis axis, int hdu) : WavelengthSource
{
    /// <inheritdoc/>
    public override string Place => $"HDU {hdu} axis";

    /// <inheritdoc/>
    public override string Why => axis.Why;

    /// <inheritdoc/>
    public override string? Unit => axis.Unit;

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => axis.Medium;

    /// <inheritdoc/>
    public override bool IsShared => true;

    /// <inheritdoc/>
    public override bool IsUnitAssumed => axis.Why == LegacyAxis.GuessedWhy && axis.Unit != SpectralUnit.Angstrom.ToString();

    /// <inheritdoc/>
    public override WavelengthSource In(SpectralUnit unit, HeaderScope header) => AxisReader.LinearPart(header, 1) is { } pixels
        ? new AxisWavelengths(new LinearAxis(pixels, unit, axis.Medium) { Why = "the unit of the pipeline file" }, hdu)
        : base.In(unit, header);

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count) => axis.Wavelengths(count);
}
