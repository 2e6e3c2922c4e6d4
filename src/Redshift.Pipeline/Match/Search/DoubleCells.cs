namespace Redshift.Pipeline.Match.Search;

/// <summary>Neighbouring <see cref="Cells"/> summed in twos, for templates without narrower lines, or a coarser look.</summary>
internal sealed class DoubleCells
{
    /// <summary>Empty double cells kept on both sides.</summary>
    public const int Margin = Cells.Margin / 2;

    public DoubleCells(Cells cells)
    {
        First = cells.First >> 1;
        var count = ((cells.First + cells.Count - 1) >> 1) - First + 1;
        (Gradient, Curvature) = (new float[count], new float[count]);
        for (var k = 0; k < cells.Count; k++)
        {
            var at = ((cells.First + k) >> 1) - First;
            Gradient[at] += cells.TemplateGradient[k];
            Curvature[at] += cells.TemplateCurvature[k];
        }
    }

    /// <summary>Absolute index of element 0: double cell j is cells 2j and 2j + 1.</summary>
    public int First { get; }

    /// <summary>Data against a template that multiplies the continuum.</summary>
    public float[] Gradient { get; }

    /// <summary>The template's own curvature at strength one.</summary>
    public float[] Curvature { get; }
}
