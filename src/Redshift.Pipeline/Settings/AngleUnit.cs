namespace Redshift.Pipeline.Settings;

/// <summary>Unit of a position on the sky that is written as a plain number.</summary>
public enum AngleUnit
{
    /// <summary>Degrees.</summary>
    Degree,

    /// <summary>Right ascension in hours, declination in degrees.</summary>
    Hour,

    /// <summary>Radians.</summary>
    Radian,
}
