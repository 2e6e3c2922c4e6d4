namespace Redshift.Pipeline.Results;

/// <summary>What an object is.</summary>
public enum ObjectKind
{
    /// <summary>Features that no model explains, or nothing at all.</summary>
    Unknown,

    /// <summary>A star of our own Galaxy or its neighbours.</summary>
    Star,

    /// <summary>A galaxy, passive or with emission lines.</summary>
    Galaxy,

    /// <summary>An active nucleus with broad emission lines.</summary>
    Quasar,

    /// <summary>Emission lines of ionised gas in our own Galaxy.</summary>
    Nebula,
}

/// <summary>How an answer should be taken.</summary>
public enum Verdict
{
    /// <summary>No evidence of an object: redshift and velocity stay empty.</summary>
    Nothing,

    /// <summary>An answer below <see cref="Likely"/>: a person should look.</summary>
    Unsettled,

    /// <summary>Confidence of 0.9 or more.</summary>
    Likely,

    /// <summary>Confidence of 0.99 or more.</summary>
    Firm,
}
