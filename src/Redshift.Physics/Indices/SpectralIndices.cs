namespace Redshift.Physics.Indices;

/// <summary>Published definitions of spectral indices.</summary>
public static class SpectralIndices
{
    private const string Lick = "Worthey et al. 1994 ApJS 94 687; Trager et al. 1998 ApJS 116 1";
    private const string Balmer = "Worthey & Ottaviani 1997 ApJS 111 377";
    private const string Dwarfs = "Reid et al. 1995 AJ 110 1838";

    /// <summary>The absorption lines of old and intermediate stars: bands of the Lick system.</summary>
    public static IReadOnlyList<SpectralIndex> Lines { get; } =
    [
        Width("HdeltaA", 4041.600, 4079.750, 4083.500, 4122.250, 4128.500, 4161.000, Balmer),
        Width("HgammaA", 4283.500, 4319.750, 4319.750, 4363.500, 4367.250, 4419.750, Balmer),
        Width("HdeltaF", 4057.250, 4088.500, 4091.000, 4112.250, 4114.750, 4137.250, Balmer),
        Width("HgammaF", 4283.500, 4319.750, 4331.250, 4352.250, 4354.750, 4384.750, Balmer),
        Depth("CN1", 4080.125, 4117.625, 4142.125, 4177.125, 4244.125, 4284.125, Lick),
        Width("Ca4227", 4211.000, 4219.750, 4222.250, 4234.750, 4241.000, 4251.000, Lick),
        Width("G4300", 4266.375, 4282.625, 4281.375, 4316.375, 4318.875, 4335.125, Lick),
        Width("Fe4383", 4359.125, 4370.375, 4369.125, 4420.375, 4442.875, 4455.375, Lick),
        Width("Hbeta", 4827.875, 4847.875, 4847.875, 4876.625, 4876.625, 4891.625, Lick),
        Width("Fe5015", 4946.500, 4977.750, 4977.750, 5054.000, 5054.000, 5065.250, Lick),
        Depth("Mg1", 4895.125, 4957.625, 5069.125, 5134.125, 5301.125, 5366.125, Lick),
        Depth("Mg2", 4895.125, 4957.625, 5154.125, 5196.625, 5301.125, 5366.125, Lick),
        Width("Mgb", 5142.625, 5161.375, 5160.125, 5192.625, 5191.375, 5206.375, Lick),
        Width("Fe5270", 5233.150, 5248.150, 5245.650, 5285.650, 5285.650, 5318.150, Lick),
        Width("Fe5335", 5304.625, 5315.875, 5312.125, 5352.125, 5353.375, 5363.375, Lick),
        Width("NaD", 5860.625, 5875.625, 5876.875, 5909.375, 5922.125, 5948.125, Lick),
        Depth("TiO1", 5816.625, 5849.125, 5936.625, 5994.125, 6038.625, 6103.625, Lick),
        Depth("TiO2", 6066.625, 6141.625, 6189.625, 6272.125, 6372.625, 6415.125, Lick),
        Width("CaK18", 3903.000, 3923.000, 3924.700, 3942.700, 4000.000, 4020.000, "Beers et al. 1999 AJ 117 981"),
    ];

    /// <summary>The break at 4000 A with narrow bands.</summary>
    public static SpectralIndex Dn4000 { get; } =
        new("Dn4000", IndexKind.Break, new(4000, 4100), [new(3850, 3950)], "Balogh et al. 1999 ApJ 527 54");

    /// <summary>The break at 4000 A with wide bands.</summary>
    public static SpectralIndex D4000 { get; } =
        new("D4000", IndexKind.Break, new(4050, 4250), [new(3750, 3950)], "Bruzual 1983 ApJ 273 105");

    /// <summary>The band of TiO that gives the type of M dwarfs: type M = -10.775 TiO5 + 8.2.</summary>
    public static SpectralIndex TiO5 { get; } = Ratio("TiO5", new(7126, 7135));

    /// <summary>The band of CaH that tells dwarfs from subdwarfs and giants.</summary>
    public static SpectralIndex CaH2 { get; } = Ratio("CaH2", new(6814, 6846));

    /// <summary>The red band of CaH.</summary>
    public static SpectralIndex CaH3 { get; } = Ratio("CaH3", new(6960, 6990));

    /// <summary>Every index.</summary>
    public static IReadOnlyList<SpectralIndex> All { get; } = [.. Lines, Dn4000, D4000, TiO5, CaH2, CaH3];

    private static SpectralIndex Width(
        string name, double blueStart, double blueEnd, double start, double end, double redStart, double redEnd, string source)
        => new(name, IndexKind.EquivalentWidth, new(start, end), [new(blueStart, blueEnd), new(redStart, redEnd)], source);

    private static SpectralIndex Depth(
        string name, double blueStart, double blueEnd, double start, double end, double redStart, double redEnd, string source)
        => new(name, IndexKind.Magnitude, new(start, end), [new(blueStart, blueEnd), new(redStart, redEnd)], source);

    private static SpectralIndex Ratio(string name, WavelengthBand band)
        => new(name, IndexKind.FluxRatio, band, [new(7042, 7046)], Dwarfs);
}
