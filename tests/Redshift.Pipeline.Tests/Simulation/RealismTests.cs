using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources;
using Redshift.Simulation.Sources.Galaxies;
using Redshift.Simulation.Sources.Quasars;
using Redshift.Simulation.Sources.Stars;
using Xunit;

namespace Redshift.Pipeline.Tests.Simulation;

/// <summary>Simulated objects, averaged over their scatter, against published means: loose bounds, for every object differs.</summary>
public class RealismTests
{
    private const int Draws = 12;

    // Indices of Worthey et al. 1994 and Worthey & Ottaviani 1997 (air Å): blue side band, band, red side band.
    private static readonly double[] HdeltaA = [4041.6, 4079.75, 4083.5, 4122.25, 4128.5, 4161];
    private static readonly double[] G4300 = [4266.375, 4282.625, 4281.375, 4316.375, 4318.875, 4335.125];
    private static readonly double[] Hbeta = [4827.875, 4847.875, 4847.875, 4876.625, 4876.625, 4891.625];
    private static readonly double[] Mgb = [5142.625, 5161.375, 5160.125, 5192.625, 5191.375, 5206.375];
    private static readonly double[] Fe5270 = [5233.15, 5248.15, 5245.65, 5285.65, 5285.65, 5318.15];
    private static readonly double[] NaD = [5860.625, 5875.625, 5876.875, 5909.375, 5922.125, 5948.125];
    private static readonly double[] CalciumK = [3903, 3923, 3924.7, 3942.7, 4000, 4020];

    // Values measured on the library of Pickles 1998 (PASP 110, 863) at 5 Å resolution; temperatures after Pecaut & Mamajek 2013.
    [Theory]
    [InlineData(9700, 4.2, nameof(HdeltaA), 13.2, 0.2)]
    [InlineData(9700, 4.2, nameof(Hbeta), 8.1, 0.2)]
    [InlineData(8080, 4.2, nameof(CalciumK), 2.65, 0.3)]
    [InlineData(7220, 4.2, nameof(HdeltaA), 8.2, 0.25)]
    [InlineData(5770, 4.4, nameof(Hbeta), 2.57, 0.3)]
    [InlineData(5770, 4.4, nameof(Mgb), 3.1, 0.3)]
    [InlineData(5770, 4.4, nameof(Fe5270), 1.97, 0.3)]
    [InlineData(5770, 4.4, nameof(G4300), 4.99, 0.3)]
    [InlineData(5770, 4.4, nameof(CalciumK), 8.27, 0.25)]
    [InlineData(4600, 4.6, nameof(Mgb), 6.12, 0.3)]
    [InlineData(4600, 4.6, nameof(NaD), 6.72, 0.35)]
    [InlineData(4800, 2.5, nameof(Mgb), 1.63, 0.6)]
    [InlineData(4800, 2.5, nameof(G4300), 5.22, 0.35)]
    public void Stars_have_the_line_strengths_of_their_type(double temperature, double logGravity, string index, double published, double tolerance)
    {
        double[] bands = index switch
        {
            nameof(HdeltaA) => HdeltaA,
            nameof(G4300) => G4300,
            nameof(Hbeta) => Hbeta,
            nameof(Mgb) => Mgb,
            nameof(Fe5270) => Fe5270,
            nameof(NaD) => NaD,
            _ => CalciumK,
        };
        var mean = Mean(temperature, logGravity, star => EquivalentWidth(star, bands));
        Assert.InRange(mean, published * (1 - tolerance), published * (1 + tolerance));
    }

    // The same library: break at 4000 Å as F_ν ratio of 4000–4100 to 3850–3950 (Balogh et al. 1999), and TiO5 (Reid et al. 1995).
    [Theory]
    [InlineData(9700, 4.2, 1.19, 0.1)]
    [InlineData(5770, 4.4, 1.73, 0.12)]
    [InlineData(4600, 4.6, 2.48, 0.2)]
    [InlineData(4800, 2.5, 2.59, 0.25)]
    public void Stars_have_the_break_of_their_type(double temperature, double logGravity, double published, double tolerance)
    {
        var mean = Mean(temperature, logGravity, star => MeanNu(star, 4000, 4100) / MeanNu(star, 3850, 3950));
        Assert.InRange(mean, published * (1 - tolerance), published * (1 + tolerance));
    }

    [Theory]
    [InlineData(3850, 0.87, 0.06)]
    [InlineData(3550, 0.74, 0.1)]
    [InlineData(3200, 0.48, 0.12)]
    public void Red_dwarfs_have_the_titanium_oxide_of_their_type(double temperature, double published, double tolerance)
    {
        var mean = Mean(temperature, 4.8, star => MeanFlux(star, 7126, 7135) / MeanFlux(star, 7042, 7046));
        Assert.InRange(mean, published - tolerance, published + tolerance);
    }

    // Equivalent widths of the composite of Vanden Berk et al. 2001 (AJ 122, 549), table 2; each quasar differs by half.
    [Theory]
    [InlineData(1549, 1450, 1465, 1700, 1710, 23.8, 0.5)]
    [InlineData(4862, 4760, 4790, 5080, 5110, 62, 0.5)]
    [InlineData(6565, 6250, 6280, 6790, 6820, 195, 0.4)]
    public void Quasars_have_the_equivalent_widths_of_the_composite(
        double line, double blueFrom, double blueTo, double redFrom, double redTo, double published, double tolerance)
    {
        var grid = LogGrid.Cover(line * 0.8, line * 1.2, 60);
        var mean = Enumerable.Range(0, 60).Average(i =>
        {
            var quasar = QuasarPainter.Common(grid, 2.5, RandomSource.ForMember(11, (ulong)i));
            return -Width(quasar, [blueFrom, blueTo, blueTo, redFrom, redFrom, redTo], wavelength => wavelength);
        });
        Assert.InRange(mean, published * (1 - tolerance), published * (1 + tolerance));
    }

    // Low-ionisation lines of the composite of Shapley et al. 2003 (ApJ 588, 65), table 2: 1.63, 1.72, 1.72 Å.
    [Theory]
    [InlineData(1260.42, 1.63)]
    [InlineData(1334.53, 1.72)]
    [InlineData(1526.71, 1.72)]
    public void Ultraviolet_galaxies_have_the_interstellar_lines_of_the_composite(double line, double published)
    {
        var grid = LogGrid.Cover(1180, 1700, 60);
        var mean = Enumerable.Range(0, 40).Average(i =>
            Width(UltravioletPainter.Draw(grid, 3, RandomSource.ForMember(12, (ulong)i)), [line - 9, line - 6.5, line - 6, line + 4, line + 6, line + 9], wavelength => wavelength));
        Assert.InRange(mean, 0.6 * published, 1.4 * published);
    }

    // Mean transmission of the Lyman α forest: exp(−τ), τ = 0.751 ((1+z)/4.5)^2.90 − 0.132 (Becker et al. 2013, MNRAS 430, 2067).
    [Theory]
    [InlineData(2.5)]
    [InlineData(3.5)]
    [InlineData(4.5)]
    public void The_forest_lets_the_published_share_of_light_through(double absorber)
    {
        var z = ((1 + absorber) * 1215.67 / 1110) - 1;
        var grid = LogGrid.Cover(1100, 1120, 20);
        var mean = Enumerable.Range(0, 150).Average(i =>
        {
            var flat = new Canvas(grid).Fill(_ => 1);
            Sightline.Absorb(flat, z, RandomSource.ForMember(13, (ulong)i));
            return flat.Flux.Average();
        });
        var published = Math.Exp(0.132 - (0.751 * Math.Pow((1 + absorber) / 4.5, 2.9)));
        // Foreground dust takes some 5 to 10 % besides.
        Assert.InRange(mean, published - 0.12, published + 0.04);
    }

    private static double Mean(double temperature, double logGravity, Func<Canvas, double> measure)
    {
        var grid = LogGrid.Cover(3700, 7300, 30);
        return Enumerable.Range(0, Draws).Average(i =>
            measure(Photosphere.Draw(grid, new(temperature, logGravity, 0, 2), RandomSource.ForMember(10, (ulong)i)).Broaden(120)));
    }

    private static double EquivalentWidth(Canvas star, double[] bands) => Width(star, bands, Air.ToVacuum);

    private static double Width(Canvas canvas, double[] bands, Func<double, double> vacuum)
    {
        double[] edges = [.. bands.Select(vacuum)];
        var (blue, red) = (MeanBetween(canvas, edges[0], edges[1], _ => 1), MeanBetween(canvas, edges[4], edges[5], _ => 1));
        var (from, to) = (0.5 * (edges[0] + edges[1]), 0.5 * (edges[4] + edges[5]));
        var depth = Inside(canvas, edges[2], edges[3]).Average(i => 1 - (canvas.Flux[i] / (blue + ((red - blue) * (canvas.Grid.Wavelength[i] - from) / (to - from)))));
        return depth * (edges[3] - edges[2]);
    }

    private static double MeanFlux(Canvas canvas, double from, double to) => MeanBetween(canvas, Air.ToVacuum(from), Air.ToVacuum(to), _ => 1);

    private static double MeanNu(Canvas canvas, double from, double to) => MeanBetween(canvas, from, to, wavelength => wavelength * wavelength);

    private static double MeanBetween(Canvas canvas, double from, double to, Func<double, double> weight) =>
        Inside(canvas, from, to).Average(i => canvas.Flux[i] * weight(canvas.Grid.Wavelength[i]));

    private static IEnumerable<int> Inside(Canvas canvas, double from, double to) =>
        Enumerable.Range(0, canvas.Flux.Length).Where(i => canvas.Grid.Wavelength[i] >= from && canvas.Grid.Wavelength[i] < to);
}
