using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>Absorption of the Earth's atmosphere at the pixels, continuum × share absorbed: columns that every fit has, the smooth one too.</summary>
internal sealed class AirColumns
{
    /// <summary>
    /// Prior σ of the strength, in units of an uncorrected spectrum: corrected ones have none, or a little of either sign; wet nights more.
    /// </summary>
    private const double Spread = 1;

    /// <summary>Less is not drawn.</summary>
    private const float Least = 0.003f;

    private readonly List<List<(int Start, float[] Values)>> _columns = [];

    public AirColumns(FitPixels pixels)
    {
        foreach (var air in AirTransmission.All)
        {
            var values = Draw(pixels, air);
            var stretches = Enumerable.Range(0, pixels.Starts.Length - 1).SelectMany(s => Stretches(values, pixels.Starts[s], pixels.Starts[s + 1])).ToList();
            if (stretches.Count > 0) _columns.Add(stretches);
        }
    }

    /// <summary>Adds the columns.</summary>
    public void AddTo(FitColumns columns)
    {
        foreach (var stretches in _columns)
        {
            columns.Add().Spread = Spread;
            foreach (var (start, values) in stretches) values.CopyTo(columns.AddSegment(start, start + values.Length));
        }
    }

    /// <summary>The stretches of a spectrum in which there is something.</summary>
    private static IEnumerable<(int Start, float[] Values)> Stretches(float[] values, int start, int end)
    {
        for (var p = start; p < end; p++)
        {
            if (values[p] == 0) continue;
            var first = p;
            while (p < end && values[p] != 0) p++;
            yield return (first, values[first..p]);
        }
    }

    private static float[] Draw(FitPixels pixels, AirTransmission air)
    {
        var drawn = new float[pixels.Count];
        foreach (var (start, end, level) in pixels.Levels)
        {
            if (pixels.TemplateIndex[end - 1] < AirTransmission.Offset) continue;
            var absorbed = air.Absorbed(level);
            for (var p = start; p < end; p++)
            {
                var at = pixels.TemplateIndex[p] - AirTransmission.Offset;
                if (at < 0 || at + 1 >= absorbed.Length) continue;
                var share = absorbed[at] + pixels.TemplateFraction[p] * (absorbed[at + 1] - absorbed[at]);
                if (share > Least) drawn[p] = -share * pixels.Continuum[p];
            }
        }

        return drawn;
    }
}
