using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Wavelengths that stand in the file, value by value.</summary>
internal sealed class ArrayWavelengths : WavelengthSource
{
    private readonly NumberArray _array;
    private readonly SpectralUnit? _stated;
    private SpectralUnit? _judged;

    /// <summary>Takes the unit from the array's label.</summary>
    /// <param name="array">The values.</param>
    /// <param name="unit">The unit, overriding the label's.</param>
    public ArrayWavelengths(NumberArray array, SpectralUnit? unit = null)
    {
        _array = array;
        _stated = unit ?? UnitOf(array.Label);
    }

    /// <inheritdoc/>
    public override string Place => _array.Place;

    /// <inheritdoc/>
    public override string Why => _stated is null ? $"unit {Judged} judged by the size of the values" : $"unit {Unit}";

    /// <inheritdoc/>
    public override string Unit => Suited(_array.Read(0)).ToString();

    /// <inheritdoc/>
    public override WavelengthMedium? Medium => MediumOf(_array.Label);

    /// <inheritdoc/>
    public override bool IsShared => _array.Rows == 1;

    /// <inheritdoc/>
    public override bool IsUnitAssumed =>
        _stated is null && Judged is not { Quantity: SpectralQuantity.Wavelength, Factor: 1, Scale: AxisScale.Linear };

    /// <inheritdoc/>
    public override WavelengthSource In(SpectralUnit unit, HeaderScope header) => new ArrayWavelengths(_array, unit);

    private SpectralUnit Judged => _judged ??= Judge();

    /// <inheritdoc/>
    public override double[] Angstroms(int row, int count)
    {
        var values = _array.Read(row);
        var unit = Suited(values);
        for (var i = 0; i < values.Length; i++)
            values[i] = double.IsFinite(values[i]) && (values[i] > 0 || unit.Scale != AxisScale.Linear)
                ? unit.ToAngstrom(values[i])
                : double.NaN;
        return values;
    }

    // The label of a column "log" with unit Angstrom means the logarithm; so do numbers between 3 and 4.7 in angstroms.
    private SpectralUnit Suited(double[] values)
    {
        if (_stated is { } unit and not { Quantity: SpectralQuantity.Wavelength, Factor: 1, Scale: AxisScale.Linear }) return unit;
        if (_stated is not { } angstrom) return Judged;
        var (low, high) = Range(values);
        return WavelengthGuess.LooksLogarithmic(low, high) ? angstrom.On(AxisScale.Log10) : angstrom;
    }

    private SpectralUnit Judge()
    {
        var (low, high) = Range(_array.Read(0));
        return WavelengthGuess.Unit(low, high);
    }

    private static (double Low, double High) Range(double[] values)
    {
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        foreach (var value in values)
        {
            if (!(value > 0) || !double.IsFinite(value)) continue;
            low = Math.Min(low, value);
            high = Math.Max(high, value);
        }
        return (low, high);
    }

    private static SpectralUnit? UnitOf(Label label)
    {
        var logarithmic = label.Words.Any(static word => word.BeginsWithAny("log"));
        var unit = SpectralUnit.Parse(label.Unit) ?? (logarithmic ? SpectralUnit.Angstrom : UnitInName(label));
        return unit is { Scale: AxisScale.Linear } plain && logarithmic ? plain.On(AxisScale.Log10) : unit;
    }

    private static SpectralUnit? UnitInName(Label label)
    {
        foreach (var word in label.Words)
            if (word.Length > 1 && SpectralUnit.Parse(word) is { } unit) return unit;
        return null;
    }

    // The Virtual Observatory marks air with obs.atmos; AWAV is the standard's name for it.
    private static WavelengthMedium? MediumOf(Label label)
    {
        if (label.Words.Any(static word => word is "awav" or "air" or "airwave" or "waveair")) return WavelengthMedium.Air;
        if (label.Words.Any(static word => word is "vac" or "vacuum" or "vacwave" or "wavevac")) return WavelengthMedium.Vacuum;
        if (label.Ucd.ContainsAny("obs.atmos")) return WavelengthMedium.Air;
        var remark = label.Comment + " " + label.Unit;
        if (remark.ContainsAny("vacuum")) return WavelengthMedium.Vacuum;
        return remark.ContainsAny("in air", "air wavelength")
            ? WavelengthMedium.Air
            : null;
    }
}
