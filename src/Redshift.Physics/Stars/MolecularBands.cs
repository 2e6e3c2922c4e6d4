namespace Redshift.Physics.Stars;

/// <summary>Adds the opacity of molecular bands.</summary>
internal static class MolecularBands
{
    public static void Add(Span<double> ratio, LogWavelengthGrid grid, Layer layer)
    {
        var equilibrium = new MolecularEquilibrium(layer.Gas);
        var scratch = new double[grid.Count];
        var kelvin = layer.Gas.Temperature;
        foreach (var system in BandSystem.All)
            AddSystem(ratio, scratch, grid, layer, system.Bands(kelvin), equilibrium.Abundance(system.Molecule), system.SpacingOverWidth);
        var monoxide = equilibrium.Abundance(Molecule.CarbonMonoxide);
        AddSystem(ratio, scratch, grid, layer, OvertoneBands.Bands(kelvin), monoxide, OvertoneBands.SpacingOverWidth);
        AddWater(ratio, grid, layer, equilibrium.Water);
    }

    private static void AddSystem(
        Span<double> ratio,
        double[] scratch,
        LogWavelengthGrid grid,
        Layer layer,
        IEnumerable<Band> bands,
        double abundance,
        double spacingOverWidth)
    {
        var (first, last) = (scratch.Length, -1);
        foreach (var band in bands)
        {
            var absorbers = abundance / layer.ContinuousOpacityAt(Nodes.Place(Math.Log(band.Wavelength)));
            var (from, to) = band.Add(scratch, grid, layer.Gas.Temperature, absorbers);
            (first, last) = (Math.Min(first, from), Math.Max(last, to));
        }

        for (var i = first; i <= last; i++)
        {
            // Separate saturated lines let light through between them: mean of a random band (Goody 1952) with the system's ratio
            // of line spacing to Doppler width.
            ratio[i] += scratch[i] / Math.Sqrt(1 + (spacingOverWidth * scratch[i]));
            scratch[i] = 0;
        }
    }

    // Water has no band heads to measure a velocity from; smooth humps stand for its bands. Integrated cross-sections in cm after
    // the cold values (from memory of HITRAN); widths of a hot gas.
    private static readonly (double Center, double Sigma, double Strength)[] WaterBands =
        [(10640, 250, 2.2e-20), (8800, 280, 6e-20), (7180, 260, 7.5e-19), (5340, 230, 9e-19), (3720, 260, 8e-18)];

    private static void AddWater(Span<double> ratio, LogWavelengthGrid grid, Layer layer, double abundance)
    {
        foreach (var (center, sigma, strength) in WaterBands)
        {
            var opacity = layer.ContinuousOpacityAt(Nodes.Place(Math.Log(1e8 / center)));
            var peak = abundance * strength / (sigma * Math.Sqrt(2 * Math.PI)) / opacity;
            if (peak < 1e-3)
                continue;
            var first = Math.Max(0, (int)grid.Position(1e8 / (center + (4 * sigma))));
            var last = Math.Min(grid.Count - 1, (int)grid.Position(1e8 / (center - (4 * sigma))));
            for (var i = first; i <= last; i++)
            {
                var x = ((1e8 / grid.Wavelength(i)) - center) / sigma;
                var mean = peak * Math.Exp(-0.5 * x * x);
                ratio[i] += mean / Math.Sqrt(1 + (10 * mean));
            }
        }
    }
}
