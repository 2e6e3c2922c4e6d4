using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Cli;

/// <summary>Counts what became of the spectra of the inputs, in this run and in earlier ones.</summary>
/// <param name="states">Number of outcomes of each state of the ledger.</param>
internal sealed class Tally(IReadOnlyDictionary<string, int> states)
{
    /// <summary>Files and spectra that could not be used.</summary>
    public int Rejects => states.GetValueOrDefault("rejected");

    /// <summary>Spectra with an answer, even if the answer is that there is nothing.</summary>
    public int Results => states.Values.Sum() - Rejects;

    /// <summary>The tally of a ledger.</summary>
    public static Tally Of(LedgerFile ledger) => new(ledger.CountByState());

    /// <summary>Number of answers with a verdict.</summary>
    public int Of(Verdict verdict) => states.GetValueOrDefault(Words.Of(verdict));
}
