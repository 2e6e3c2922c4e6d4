namespace Redshift.Pipeline.Compare;

/// <summary>What is compared of a row; texts are empty and numbers null where the table does not have them.</summary>
public sealed record ComparedRow
{
    /// <summary>File of the spectrum.</summary>
    public string Source { get; init; } = "";

    /// <summary>Spectrum of the file.</summary>
    public int Row { get; init; }

    /// <summary>Name of the object.</summary>
    public string Target { get; init; } = "";

    /// <summary>Right ascension in degrees.</summary>
    public double? RaDeg { get; init; }

    /// <summary>Declination in degrees.</summary>
    public double? DecDeg { get; init; }

    /// <summary>Redshift.</summary>
    public double? Z { get; init; }

    /// <summary>Resolving power.</summary>
    public double? Resolution { get; init; }

    /// <summary>Kind of object, in the catalogue's words.</summary>
    public string Kind { get; init; } = "";

    /// <summary>Verdict, in the catalogue's words.</summary>
    public string Verdict { get; init; } = "";
}
