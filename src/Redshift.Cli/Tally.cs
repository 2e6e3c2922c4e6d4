using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Results;

namespace Redshift.Cli;

/// <summary>Counts what became of the spectra of a run.</summary>
internal sealed class Tally
{
    private readonly int[] _verdicts = new int[Enum.GetValues<Verdict>().Length];

    /// <summary>Spectra with an answer, even if the answer is that there is nothing.</summary>
    public int Results => _verdicts.Sum();

    /// <summary>Files and spectra that could not be used.</summary>
    public int Rejects { get; private set; }

    /// <summary>Number of answers with a verdict.</summary>
    public int Of(Verdict verdict) => _verdicts[(int)verdict];

    /// <summary>Counts one outcome.</summary>
    public void Count(BatchOutcome outcome)
    {
        if (outcome.Result is { } result)
            _verdicts[(int)result.Verdict]++;
        else
            Rejects++;
    }
}
