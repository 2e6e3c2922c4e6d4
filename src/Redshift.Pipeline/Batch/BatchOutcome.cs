using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Batch;

/// <summary>What became of one spectrum: exactly one of result and reject is set.</summary>
/// <param name="File">Number of its file among the inputs, from 0.</param>
/// <param name="Result">The answer.</param>
/// <param name="Reject">Why there is none.</param>
public readonly record struct BatchOutcome(int File, ObservationResult? Result, Reject? Reject);
