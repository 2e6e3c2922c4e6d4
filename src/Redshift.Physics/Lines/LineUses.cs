namespace Redshift.Physics.Lines;

/// <summary>The objects in which a line is commonly met.</summary>
[Flags]
public enum LineUses
{
    /// <summary>In none.</summary>
    None = 0,

    /// <summary>Stars, white dwarfs included.</summary>
    Star = 1,

    /// <summary>Galaxies.</summary>
    Galaxy = 2,

    /// <summary>Quasars and other active nuclei.</summary>
    Quasar = 4,

    /// <summary>Emission nebulae of our own Galaxy.</summary>
    Nebula = 8,

    /// <summary>The night sky.</summary>
    Sky = 16,
}
