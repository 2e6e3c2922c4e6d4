using System.Collections.Concurrent;
using Redshift.Physics.Air;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// What the Earth's atmosphere lets pass where nobody corrected for it, on <see cref="TemplateGrid"/> in the observatory's frame: dry air,
/// whose oxygen is computed, and water, whose bands are drawn as they look at low resolution through some 3 mm. A spectrum has as much of
/// either as the fit finds, none where it was corrected.
/// </summary>
internal sealed class AirTransmission
{
    /// <summary>Index on the grid of the first value, where the first band begins.</summary>
    public static readonly int Offset = (int)((Math.Log(5850) - TemplateGrid.LnStart) / TemplateGrid.Step);

    /// <summary>Points of a cell of the grid at which oxygen is computed: its lines are far narrower.</summary>
    private const int Points = 40;

    /// <summary>Mean transmission of water vapour between wavelengths in air, Å (common practice, from memory, rough).</summary>
    private static readonly (double Air, double Transmission)[] Water =
    [
        (5870, 1), (5890, .98), (5950, .97), (5990, 1), (6470, 1), (6500, .97), (6560, .97), (6600, 1), (7160, 1), (7180, .83), (7230, .82), (7280, .85), (7320, .90),
        (7345, 1), (8100, 1), (8150, .88), (8180, .85), (8230, .85), (8280, .90), (8350, .95), (8400, 1), (8910, 1), (8950, .86), (9000, .86), (9060, .90), (9120, .84),
        (9200, .88), (9280, .72), (9320, .52), (9380, .50), (9440, .55), (9500, .60), (9560, .68), (9620, .80), (9700, .86), (9800, .93), (9900, 1), (10700, 1), (10900, .95),
        (11000, .97), (11100, .85), (11150, .65), (11250, .55), (11350, .50), (11450, .60), (11550, .72), (11650, .88), (11800, .95), (12000, 1), (13000, 1), (13100, .93),
        (13250, .85), (13400, .65), (13500, .25), (13600, .08), (13800, .03), (14000, .08), (14200, .25), (14400, .45), (14600, .65), (14800, .78), (15000, .90), (15200, 1),
        (17300, 1), (17500, .90), (17700, .75), (17900, .45), (18100, .15), (18300, .03), (18700, .01), (19000, .05), (19300, .30), (19500, .50), (19700, .70), (19900, .90),
        (20100, 1), (23200, 1), (23500, .85), (24000, .7), (24500, .6), (25000, .5),
    ];

    /// <summary>The same of carbon dioxide.</summary>
    private static readonly (double Air, double Transmission)[] CarbonDioxide =
        [(19950, 1), (20050, .65), (20150, .6), (20220, .75), (20280, 1), (20450, 1), (20550, .65), (20650, .7), (20730, 1)];

    private readonly float[] _absorbed;
    private readonly ConcurrentDictionary<int, float[]> _broadened = new();

    private AirTransmission(Func<double, double> transmission)
    {
        _absorbed = new float[TemplateGrid.Count - Offset];
        for (var i = 0; i < _absorbed.Length; i++) _absorbed[i] = (float)(1 - transmission(TemplateGrid.Wavelength(Offset + i)));
    }

    /// <summary>Dry air and water.</summary>
    public static IReadOnlyList<AirTransmission> All { get; } = [new(w => Oxygen(w) * Between(CarbonDioxide, w)), new(w => Between(Water, w))];

    /// <summary>Share of the light that is absorbed, as an instrument sees it; element 0 is point <see cref="Offset"/> of the grid.</summary>
    /// <param name="level">One of <see cref="LineSpreadLevels"/>.</param>
    public float[] Absorbed(int level) => _broadened.GetOrAdd(level, l => GaussianFilter.Convolve(_absorbed, LineSpreadLevels.Sigma(l) / TemplateGrid.Step));

    private static double Oxygen(double wavelength)
    {
        double Depth(int point) => OxygenAbsorption.Depth(1e8 / wavelength / (1 + ((point + 0.5) / Points - 0.5) * TemplateGrid.Step));
        // Between two points that no line reaches there is none: nearly the whole grid is clear.
        if (Depth(0) == 0 && Depth(Points - 1) == 0) return 1;
        double sum = 0;
        for (var i = 0; i < Points; i++) sum += Math.Exp(-Depth(i));
        return sum / Points;
    }

    private static double Between((double Air, double Transmission)[] table, double vacuum)
    {
        var air = AirRefraction.ToAir(vacuum);
        var next = Array.FindIndex(table, row => row.Air > air);
        if (next <= 0) return next < 0 ? table[^1].Transmission : 1;
        var share = (air - table[next - 1].Air) / (table[next].Air - table[next - 1].Air);
        return table[next - 1].Transmission + share * (table[next].Transmission - table[next - 1].Transmission);
    }
}
