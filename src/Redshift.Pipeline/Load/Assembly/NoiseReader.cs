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
        if (role == Role.Error)
            foreach (ref var value in values.AsSpan()) value = value > 0 ? 1 / (value * value) : 0;
        if (role == Role.Variance)
            foreach (ref var value in values.AsSpan()) value = 1 / value;
        var any = false;
        foreach (ref var value in values.AsSpan())
        {
            if (value > 0 && double.IsFinite(value)) any = true;
            else value = 0;
        }
        return any;
    }
}
