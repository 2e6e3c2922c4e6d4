namespace Redshift.Physics.Lines;

/// <summary>The sides of the continuum on which a line is met.</summary>
public enum LineKind
{
    /// <summary>In absorption only.</summary>
    Absorption,

    /// <summary>In emission only.</summary>
    Emission,

    /// <summary>In absorption or in emission.</summary>
    Both,
}
