using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Tables;

/// <summary>Wavelengths of a vector cell from two scalar columns of its row: the first wavelength and the step.</summary>
internal sealed class StepWavelengths(TableColumn first, TableColumn step, int hdu) : WavelengthSource
{
    /// <inheritdoc/>
    public override string Place => $"HDU {hdu} column {first.Name}";

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

    private SpectralUnit? Stated => SpectralUnit.Parse(first.Unit ?? "");

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count)
    {
        var unit = Stated ?? SpectralUnit.Angstrom;
        var pixels = new LinearPixels(0, first.ReadDoubles(row)[0], step.ReadDoubles(row)[0]);
        var wavelengths = new double[count];
        for (var i = 0; i < count; i++) wavelengths[i] = unit.ToAngstrom(pixels.At(i));
        return wavelengths;
    }
}
