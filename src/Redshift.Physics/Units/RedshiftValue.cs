using System.Globalization;

namespace Redshift.Physics.Units;

/// <summary>A redshift z = λ_observed/λ_rest − 1; greater than −1, dimensionless. <c>default</c> is z = 0.</summary>
public readonly struct RedshiftValue : IEquatable<RedshiftValue>, IComparable<RedshiftValue>
{
    private RedshiftValue(double z) => Z = z;

    /// <summary>The redshift z.</summary>
    public double Z { get; }

    /// <summary>ln(1+z): the shift of the whole spectrum on a logarithmic wavelength axis.</summary>
    public double LogShift => Math.Log(1 + Z);

    /// <summary>Makes a redshift from z.</summary>
    /// <exception cref="ArgumentOutOfRangeException">z is not greater than −1.</exception>
    public static RedshiftValue FromZ(double z) =>
        z > -1 ? new(z) : throw new ArgumentOutOfRangeException(nameof(z), z, "a redshift is greater than -1");

    /// <summary>The redshift of a velocity in the convention v = c·z.</summary>
    public static RedshiftValue FromVelocity(Velocity velocity) => FromZ(velocity.KmS / Velocity.SpeedOfLightKmS);

    /// <summary>Two shifts one after the other: (1+z) = (1+z₁)(1+z₂).</summary>
    public RedshiftValue Compose(RedshiftValue other) => new((1 + Z) * (1 + other.Z) - 1);

    /// <inheritdoc/>
    public bool Equals(RedshiftValue other) => Z.Equals(other.Z);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => obj is RedshiftValue other && Equals(other);

    /// <inheritdoc/>
    public override int GetHashCode() => Z.GetHashCode();

    /// <inheritdoc/>
    public int CompareTo(RedshiftValue other) => Z.CompareTo(other.Z);

    /// <summary>z with seven decimals.</summary>
    public override string ToString() => Z.ToString("F7", CultureInfo.InvariantCulture);

    /// <summary>Equality of the values.</summary>
    public static bool operator ==(RedshiftValue left, RedshiftValue right) => left.Equals(right);

    /// <summary>Inequality of the values.</summary>
    public static bool operator !=(RedshiftValue left, RedshiftValue right) => !left.Equals(right);

    /// <summary>Order by value.</summary>
    public static bool operator <(RedshiftValue left, RedshiftValue right) => left.Z < right.Z;

    /// <summary>Order by value.</summary>
    public static bool operator >(RedshiftValue left, RedshiftValue right) => left.Z > right.Z;

    /// <summary>Order by value.</summary>
    public static bool operator <=(RedshiftValue left, RedshiftValue right) => left.Z <= right.Z;

    /// <summary>Order by value.</summary>
    public static bool operator >=(RedshiftValue left, RedshiftValue right) => left.Z >= right.Z;
}
