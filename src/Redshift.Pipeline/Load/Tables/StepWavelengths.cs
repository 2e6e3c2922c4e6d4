using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>Wavelengths of a vector cell from two scalar columns of its row: the first wavelength and the step.</summary>
/// <param name="first">Column with the first wavelength.</param>
/// <param name="step">Column with the step.</param>
/// <param name="unit">The unit that the pipeline file states; null for that of the column.</param>
internal sealed class StepWavelengths(TableColumn first, TableColumn step, SpectralUnit? unit = null) : WavelengthSource
{
    /// <inheritdoc/>
    public override string Place => TableUnits.PlaceOf(first);

    /// <summary>Place of the step.</summary>
    public string StepPlace => TableUnits.PlaceOf(step);

    /// <inheritdoc/>
    public override string Why => $"first wavelength, with the step in {step.Name}";

    /// <inheritdoc/>
    public override string Unit => (Stated ?? SpectralUnit.Angstrom).ToString();

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => null;

    /// <inheritdoc/>
    public override bool IsShared => false;

    /// <inheritdoc/>
    public override bool IsUnitAssumed => Stated is null;

    private SpectralUnit? Stated => unit ?? SpectralUnit.Parse(first.Unit ?? "");

    /// <inheritdoc/>
    public override WavelengthSource In(SpectralUnit unit, HeaderScope header) => new StepWavelengths(first, step, unit);

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count)
    {
        var own = Stated ?? SpectralUnit.Angstrom;
        var pixels = new LinearPixels(0, first.ReadDoubles(row)[0], step.ReadDoubles(row)[0]);
        var wavelengths = new double[count];
        for (var i = 0; i < count; i++) wavelengths[i] = own.ToAngstrom(pixels.At(i));
        return wavelengths;
    }
}
