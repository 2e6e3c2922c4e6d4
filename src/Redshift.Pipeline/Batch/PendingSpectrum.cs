using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Batch;

/// <summary>A spectrum on its way from its reader to a worker.</summary>
/// <param name="File">Its file.</param>
/// <param name="Observation">The spectrum.</param>
internal sealed record PendingSpectrum(OpenFile File, Observation Observation);
