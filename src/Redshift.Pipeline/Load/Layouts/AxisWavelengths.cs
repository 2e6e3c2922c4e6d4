using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Wavelengths computed from a header.</summary>
/// <param name="axis">The axis.</param>
/// <param name="hdu">Index of the unit.</param>
/// <param name="number">1-based number of the axis.</param>
internal sealed class AxisWavelengths(PixelAxis axis, int hdu, int number = 1) : WavelengthSource
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
    public override WavelengthSource In(SpectralUnit unit, HeaderScope header) => AxisReader.LinearPart(header, number) is { } pixels
        ? new AxisWavelengths(new LinearAxis(pixels, unit, axis.Medium) { Why = "the unit of the pipeline file" }, hdu, number)
        : base.In(unit, header);

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count) => axis.Wavelengths(count);
}
