using Redshift.Physics.Stars;
using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Inject;

/// <summary>The light of an object at rest while it is painted: F_λ on an even grid in ln λ, vacuum, some 1 at 5500 Å.</summary>
/// <param name="grid">Vacuum wavelengths.</param>
internal sealed class RestLight(LogWavelengthGrid grid)
{
    private const double DustSlope = -1.2;
    private const double VisualA = 5500;

    /// <summary>Vacuum wavelengths at rest.</summary>
    public LogWavelengthGrid Grid { get; } = grid;

    /// <summary>F_λ, one value a grid point.</summary>
    public float[] Flux { get; private set; } = new float[grid.Count];

    /// <summary>Adds a star, computed for parameters that need not be those of any model.</summary>
    public void AddStar(StellarParameters star, double share)
    {
        var light = StellarModel.Compute(star, Grid);
        for (var i = 0; i < Flux.Length; i++) Flux[i] += (float)share * light.Relative[i] * light.Continuum[i];
    }

    /// <summary>Adds a power law, 1 at 5500 Å.</summary>
    public void AddPowerLaw(double slope)
    {
        for (var i = 0; i < Flux.Length; i++) Flux[i] += (float)Math.Pow(Grid.Wavelength(i) / VisualA, slope);
    }

    /// <summary>Broadens all there is by a Gaussian.</summary>
    public void Broaden(double sigmaKmS) => Flux = GaussianFilter.Convolve(Flux, sigmaKmS / Velocity.SpeedOfLightKmS / Grid.LnStep);

    /// <summary>Dims by dust: τ falls as λ^-1.2, close to the curve of our Galaxy from the ultraviolet to the near infrared.</summary>
    /// <param name="depth">Optical depth at 5500 Å.</param>
    public void Redden(double depth)
    {
        for (var i = 0; i < Flux.Length; i++) Flux[i] *= (float)Math.Exp(-depth * (Math.Pow(Grid.Wavelength(i) / VisualA, DustSlope) - 1));
    }

    /// <summary>Adds an emission line of a given flux, in units of the continuum at 5500 Å times Å.</summary>
    public void AddLine(double restA, double flux, double sigmaKmS) =>
        Shape(restA, sigmaKmS, (i, profile) => Flux[i] += (float)(flux * profile));

    /// <summary>Adds an emission line of a given equivalent width in Å on <paramref name="continuum"/>.</summary>
    public void AddLineOn(float[] continuum, double restA, double equivalentWidthA, double sigmaKmS) =>
        Shape(restA, sigmaKmS, (i, profile) => Flux[i] += (float)(equivalentWidthA * profile * continuum[i]));

    /// <summary>Takes out an absorption line of a given equivalent width in Å; it gets no deeper than black.</summary>
    public void Absorb(double restA, double equivalentWidthA, double sigmaKmS) =>
        Shape(restA, sigmaKmS, (i, profile) => Flux[i] *= (float)Math.Exp(-equivalentWidthA * profile));

    /// <summary>Puts the forest of gas at lower redshift in front: its mean transmission, clumped as gas is.</summary>
    /// <param name="z">Redshift of the object.</param>
    /// <param name="random">Gives the clumps.</param>
    public void PutBehindForest(double z, RandomSource random)
    {
        const double ClumpKmS = 100;
        var lnShift = Math.Log(1 + z);
        var steps = Math.Max(1, (int)(ClumpKmS / Velocity.SpeedOfLightKmS / Grid.LnStep));
        var clump = 1.0;
        for (var i = 0; i < Flux.Length; i++)
        {
            // One clump has the optical depth of the mean times a number that scatters as widely as forests do.
            if (i % steps == 0) clump = random.Scatter(1);
            var mean = Match.Models.Forest.Transmission(Grid.LnStart + i * Grid.LnStep + lnShift, lnShift);
            Flux[i] *= (float)Math.Pow(mean, clump);
        }
    }

    /// <summary>Visits the points of a Gaussian line of unit area in Å⁻¹.</summary>
    private void Shape(double restA, double sigmaKmS, Action<int, double> paint)
    {
        // A line narrower than the grid would fall between its points.
        var sigma = Math.Max(sigmaKmS / Velocity.SpeedOfLightKmS, Grid.LnStep);
        var (centre, reach) = (Grid.Position(restA), 5 * sigma / Grid.LnStep);
        var height = 1 / (Math.Sqrt(2 * Math.PI) * sigma * restA);
        for (var i = (int)Math.Max(0, centre - reach); i < Math.Min(Flux.Length, centre + reach); i++)
        {
            var distance = (i - centre) * Grid.LnStep / sigma;
            paint(i, height * Math.Exp(-0.5 * distance * distance));
        }
    }
}
