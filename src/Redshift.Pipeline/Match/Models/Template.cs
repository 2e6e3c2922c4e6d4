using Redshift.Physics.Units;
using Redshift.Pipeline.Numerics;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// A computed spectrum at rest on <see cref="TemplateGrid"/>, its colour taken out: what is left are lines, bands, breaks and jumps.
/// Broadened copies are made on first use and shared by all workers.
/// </summary>
internal sealed class Template
{
    /// <summary>Structure wider than this σ in ln λ is colour, which dust and flux calibration change at will.</summary>
    private const double ColourScale = 0.10;

    private static readonly RecentlyUsed<(Template Template, int Level, Stretch Stretch), float[]> Copies =
        new(96 << 20, static key => key.Template.Broaden(key.Level, key.Stretch), static copy => copy.Length * sizeof(float));

    private readonly float[] _flattened;

    /// <summary>Takes a computed spectrum.</summary>
    /// <param name="name">What the model is.</param>
    /// <param name="kind">The kind it stands for.</param>
    /// <param name="flux">F_λ on the template grid, positive.</param>
    /// <param name="spectralType">Spectral type of a star, else empty.</param>
    public Template(string name, ObjectKind kind, float[] flux, string spectralType = "")
    {
        Name = name;
        Kind = kind;
        SpectralType = spectralType;
        _flattened = Flatten(flux);
    }

    private Template(Template original, double sigmaKmS)
    {
        Name = original.Name + " rotating";
        Kind = original.Kind;
        SpectralType = original.SpectralType;
        _flattened = GaussianFilter.Convolve(original._flattened, sigmaKmS / Velocity.SpeedOfLightKmS / TemplateGrid.Step);
    }

    public string Name { get; }

    public ObjectKind Kind { get; }

    public string SpectralType { get; }

    /// <summary>The same spectrum with lines broadened by rotation.</summary>
    public Template Spun(double sigmaKmS) => new(this, sigmaKmS);

    /// <summary>The flattened flux convolved to a level of <see cref="LineSpreadLevels"/>, over a stretch of the template grid.</summary>
    public float[] Broadened(int level, Stretch stretch) => Copies[(this, level, stretch)];

    /// <summary>The same over the whole grid, not kept, for who makes something else of it.</summary>
    /// <param name="level">The level.</param>
    /// <param name="into">Receives the values, <see cref="TemplateGrid.Count"/> of them.</param>
    public void Broaden(int level, Span<float> into) => GaussianFilter.Convolve(_flattened, LineSpreadLevels.Sigma(level) / TemplateGrid.Step, into);

    // What lies further from a stretch than the filter reaches does not touch it.
    private float[] Broaden(int level, Stretch stretch)
    {
        var sigma = LineSpreadLevels.Sigma(level) / TemplateGrid.Step;
        var reach = GaussianFilter.Reach(sigma);
        int from = Math.Max(0, stretch.Start - reach), to = Math.Min(_flattened.Length, stretch.End + reach);
        using var lent = new LentArray<float>(to - from);
        GaussianFilter.Convolve(_flattened.AsSpan(from..to), sigma, lent.Span);
        return lent.Span[(stretch.Start - from)..(stretch.End - from)].ToArray();
    }

    private static float[] Flatten(float[] flux)
    {
        var logs = Array.ConvertAll(flux, f => MathF.Log(Math.Max(f, 1e-30f)));
        var smooth = GaussianFilter.Convolve(logs, ColourScale / TemplateGrid.Step);
        for (var i = 0; i < logs.Length; i++) logs[i] = MathF.Exp(logs[i] - smooth[i]);
        return logs;
    }
}
