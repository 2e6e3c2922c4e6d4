using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>A model at its best redshift near a peak.</summary>
/// <param name="Model">The model.</param>
/// <param name="LnShift">ln(1+z) of the maximum.</param>
/// <param name="Sigma">1σ of ln(1+z) from the curvature there.</param>
/// <param name="LnEvidence">ln evidence at the maximum over that of the smooth continuum.</param>
internal sealed record Refined(FitModel Model, double LnShift, double Sigma, double LnEvidence)
{
    /// <summary>ln of the evidence integrated over the peak, in units of ln(1+z).</summary>
    public double LnVolume => LnEvidence + Math.Log(2.5066282746310002 * Sigma);

    /// <summary>The same peak with a likelihood that is too sharp by a factor made honest.</summary>
    public Refined Soften(double excess) => this with { LnEvidence = LnEvidence / excess, Sigma = Sigma * Math.Sqrt(excess) };
}

/// <summary>Climbs from a peak of the search to the maximum of the exact evidence.</summary>
internal static class Refinement
{
    private const int MostSteps = 40;

    /// <summary>Fits a parabola through three points, moves to its top, and narrows the step, until the step matches the peak's own width.</summary>
    /// <param name="fit">The fit.</param>
    /// <param name="model">The model.</param>
    /// <param name="lnShift">Where to start.</param>
    /// <param name="step">First step, about the error of the start.</param>
    public static Refined Climb(ModelFit fit, FitModel model, double lnShift, double step)
    {
        double middle = fit.LnEvidence(model, lnShift), low = fit.LnEvidence(model, lnShift - step), high = fit.LnEvidence(model, lnShift + step);
        for (var i = 0; i < MostSteps; i++)
        {
            if (low > middle || high > middle)
            {
                var direction = high > low ? 1 : -1;
                lnShift += direction * step;
                // Of broad lines the search tells the place only roughly: their steps double, the two points behind the new middle lying wider apart.
                var behind = middle;
                if (model.Kind == ObjectKind.Quasar) (behind, step) = (Math.Min(low, high), 2 * step);
                (low, middle, high) = direction > 0
                    ? (behind, high, fit.LnEvidence(model, lnShift + step))
                    : (fit.LnEvidence(model, lnShift - step), low, behind);
                continue;
            }

            var curvature = (low + high - 2 * middle) / (step * step);
            if (curvature >= -1e-12) break;
            var sigma = 1 / Math.Sqrt(-curvature);
            var offset = 0.5 * (high - low) / (-curvature * step);
            if (step < 3 * sigma && Math.Abs(offset) < 0.7 * step)
                return new(model, lnShift + offset, sigma, middle + 0.5 * offset * offset * -curvature);
            lnShift += offset;
            step = Math.Max(Math.Min(step / 2, 1.5 * sigma), 1e-7);
            (middle, low, high) = (fit.LnEvidence(model, lnShift), fit.LnEvidence(model, lnShift - step), fit.LnEvidence(model, lnShift + step));
        }

        var bend = Math.Max((2 * middle - low - high) / (step * step), 1 / (step * step));
        return new(model, lnShift, 1 / Math.Sqrt(bend), Math.Max(middle, Math.Max(low, high)));
    }
}
