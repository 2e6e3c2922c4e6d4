namespace Redshift.Pipeline.Load.Metadata;

/// <summary>What a fibre table says of a row.</summary>
internal enum FibreState
{
    /// <summary>It looks at an object, or nothing is said.</summary>
    Object,

    /// <summary>It looks at the sky.</summary>
    Sky,

    /// <summary>It looks at nothing: parked or not assigned.</summary>
    Parked,

    /// <summary>It gives no light.</summary>
    Broken,
}
