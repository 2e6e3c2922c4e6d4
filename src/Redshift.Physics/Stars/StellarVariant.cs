namespace Redshift.Physics.Stars;

/// <summary>What sets a computed star apart from a normal stellar atmosphere.</summary>
public enum StellarVariant
{
    /// <summary>A normal atmosphere of scaled solar composition.</summary>
    Normal,

    /// <summary>A white dwarf with an atmosphere of pure hydrogen.</summary>
    WhiteDwarfDA,

    /// <summary>A white dwarf with an atmosphere of helium: He I lines, no hydrogen.</summary>
    WhiteDwarfDB,

    /// <summary>A hot star with a disc: Balmer lines in emission, strongest at H alpha.</summary>
    EmissionLine,

    /// <summary>A cool dwarf with an active chromosphere: Balmer and Ca II lines in emission.</summary>
    ActiveM,

    /// <summary>A cool giant with more carbon than oxygen: C2 and CN bands, no TiO.</summary>
    Carbon,
}
