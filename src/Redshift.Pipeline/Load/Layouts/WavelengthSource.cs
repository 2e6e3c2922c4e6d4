using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Where the wavelengths of a spectrum come from.</summary>
internal abstract class WavelengthSource
{
    /// <summary>Where it is, in the words of a load rule.</summary>
    public abstract string Place { get; }

    /// <summary>How it was read.</summary>
    public abstract string Why { get; }

    /// <summary>The unit as a load rule states it; null where the description leaves no choice.</summary>
    public abstract string? Unit { get; }

    /// <summary>The medium where the coordinate itself states it.</summary>
    public abstract WavelengthMedium? Medium { get; }

    /// <summary>Whether all spectra share the wavelengths.</summary>
    public abstract bool IsShared { get; }

    /// <summary>Whether the unit was judged by size.</summary>
    public abstract bool IsUnitAssumed { get; }

    /// <summary>The same values in a unit that the pipeline file states.</summary>
    /// <exception cref="LoadException">They come from a description that leaves no choice of unit.</exception>
    public virtual WavelengthSource In(SpectralUnit unit, HeaderScope header) =>
        throw new LoadException("pipeline file, wavelength_unit", unit.ToString(), $"no unit for {Place}, which has its own");

    /// <summary>Wavelengths in Å of the file's medium.</summary>
    /// <param name="row">Which spectrum.</param>
    /// <param name="count">Number of pixels of the flux.</param>
    public abstract double[] Angstroms(int row, int count);
}
