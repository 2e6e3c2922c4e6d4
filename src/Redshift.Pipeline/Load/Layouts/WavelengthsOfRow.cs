using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>The wavelengths of one row of many, for an order or an arm of a single object.</summary>
internal sealed class WavelengthsOfRow(WavelengthSource all, int fixedRow) : WavelengthSource
{
    /// <inheritdoc/>
    public override string Place => all.Place;

    /// <inheritdoc/>
    public override string Why => all.Why;

    /// <inheritdoc/>
    public override string? Unit => all.Unit;

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => all.Medium;

    /// <inheritdoc/>
    public override bool IsShared => true;

    /// <inheritdoc/>
    public override bool IsUnitAssumed => all.IsUnitAssumed;

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count) => all.Angstroms(fixedRow, count);
}
