using System.Numerics;

namespace Redshift.Physics.Stars;

/// <summary>Adds up the opacity of all lines and bands of a star on a grid.</summary>
internal sealed class SpectrumBuilder(Photosphere star, LogWavelengthGrid grid)
{
    private const double FaintestWing = 0.01;
    private const double FaintestWidth = 0.002;
    private const int ProfileReach = 4;
    private static readonly double[][] Gaussians = [.. Enumerable.Range(0, 33).Select(i => Gaussian((i - 16) / 32.0))];
    private readonly double[] _ratio = new double[grid.Count];
    private readonly double[] _narrow = new double[grid.Count];
    private readonly double[] _emission = new double[grid.Count];

    public StellarSpectrum Build()
    {
        if (star.Star.Variant != StellarVariant.WhiteDwarfDB)
            HydrogenLines.Add(_ratio, grid, star.Hydrogen);
        AddLines();
        if (star.Molecules is { } molecules)
            MolecularBands.Add(_ratio, grid, molecules);
        LineHaze.Add(_ratio, grid, star);
        ChromosphericEmission.Add(_emission, grid, star.Star);
        return Transfer();
    }

    private static double[] Gaussian(double offset)
    {
        var steps = Enumerable.Range(-ProfileReach, (2 * ProfileReach) + 1);
        return [.. steps.Select(i => Math.Exp(-0.5 * (i - offset) * (i - offset)) / Math.Sqrt(2 * Math.PI))];
    }

    private void AddLines()
    {
        var lines = LineTables.All;
        var ions = LineTables.Ions.Select(i => new Absorbers(star.Lines, i.Element, i.Stage)).ToArray();
        foreach (ref readonly var line in lines.AsSpan())
            AddLine(line, ions[line.Ion]);
    }

    private void AddLine(in AtomicLine line, in Absorbers ion)
    {
        var position = (line.LnWavelength - grid.LnStart) / grid.LnStep;
        if (position < 0 || position > grid.Count - 1)
            return;
        var place = Nodes.Place(line.LnWavelength);
        var half = star.HalfDepthRatio(place);
        var central = line.Weight * ion.CentralOpacity(line.Wavelength, line.Excitation) / (star.Lines.ContinuousOpacityAt(place) * half);
        var doppler = ion.Doppler / grid.LnStep;
        if (central * doppler < FaintestWidth)
            return;
        var damping = ion.Damping(line.Wavelength);
        var k = CurveOfGrowth.WingStrength(central, damping);
        var width = CurveOfGrowth.CoreInsideWings(central, damping);
        if (Math.Sqrt(k) * doppler < 0.7)
            width += CurveOfGrowth.Wings(central, damping);
        else
            AddWings(position, k * doppler * doppler * half, CurveOfGrowth.WingStart * doppler);
        AddNarrow(position, width * doppler * star.StrongestDepth(place));
    }

    // Strength and start in units of grid steps.
    private void AddWings(double position, double strength, double start)
    {
        var reach = Math.Min(Math.Sqrt(strength / FaintestWing), 2000);
        var floor = Math.Max(start * start, 0.5);
        var last = Math.Min(grid.Count - 1, (int)(position + reach));
        for (var i = Math.Max(0, (int)(position - reach)); i <= last; i++)
            _ratio[i] += strength / (((i - position) * (i - position)) + floor);
    }

    private void AddNarrow(double position, double width)
    {
        var nearest = (int)Math.Round(position);
        var gaussian = Gaussians[16 + (int)Math.Round(32 * (position - nearest))];
        var first = nearest - ProfileReach;
        for (var i = Math.Max(0, -first); i < gaussian.Length && first + i < grid.Count; i++)
            _narrow[first + i] += width * gaussian[i];
    }

    private StellarSpectrum Transfer()
    {
        const int block = 16;
        var relative = new float[grid.Count];
        var continuum = new float[grid.Count];
        var unit = star.ContinuumFlux(Nodes.Place(Math.Log(5500)));
        for (var first = 0; first < grid.Count; first += block)
        {
            var (here, next) = (At(first, unit), At(first + block, unit));
            var step = (next - here) * (1f / block);
            for (var i = first; i < Math.Min(first + block, grid.Count); i++, here += step)
            {
                continuum[i] = here.X;
                relative[i] = (float)(Residual(_ratio[i] / here.Z, here.Y, _narrow[i]) + _emission[i]);
            }
        }

        return new StellarSpectrum(star.Star, Rotation.Broaden(relative, Rotation.SigmaSteps(star.Star, grid)), continuum);
    }

    // Continuum, strongest depth and half-depth ratio, smooth enough to be interpolated.
    private Vector3 At(int index, double unit)
    {
        var place = Nodes.Place(grid.LnStart + (index * grid.LnStep));
        return new((float)(star.ContinuumFlux(place) / unit), (float)star.StrongestDepth(place), (float)star.HalfDepthRatio(place));
    }

    // Narrow lines lose contrast where wings or bands have already taken the light away.
    private static double Residual(double ratio, double strongest, double narrow)
    {
        var residual = 1 - (strongest * ratio / (1 + ratio));
        return residual * FastExponential.OfMinus(narrow / ((1 + ratio) * residual));
    }
}
