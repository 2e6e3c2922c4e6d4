using Redshift.Physics.Statistics;

namespace Redshift.Simulation.Instruments;

/// <summary>Noise, cosmic-ray hits, bad pixels and gaps.</summary>
internal sealed class NoiseMaker(Setup setup, RandomSource random)
{
    /// <summary>Noise for pixels of the given σ, and the variance which a reduction would state for it.</summary>
    public (double[] Deviates, double[] Variance) Deviates(double[] sigma)
    {
        var deviates = new double[sigma.Length];
        for (var i = 0; i < sigma.Length; i++)
            deviates[i] = sigma[i] * random.Normal();
        var variance = Array.ConvertAll(sigma, s => s * s);
        if (setup.Resampled)
            Resample(deviates, variance);
        return (deviates, variance);
    }

    /// <summary>Hits, bad pixels and gaps; what the reduction has noticed loses its inverse variance.</summary>
    public void Damage(double[] flux, double[] inverseVariance, Frame frame, double[] factor)
    {
        var hits = (int)(flux.Length * setup.Hits / 1000 * random.Exponential(1));
        for (var hit = 0; hit < hits; hit++)
            Hit(flux, inverseVariance, random.Index(flux.Length), frame.Sigma, factor);
        if (!setup.HasErrors)
            return;
        for (var bad = random.Exponential(setup.Masked * flux.Length); bad > 0;)
            bad -= Blot(flux, inverseVariance, 1 + (int)random.Exponential(3), random.Chance(0.5));
        if (setup.OnGround && random.Chance(setup.MasksGreenLine))
            MaskGreenLine(frame, inverseVariance);
        if (random.Chance(setup.GapChance))
            Blot(flux, inverseVariance, (int)(flux.Length * random.Uniform(0.01, 0.06)), emptied: true);
        FillEnds(flux, inverseVariance, (int)(flux.Length * Math.Min(0.2, setup.DeadEnds)));
    }

    private static void MaskGreenLine(Frame frame, double[] inverseVariance)
    {
        const double Vacuum = 5578.887;
        for (var i = 0; i < inverseVariance.Length; i++)
        {
            if (Math.Abs(frame.Pixels[i] - Vacuum) < 1.5 * frame.Arm.FwhmA)
                inverseVariance[i] = 0;
        }
    }

    private void FillEnds(double[] flux, double[] inverseVariance, int length)
    {
        if (length == 0)
            return;
        var filling = random.Chance(0.5) ? 0 : flux[length];
        foreach (var start in (int[])[0, flux.Length - length])
        {
            flux.AsSpan(start, length).Fill(filling);
            inverseVariance.AsSpan(start, length).Clear();
        }
    }

    // Linear interpolation between two rasters: neighbours share noise, in a slow beat along the spectrum.
    private void Resample(double[] deviates, double[] variance)
    {
        var (phase, beat) = (random.Uniform(), random.Normal(0, 0.01));
        var propagated = random.Chance(0.6);
        for (var i = 0; i + 1 < deviates.Length; i++)
        {
            var share = phase + (beat * i);
            share -= Math.Floor(share);
            deviates[i] = ((1 - share) * deviates[i]) + (share * deviates[i + 1]);
            if (propagated)
                variance[i] = ((1 - share) * (1 - share) * variance[i]) + (share * share * variance[i + 1]);
        }
    }

    private void Hit(double[] flux, double[] inverseVariance, int at, double[] sigma, double[] factor)
    {
        var height = random.LogUniform(5, 60) * sigma[at] * factor[at];
        var noticed = random.Chance(0.6);
        for (var i = Math.Max(0, at - 1); i <= Math.Min(flux.Length - 1, at + 1); i++)
        {
            flux[i] += height * (i == at ? 1 : 0.35 * random.Uniform());
            if (noticed)
                inverseVariance[i] = 0;
        }
    }

    private int Blot(double[] flux, double[] inverseVariance, int length, bool emptied)
    {
        length = Math.Min(length, flux.Length / 4);
        var from = random.Index(flux.Length - length);
        Array.Clear(inverseVariance, from, length);
        if (emptied)
            Array.Clear(flux, from, length);
        return length;
    }
}
