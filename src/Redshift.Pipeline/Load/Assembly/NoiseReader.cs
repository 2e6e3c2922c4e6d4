using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>Turns what a file says of its noise into inverse variances.</summary>
internal static class NoiseReader
{
    /// <summary>Replaces the values by inverse variances: 0 where they are not finite, not positive or too extreme to square.</summary>
    /// <param name="role">What the values are.</param>
    /// <param name="values">Errors, variances or inverse variances.</param>
    /// <returns>Whether at least one pixel has an error; an array of zeros states nothing.</returns>
    public static bool ToInverseVariance(Role role, double[] values)
    {
        var any = false;
        for (var i = 0; i < values.Length; i++)
        {
            values[i] = InverseVariance(role, values[i]);
            any |= values[i] > 0;
        }
        return any;
    }

    private static double InverseVariance(Role role, double value)
    {
        if (!(value > 0)) return 0;
        var inverse = role switch
        {
            Role.Error => 1 / (value * value),
            Role.Variance => 1 / value,
            _ => value,
        };
        return double.IsFinite(inverse) ? inverse : 0;
    }
}
