namespace Redshift.Simulation;

/// <summary>What a simulated object really is.</summary>
public enum TruthKind
{
    /// <summary>Nothing but noise and remains of the sky.</summary>
    Blank,

    /// <summary>A star of our Galaxy.</summary>
    Star,

    /// <summary>A galaxy, narrow-line active nuclei included.</summary>
    Galaxy,

    /// <summary>An active nucleus with broad lines.</summary>
    Quasar,

    /// <summary>Ionised gas of our Galaxy.</summary>
    Nebula,

    /// <summary>An object that no model explains: supernova, blazar; or comet, at redshift 0.</summary>
    Oddity,
}

/// <summary>One object as an instrument saw it, with the truth.</summary>
/// <param name="Name">Unique within a seed.</param>
/// <param name="Kind">What it is.</param>
/// <param name="Z">Redshift as the wavelengths should give it; null where there is none.</param>
/// <param name="ObjectClass">Finer class, e.g. <c>star-m</c>.</param>
/// <param name="Setup">The set-up's name.</param>
/// <param name="MedianSnr">True median signal to noise a pixel.</param>
/// <param name="Spectra">One a spectrograph arm.</param>
public sealed record SimulatedObservation(
    string Name, TruthKind Kind, double? Z, string ObjectClass, string Setup, double MedianSnr, IReadOnlyList<SimulatedSpectrum> Spectra);

/// <summary>One spectrum; arrays have one element a pixel.</summary>
/// <param name="Label">The arm's name, empty where there is only one.</param>
/// <param name="Wavelength">Vacuum wavelength, Å, increasing.</param>
/// <param name="Flux">Flux density per Å in an arbitrary unit.</param>
/// <param name="InverseVariance">As the instrument's own reduction would state it, 0 where unusable; null where it states nothing.</param>
/// <param name="FwhmKmS">Instrumental width where the instrument states it.</param>
/// <param name="AirSampled">Whether the pixels are regular in air wavelength.</param>
public sealed record SimulatedSpectrum(
    string Label, double[] Wavelength, double[] Flux, double[]? InverseVariance, float[]? FwhmKmS, bool AirSampled);
