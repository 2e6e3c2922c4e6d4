using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report;

/// <summary>The columns that describe a candidate where an answer is explained.</summary>
public static class CandidateColumns
{
    /// <summary>The columns.</summary>
    public static IReadOnlyList<Column<Candidate>> All { get; } =
    [
        new("kind", "", "src.class", "Kind of the model", CellType.Text, c => Cell.Of(Words.Of(c.Kind))),
        new("z_file", "", "src.redshift", "Redshift as the wavelengths of the file stand", CellType.Real, c => Cell.Fixed(c.Z, 7)),
        new("z_err", "", "stat.error;src.redshift", "1 sigma of the redshift", CellType.Real, c => Cell.Fixed(c.ZErr, 7)),
        new("model", "", "meta.modelled", "The computed model that fits best", CellType.Text, c => Cell.Of(c.Template)),
        new("ln_evidence", "", "stat.likelihood", "ln of the evidence over that of a smooth spectrum, priors included", CellType.Real, c => Cell.Fixed(c.LnEvidence, 3)),
        new("probability", "", "stat.probability", "Share of the posterior", CellType.Real, c => Cell.Fixed(c.Probability, 4)),
    ];
}
