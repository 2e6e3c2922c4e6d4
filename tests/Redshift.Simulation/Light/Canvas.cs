namespace Redshift.Simulation.Light;

/// <summary>Flux density per Å being drawn over a grid, line by line.</summary>
internal sealed class Canvas(LogGrid grid)
{
    public LogGrid Grid { get; } = grid;

    public double[] Flux { get; } = new double[grid.Count];

    /// <summary>Multiplies by a law of wavelength.</summary>
    public Canvas Filter(Func<double, double> law)
    {
        for (var i = 0; i < Flux.Length; i++)
            Flux[i] *= law(Grid.Wavelength[i]);
        return this;
    }

    /// <summary>Sets the flux from a law so smooth that it need not be worked out at every point.</summary>
    public Canvas Fill(Func<double, double> law)
    {
        Array.Fill(Flux, 1);
        return FilterSlowly(law);
    }

    /// <summary>Multiplies by such a law.</summary>
    public Canvas FilterSlowly(Func<double, double> law)
    {
        const int Stride = 16;
        var next = law(Grid.Wavelength[0]);
        for (var i = 0; i < Flux.Length; i += Stride)
        {
            var end = Math.Min(i + Stride, Flux.Length - 1);
            var (here, slope) = (next, ((next = law(Grid.Wavelength[end])) - next) / Math.Max(1, end - i));
            for (var j = i; j < Math.Min(i + Stride, Flux.Length); j++)
                Flux[j] *= here + (slope * (j - i));
        }
        return this;
    }

    /// <summary>Adds another canvas on the same grid.</summary>
    public Canvas Add(Canvas other, double weight)
    {
        for (var i = 0; i < Flux.Length; i++)
            Flux[i] += weight * other.Flux[i];
        return this;
    }

    /// <summary>The flux at a wavelength, or null outside the grid.</summary>
    public double? At(double wavelength)
    {
        var position = Grid.Position(wavelength);
        return position < 0 || position > Flux.Length - 1 ? null : Flux[(int)Math.Round(position)];
    }

    /// <summary>Adds an emission line of the given area (flux × Å); its shape's width is in km/s.</summary>
    public void Emit(double wavelength, double widthKmS, double area, Profile? profile = null)
    {
        var shape = profile ?? Profile.Gaussian;
        widthKmS = Math.Max(widthKmS, MinimumWidth);
        var height = area / (shape.Area * wavelength * widthKmS / LogGrid.C);
        var (from, to, position) = Range(wavelength, widthKmS, shape.Reach);
        var scale = Grid.StepKmS / widthKmS;
        for (var i = from; i < to; i++)
            Flux[i] += height * shape.At((i - position) * scale);
    }

    /// <summary>Takes out a line of the given equivalent width (Å), widened where it would be deeper than <paramref name="deepest"/>.</summary>
    public void Absorb(double wavelength, double widthKmS, double equivalentWidth, double deepest = 0.85, Profile? profile = null)
    {
        var shape = profile ?? Profile.Gaussian;
        widthKmS = Math.Max(widthKmS, MinimumWidth);
        var area = equivalentWidth / (shape.Area * wavelength / LogGrid.C);
        var depth = Math.Min(deepest, area / widthKmS);
        if (depth <= 0)
            return;
        widthKmS = area / depth;
        var (from, to, position) = Range(wavelength, widthKmS, shape.Reach);
        var scale = Grid.StepKmS / widthKmS;
        for (var i = from; i < to; i++)
            Flux[i] *= 1 - (depth * shape.At((i - position) * scale));
    }

    /// <summary>Convolves with a Gaussian in velocity.</summary>
    public Canvas Broaden(double sigmaKmS)
    {
        Smoothing.Gaussian(Flux, sigmaKmS / Grid.StepKmS);
        return this;
    }

    // A line narrower than the grid would fall between its points.
    private double MinimumWidth => 0.7 * Grid.StepKmS;

    private (int From, int To, double Position) Range(double wavelength, double widthKmS, double reach)
    {
        var position = Grid.Position(wavelength);
        var half = reach * widthKmS / Grid.StepKmS;
        var from = Math.Clamp(Math.Ceiling(position - half), 0, Flux.Length);
        var to = Math.Clamp(Math.Floor(position + half) + 1, from, Flux.Length);
        return ((int)from, (int)to, position);
    }
}
