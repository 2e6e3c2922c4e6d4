using Redshift.Physics.Lines;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Decides how a measured line stands.</summary>
internal static class LineStates
{
    /// <summary>Signal to noise from which a line that the model predicts is matched.</summary>
    private const double Matched = 3;

    /// <summary>Signal to noise from which a listed line that the model does not predict is matched: one among many places looked at.</summary>
    private const double Unforeseen = 4;

    /// <summary>Signal to noise at which a line must be predicted to be missed.</summary>
    private const double Missed = 5;

    /// <summary>Share of a predicted line that may be there, within 2σ, of a line that is called missing.</summary>
    private const double MostPresent = 0.6;

    /// <summary>A predicted line of less than this signal to noise is not foreseen.</summary>
    private const double Foreseen = 1.5;

    /// <summary>The state, or null for a line that is neither seen nor missed.</summary>
    /// <param name="line">The measurement.</param>
    /// <param name="absorbing">Whether the object is a star without emission: the model must show a dip, for between dips anything looks like a bump.</param>
    public static LineState? Of(MeasuredLine line, bool absorbing)
    {
        if (line.Data is not { } data) return LineState.Masked;
        if (absorbing && line.Expected > -Foreseen) return null;
        if (Math.Abs(data.Significance) >= Needed(line) && SideFits(line.Target.Side, data.Amplitude)) return LineState.Matched;
        return IsMissing(line, data) ? LineState.ExpectedMissing : null;
    }

    /// <summary>Whether the line should be seen.</summary>
    public static bool IsExpected(MeasuredLine line) => Math.Abs(line.Expected) >= Missed && SideFits(line.Target.Side, line.Expected);

    private static double Needed(MeasuredLine line) =>
        Math.Abs(line.Expected) >= Foreseen && Math.Sign(line.Expected) == Math.Sign(line.Data!.Amplitude) ? Matched : Unforeseen;

    private static bool SideFits(LineKind kind, double amplitude) => kind switch
    {
        LineKind.Absorption => amplitude < 0,
        LineKind.Emission => amplitude > 0,
        _ => true,
    };

    /// <summary>A line is missing where it is expected and most of it is excluded by the data.</summary>
    private static bool IsMissing(MeasuredLine line, FittedLine data)
    {
        if (!IsExpected(line)) return false;
        double expected = Math.Abs(line.Expected), found = data.Significance * Math.Sign(line.Expected);
        return found + 2 < MostPresent * expected;
    }
}
