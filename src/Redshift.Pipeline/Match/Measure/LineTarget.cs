using Redshift.Physics.Lines;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>A line that the answered kind of object may show.</summary>
/// <param name="Line">The line.</param>
/// <param name="Centre">ln of the wavelength where the answer puts it.</param>
/// <param name="Sigma">Its own expected σ in ln λ, without the instrument.</param>
/// <param name="WidestSigma">Up to which σ the model's own profile is searched; 0 to take <paramref name="Sigma"/>.</param>
/// <param name="Side">The side of the continuum on which this kind of object shows it.</param>
/// <param name="ShiftSpread">How far, 1σ in ln λ, such lines stand off the redshift of their object.</param>
internal sealed record LineTarget(SpectralLine Line, double Centre, double Sigma, double WidestSigma, LineKind Side, double ShiftSpread);
