namespace Redshift.Physics.Lines;

/// <summary>How much of the light a band of the atmosphere takes.</summary>
public enum TelluricStrength
{
    /// <summary>A few per cent.</summary>
    Weak,

    /// <summary>Tens of per cent in its cores.</summary>
    Strong,

    /// <summary>Nearly all: nothing can be measured.</summary>
    Opaque,
}
