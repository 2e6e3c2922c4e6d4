using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>
/// Weighted least squares of one line at native pixels: straight continuum, Gaussian of free height, centre and width, neighbours of free
/// height. Centre and width have weak priors, so that a line at the limit of detection keeps the place and width the answer gives it.
/// Gauss–Newton steps; errors from the inverse of the normal matrix, enlarged where the fit is worse than noise allows.
/// </summary>
internal static class GaussianFit
{
    /// <summary>Prior σ of ln(width).</summary>
    private const double LnSigmaSpread = 0.7;

    private const double MostShift = 2.5;
    private const int MostSteps = 20;

    /// <summary>Steps shorter than this share of the width end the fit: the next one would be its square.</summary>
    private const double Settled = 1e-3;

    private const int MostUnknowns = 5 + MostNeighbours;

    /// <summary>Neighbours beyond this number are left out.</summary>
    public const int MostNeighbours = 6;

    private const double RootTwoPi = 2.5066282746310002;

    /// <summary>How far from the centre pixels are used.</summary>
    public static double Reach(LineShape shape) => 4 * shape.Sigma + 6 * shape.LeastSigma;

    /// <summary>Fits a line.</summary>
    /// <param name="spectrum">Its wavelengths and weights.</param>
    /// <param name="flux">Flux at the pixels: the data, or a model to measure in the same way.</param>
    /// <param name="shape">What is expected.</param>
    /// <param name="neighbours">Lines to fit with it, at most <see cref="MostNeighbours"/>.</param>
    /// <returns>The line, or null where too few pixels are usable.</returns>
    public static FittedLine? Fit(NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, LineShape shape, ReadOnlySpan<Neighbour> neighbours) =>
        Fit(spectrum, flux, shape, neighbours, MostSteps);

    /// <summary>Fits the heights alone, centre and width as expected: a quick look.</summary>
    /// <returns>The line, or null where too few pixels are usable.</returns>
    public static FittedLine? FitHeight(NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, LineShape shape, ReadOnlySpan<Neighbour> neighbours) =>
        Fit(spectrum, flux, shape, neighbours, 1);

    private static FittedLine? Fit(
        NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, LineShape shape, ReadOnlySpan<Neighbour> neighbours, int steps)
    {
        var (from, to) = Window(spectrum, shape);
        var n = 5 + neighbours.Length;
        if (!Covered(spectrum, shape, from, to, n)) return null;
        var state = new State(shape, neighbours.Length);
        Span<double> matrix = stackalloc double[MostUnknowns * MostUnknowns];
        matrix = matrix[..(n * n)];
        Span<double> solution = stackalloc double[n];
        for (var step = 0; step < steps; step++)
        {
            Accumulate(spectrum, flux, from, to, state, shape, neighbours, matrix, solution);
            if (!SymmetricInverse.Invert(matrix, n)) return null;
            Multiply(matrix, solution);
            if (state.Move(solution, shape)) break;
        }

        return double.IsFinite(state.Centre + state.LnSigma) ? Describe(spectrum, flux, from, to, state, shape, neighbours, matrix, widthIsFree: steps > 1) : null;
    }

    private static (int From, int To) Window(NormalizedSpectrum spectrum, LineShape shape)
    {
        var reach = Reach(shape);
        return (Search(spectrum.LnWavelength, shape.Centre - reach), Search(spectrum.LnWavelength, shape.Centre + reach));
    }

    private static int Search(double[] sorted, double value)
    {
        var found = Array.BinarySearch(sorted, value);
        return found >= 0 ? found : ~found;
    }

    /// <summary>Whether the core of the line has usable pixels on both sides of its centre and the window more than there are unknowns.</summary>
    private static bool Covered(NormalizedSpectrum spectrum, LineShape shape, int from, int to, int unknowns)
    {
        int below = 0, above = 0, all = 0;
        for (var i = from; i < to; i++)
        {
            if (spectrum.Weight[i] <= 0) continue;
            all++;
            var offset = spectrum.LnWavelength[i] - shape.Centre;
            if (Math.Abs(offset) > 1.5 * shape.Sigma + 0.5 * spectrum.PixelWidth[i]) continue;
            if (offset <= 0) below++;
            if (offset >= 0) above++;
        }

        return below > 0 && above > 0 && all >= unknowns + 2;
    }

    /// <summary>Values of the basis at a pixel: 1, slope, line, change with shift, change with width, neighbours.</summary>
    private static void Basis(double ln, State state, LineShape shape, ReadOnlySpan<Neighbour> neighbours, Span<double> basis)
    {
        basis[0] = 1;
        basis[1] = (ln - shape.Centre) / (5 * shape.Sigma);
        basis[2] = basis[3] = basis[4] = 0;
        AddProfile(ln, state.Centre, state.Sigma, state.Amplitude, 2, true, basis);
        for (var k = 0; k < neighbours.Length; k++)
        {
            var (centre, sigma, tied) = neighbours[k];
            if (tied) (centre, sigma) = (centre + state.Centre - shape.Centre, state.Sigma);
            AddProfile(ln, centre, sigma, state.Neighbours[k], 5 + k, tied, basis);
        }
    }

    private static void AddProfile(double ln, double centre, double sigma, double amplitude, int at, bool moves, Span<double> basis)
    {
        var t = (ln - centre) / sigma;
        var profile = Math.Abs(t) < 6 ? Math.Exp(-0.5 * t * t) : 0;
        basis[at] = profile;
        if (!moves) return;
        basis[3] += amplitude * profile * t;
        basis[4] += amplitude * profile * t * t;
    }

    private static void Accumulate(
        NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, int from, int to, State state, LineShape shape,
        ReadOnlySpan<Neighbour> neighbours, Span<double> matrix, Span<double> right)
    {
        matrix.Clear();
        right.Clear();
        var n = right.Length;
        Span<double> basis = stackalloc double[MostUnknowns];
        for (var i = from; i < to; i++)
        {
            double w = spectrum.Weight[i];
            if (w <= 0) continue;
            Basis(spectrum.LnWavelength[i], state, shape, neighbours, basis);
            for (var j = 0; j < n; j++)
            {
                var wb = w * basis[j];
                right[j] += wb * flux[i];
                for (var k = j; k < n; k++) matrix[j * n + k] += wb * basis[k];
            }
        }

        for (var j = 0; j < n; j++)
            for (var k = 0; k < j; k++) matrix[j * n + k] = matrix[k * n + j];
        AddPriors(state, shape, matrix, right);
    }

    private static void AddPriors(State state, LineShape shape, Span<double> matrix, Span<double> right)
    {
        var n = right.Length;
        var centre = state.Sigma / shape.CentreSpread;
        matrix[3 * n + 3] += centre * centre;
        right[3] += centre * centre * (shape.Centre - state.Centre) / state.Sigma;
        matrix[4 * n + 4] += 1 / (LnSigmaSpread * LnSigmaSpread);
        right[4] += (Math.Log(shape.Sigma) - state.LnSigma) / (LnSigmaSpread * LnSigmaSpread);
    }

    private static void Multiply(ReadOnlySpan<double> inverse, Span<double> vector)
    {
        var n = vector.Length;
        Span<double> product = stackalloc double[MostUnknowns];
        for (var i = 0; i < n; i++)
            for (var j = 0; j < n; j++) product[i] += inverse[i * n + j] * vector[j];
        product[..n].CopyTo(vector);
    }

    private static FittedLine Describe(
        NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, int from, int to, State state, LineShape shape,
        ReadOnlySpan<Neighbour> neighbours, ReadOnlySpan<double> inverse, bool widthIsFree)
    {
        var n = 5 + neighbours.Length;
        var excess = Excess(spectrum, flux, from, to, state, shape, neighbours, n);
        double sigma = state.Sigma, place = (state.Centre - shape.Centre) / (5 * shape.Sigma);
        var continuum = state.Level + state.Slope * place;
        // ∫ exp(−(x−c)²/2σ²) eˣ dx, for dλ = eˣ dx.
        var area = RootTwoPi * sigma * Math.Exp(state.Centre + 0.5 * sigma * sigma);
        Span<double> ofFlux = [0, 0, area, 0, widthIsFree ? area * state.Amplitude : 0];
        Span<double> ofContinuum = [1, place, 0, 0, 0];
        var line = area * state.Amplitude;
        Span<double> ofWidth = stackalloc double[5];
        for (var i = 0; i < 5; i++) ofWidth[i] = (line * ofContinuum[i] / continuum - ofFlux[i]) / continuum;
        return new()
        {
            Centre = state.Centre,
            CentreErr = sigma * Math.Sqrt(excess * inverse[3 * n + 3]),
            Sigma = sigma,
            LnSigmaErr = Math.Sqrt(excess * inverse[4 * n + 4]),
            Amplitude = state.Amplitude,
            Continuum = continuum,
            ContinuumErr = Error(ofContinuum, inverse, n, excess),
            Flux = line,
            FluxErr = Error(ofFlux, inverse, n, excess),
            EquivalentWidth = -line / continuum,
            EquivalentWidthErr = Error(ofWidth, inverse, n, excess),
        };
    }

    private static double Error(ReadOnlySpan<double> gradient, ReadOnlySpan<double> inverse, int n, double excess)
    {
        double sum = 0;
        for (var i = 0; i < gradient.Length; i++)
            for (var j = 0; j < gradient.Length; j++) sum += gradient[i] * inverse[i * n + j] * gradient[j];
        return Math.Sqrt(excess * sum);
    }

    /// <summary>χ² per degree of freedom, as far as it is above what noise reaches within 2σ; at least 1.</summary>
    private static double Excess(
        NormalizedSpectrum spectrum, ReadOnlySpan<float> flux, int from, int to, State state, LineShape shape, ReadOnlySpan<Neighbour> neighbours, int n)
    {
        double sum = 0;
        var count = -n;
        Span<double> basis = stackalloc double[MostUnknowns];
        for (var i = from; i < to; i++)
        {
            if (spectrum.Weight[i] <= 0) continue;
            Basis(spectrum.LnWavelength[i], state, shape, neighbours, basis);
            var model = state.Level + state.Slope * basis[1] + state.Amplitude * basis[2];
            for (var k = 0; k < neighbours.Length; k++) model += state.Neighbours[k] * basis[5 + k];
            sum += spectrum.Weight[i] * (flux[i] - model) * (flux[i] - model);
            count++;
        }

        return Math.Max(1, sum / count - 2 * Math.Sqrt(2.0 / count));
    }

    private sealed class State(LineShape shape, int neighbours)
    {
        public double Centre { get; private set; } = shape.Centre;

        public double LnSigma { get; private set; } = Math.Log(shape.Sigma);

        public double Sigma { get; private set; } = Math.Exp(Math.Log(shape.Sigma));

        public double Level { get; private set; }

        public double Slope { get; private set; }

        public double Amplitude { get; private set; }

        public double[] Neighbours { get; } = new double[neighbours];

        /// <summary>Takes a step; true when it no longer matters.</summary>
        public bool Move(ReadOnlySpan<double> solution, LineShape shape)
        {
            var first = Amplitude == 0;
            (Level, Slope, Amplitude) = (solution[0], solution[1], solution[2]);
            for (var k = 0; k < Neighbours.Length; k++) Neighbours[k] = solution[5 + k];
            if (first) return false;
            double centre = Centre, lnSigma = LnSigma;
            Centre = Math.Clamp(Centre + Sigma * Math.Clamp(solution[3], -0.5, 0.5), shape.Centre - MostShift * shape.CentreSpread, shape.Centre + MostShift * shape.CentreSpread);
            LnSigma = Math.Max(LnSigma + Math.Clamp(solution[4], -0.35, 0.35), Math.Log(shape.LeastSigma));
            Sigma = Math.Exp(LnSigma);
            return Math.Abs(Centre - centre) < Settled * Sigma && Math.Abs(LnSigma - lnSigma) < Settled;
        }
    }
}
