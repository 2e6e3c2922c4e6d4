namespace Redshift.Pipeline.Match.Measure;

/// <summary>Where and how wide a line is expected to be, the instrument's width included.</summary>
/// <param name="Centre">Expected ln λ.</param>
/// <param name="Sigma">Expected σ in ln λ.</param>
/// <param name="CentreSpread">Prior σ of the shift against the expected centre; 2.5 times as much is the most that is allowed.</param>
/// <param name="LeastSigma">No line can be narrower: a little below the instrument's σ.</param>
internal readonly record struct LineShape(double Centre, double Sigma, double CentreSpread, double LeastSigma);

/// <summary>A neighbour that is fitted with a line.</summary>
/// <param name="Centre">Its ln λ.</param>
/// <param name="Sigma">Its σ in ln λ.</param>
/// <param name="Tied">Whether it shifts and widens with the line, as members of a close pair do.</param>
internal readonly record struct Neighbour(double Centre, double Sigma, bool Tied);
