namespace Redshift.Physics.Lines;

/// <summary>What makes a line. The names in lower case are the families of reports.</summary>
public enum LineFamily
{
    /// <summary>Hydrogen, computed.</summary>
    Hydrogen,

    /// <summary>Neutral helium, published, and ionized helium, computed.</summary>
    Helium,

    /// <summary>Permitted lines of heavier atoms and ions in the optical and infrared.</summary>
    Metals,

    /// <summary>Forbidden and semi-forbidden lines of thin gas.</summary>
    Forbidden,

    /// <summary>Band heads and lines of molecules.</summary>
    Molecular,

    /// <summary>Resonance lines of the ultraviolet, of stars' winds, interstellar gas and broad-line regions.</summary>
    Ultraviolet,

    /// <summary>Diffuse bands of interstellar matter in our Galaxy.</summary>
    Interstellar,

    /// <summary>Emission of the night sky, natural and artificial.</summary>
    Sky,

    /// <summary>Absorption by the Earth's atmosphere.</summary>
    Telluric,
}
