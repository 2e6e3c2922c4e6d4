using System.Globalization;

namespace Redshift.Pipeline.Report.Conditions;

/// <summary>A condition that cannot be understood: what stands where, and what was expected.</summary>
/// <param name="position">1-based position of the letter.</param>
/// <param name="found">What stands there.</param>
/// <param name="expected">What would be right.</param>
public sealed class ConditionException(int position, string found, string expected)
    : Exception(string.Create(CultureInfo.InvariantCulture, $"at letter {position}: found {found}; expected {expected}"))
{
    /// <summary>1-based position of the letter.</summary>
    public int Position { get; } = position;
}
