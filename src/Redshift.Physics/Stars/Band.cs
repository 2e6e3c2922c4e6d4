namespace Redshift.Physics.Stars;

/// <summary>
/// One vibrational band with its P, Q and R branches, the rotational lines smeared out: ν = ν₀ + (B′ + B″) m + (B′ − B″) m²
/// (Herzberg 1950), level populations of Boltzmann. The head is where the parabola turns; its shape follows from B′ and B″ alone.
/// </summary>
/// <param name="Origin">Wavenumber of the band origin in cm⁻¹, vacuum.</param>
/// <param name="Upper">Rotational constant B′ in cm⁻¹.</param>
/// <param name="Lower">Rotational constant B″ in cm⁻¹.</param>
/// <param name="QShare">Share of the Q branch; P and R have half of the rest each.</param>
/// <param name="CrossSection">Integrated cross-section of a molecule of the gas, in cm.</param>
internal readonly record struct Band(double Origin, double Upper, double Lower, double QShare, double CrossSection)
{
    private const double Faintest = 0.005;

    /// <summary>Vacuum wavelength of the origin in Å.</summary>
    public double Wavelength => 1e8 / Origin;

    private double Head => Origin - ((Upper + Lower) * (Upper + Lower) / (4 * (Upper - Lower)));

    /// <summary>Origin of a band whose P or R head stands at a wavenumber.</summary>
    public static double OriginOfHead(double head, double upper, double lower) =>
        head + ((upper + lower) * (upper + lower) / (4 * (upper - lower)));

    /// <summary>
    /// Adds absorbers (per hydrogen nucleus, over the continuous opacity) times the cross-section, mean over each grid step; returns the
    /// first and last point that it touched.
    /// </summary>
    public (int First, int Last) Add(Span<double> ratio, LogWavelengthGrid grid, double kelvin, double absorbersOverOpacity)
    {
        var strength = absorbersOverOpacity * CrossSection;
        var spread = Cgs.WavenumberKelvin * Lower / kelvin;
        var curvature = Upper - Lower;
        var extent = Math.Abs(curvature) / spread;
        if (strength < Faintest * extent)
            return (int.MaxValue, -1);
        var turn = -(Upper + Lower) / (2 * curvature);

        // Beyond this level the band is fainter than the faintest: few lines of a weak band, many of a saturated one.
        var last = Math.Sqrt((1 + Math.Log(strength / (Faintest * extent))) / spread);
        return AddBranches(ratio, grid, strength, spread, curvature, turn, Ends(last, curvature, turn));
    }

    // Highest and lowest wavenumber of the lines with |m| up to a last one; the head counts only if it is among them.
    private (double Blue, double Red) Ends(double last, double curvature, double turn)
    {
        var (middle, half) = (Origin + (curvature * last * last), (Upper + Lower) * last);
        var (p, r) = (middle - half, middle + half);
        var (blue, red) = (Math.Max(p, r), Math.Min(p, r));
        if (Math.Abs(turn) < last)
            (blue, red) = (Math.Max(blue, Head), Math.Min(red, Head));
        return (blue, Math.Max(red, Origin / 2));
    }

    private (int First, int Last) AddBranches(
        Span<double> ratio,
        LogWavelengthGrid grid,
        double strength,
        double spread,
        double curvature,
        double turn,
        (double Blue, double Red) ends)
    {
        var first = Math.Max(0, (int)Math.Floor(grid.Position(1e8 / ends.Blue)));
        var last = Math.Min(grid.Count - 1, (int)Math.Ceiling(grid.Position(1e8 / ends.Red)));
        if (first > last)
            return (int.MaxValue, -1);
        var (head, origin) = (grid.Position(1e8 / Math.Clamp(Head, Origin / 2, 2 * Origin)), grid.Position(1e8 / Origin));
        var edges = grid.EdgeWavenumbers;
        var edge = edges[first];
        var before = Cumulative(edge, spread, curvature, turn);
        for (var i = first; i <= last;)
        {
            // Far from head and origin the band is smooth, so steps grow with the distance from them.
            var length = Math.Min(Math.Max(1, (int)(Math.Min(Math.Abs(i - head), Math.Abs(i - origin)) / 18)), last - i + 1);
            var next = edges[i + length];
            var after = Cumulative(next, spread, curvature, turn);
            var mean = strength * Math.Abs(after - before) / (edge - next);
            foreach (ref var r in ratio.Slice(i, length))
                r += mean;
            i += length;
            (edge, before) = (next, after);
        }

        return (first, last);
    }

    // Share of the band's strength between its head (or origin for the Q branch) and a wavenumber.
    private double Cumulative(double wavenumber, double spread, double curvature, double turn)
    {
        var fromHead = Math.Max(0, (wavenumber - Head) / curvature);
        var x = Math.Sqrt(fromHead);
        var near = Below(turn + x, spread) - Below(turn - x, spread);
        var q = QShare > 0 ? 1 - FastExponential.OfMinus(spread * Math.Max(0, (wavenumber - Origin) / curvature)) : 0;
        return ((1 - QShare) * near) + (QShare * q);
    }

    // Integral of spread |m| exp(−spread m²) up to m, both branches together normalized to one.
    private static double Below(double m, double spread)
    {
        var half = (1 - FastExponential.OfMinus(spread * m * m)) / 2;
        return m < 0 ? 0.5 - half : 0.5 + half;
    }
}
