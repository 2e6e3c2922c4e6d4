using System.Globalization;

namespace Redshift.Physics.Units;

/// <summary>A velocity in km/s in the one convention of this project, v = c·z; positive is receding.</summary>
/// <remarks>Velocities do not add: compose the redshifts instead (<see cref="RedshiftValue.Compose"/>).</remarks>
public readonly struct Velocity : IEquatable<Velocity>, IComparable<Velocity>
{
    /// <summary>Speed of light in vacuum in km/s, exact (SI definition of the metre).</summary>
    public const double SpeedOfLightKmS = Constants.Codata2022.SpeedOfLightKmS;

    private Velocity(double kmS) => KmS = kmS;

    /// <summary>The value in km/s.</summary>
    public double KmS { get; }

    /// <summary>Makes a velocity from km/s.</summary>
    public static Velocity FromKmS(double kmS) => new(kmS);

    /// <summary>c·z of a redshift.</summary>
    public static Velocity FromRedshift(RedshiftValue redshift) => new(SpeedOfLightKmS * redshift.Z);

    /// <summary>The velocity between two redshifts as seen from the second: c(z₁−z₂)/(1+z₂).</summary>
    public static Velocity Between(RedshiftValue first, RedshiftValue second) =>
        new(SpeedOfLightKmS * (first.Z - second.Z) / (1 + second.Z));

    /// <inheritdoc/>
    public bool Equals(Velocity other) => KmS.Equals(other.KmS);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is Velocity other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => KmS.GetHashCode();

    /// <inheritdoc/>
    public int CompareTo(Velocity other) => KmS.CompareTo(other.KmS);

    /// <summary>The value with three decimals and its unit.</summary>
    public override string ToString() => KmS.ToString("F3", CultureInfo.InvariantCulture) + " km/s";

    /// <summary>Equality of the values.</summary>
    public static bool operator ==(Velocity left, Velocity right) => left.Equals(right);

    /// <summary>Inequality of the values.</summary>
    public static bool operator !=(Velocity left, Velocity right) => !left.Equals(right);

    /// <summary>Order by value.</summary>
    public static bool operator <(Velocity left, Velocity right) => left.KmS < right.KmS;

    /// <summary>Order by value.</summary>
    public static bool operator >(Velocity left, Velocity right) => left.KmS > right.KmS;

    /// <summary>Order by value.</summary>
    public static bool operator <=(Velocity left, Velocity right) => left.KmS <= right.KmS;

    /// <summary>Order by value.</summary>
    public static bool operator >=(Velocity left, Velocity right) => left.KmS >= right.KmS;
}
