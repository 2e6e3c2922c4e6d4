namespace Redshift.Pipeline.Compare;

/// <summary>What makes two rows rows of the same object.</summary>
public enum Pairing
{
    /// <summary>The same spectrum: source and row.</summary>
    Source,

    /// <summary>The same name, whatever its blanks and capitals.</summary>
    Target,

    /// <summary>The nearest position within a radius.</summary>
    Position,
}
