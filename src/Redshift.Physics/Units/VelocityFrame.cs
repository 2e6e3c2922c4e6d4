namespace Redshift.Physics.Units;

/// <summary>The frame of rest to which the wavelengths of a spectrum refer (FITS Standard 4.0 §8.4, SPECSYS).</summary>
public enum VelocityFrame
{
    /// <summary>Not stated by the file.</summary>
    Unknown,

    /// <summary>The observatory, as observed.</summary>
    Topocentric,

    /// <summary>Corrected to the barycentre of the solar system.</summary>
    Barycentric,

    /// <summary>Corrected to the centre of the Sun.</summary>
    Heliocentric,

    /// <summary>The kinematic local standard of rest.</summary>
    LocalStandardOfRest,

    /// <summary>The frame of the object itself: a known redshift has already been taken out.</summary>
    Rest,
}
