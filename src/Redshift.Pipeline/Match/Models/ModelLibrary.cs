using Redshift.Physics.Stars;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Models;

/// <summary>All models of all kinds, computed once a process and shared.</summary>
internal sealed class ModelLibrary
{
    private static readonly Lazy<ModelLibrary> Lazy = new(() => new ModelLibrary());

    private readonly LogWavelengthGrid _grid = new(TemplateGrid.LnStart, TemplateGrid.Step, TemplateGrid.Count);
    private readonly Dictionary<StellarParameters, StellarSpectrum> _stars = [];

    private ModelLibrary()
    {
        Stars = WithEqualShares(WithPartners(StellarModel.StandardGrid.Select(p => (p, Star(p))).ToList()));
        StarTemplates = [.. Stars.Select(s => s.Template!)];
        var mixes = StellarMix.Ages.ToDictionary(m => m.Name, m => m.Compute(StarFlux));
        Galaxies = WithEqualShares(WithPartners([.. GalaxyTemplates(mixes).Select(t => Galaxy(t.Template, t.GreatestZ))]));
        Quasars = WithEqualShares(QuasarTemplates(mixes).SelectMany(t => Widths.SelectMany(w => QuasarLines.Winds.Select(v => Quasar(t, w, v)))));
        Comets =
        [
            .. Stars.Where(m => m.Template!.SpectralType.StartsWith("G4V", StringComparison.Ordinal)).Take(1)
                .Select(m => m with { Kind = ObjectKind.Unknown, Name = "sunlight with cometary bands", Groups = CometBands.All, LnPrior = 0 }),
        ];
        Nebulae = WithEqualShares([new FitModel { Kind = ObjectKind.Nebula, Name = "ionised gas", Groups = NebulaLines.All, NarrowKmS = 15 }]);
        // Some 40 MB that nothing asks for again.
        _stars.Clear();
    }

    /// <summary>Reflected sunlight with cometary bands.</summary>
    public IReadOnlyList<FitModel> Comets { get; }

    public static ModelLibrary Instance => Lazy.Value;

    public IReadOnlyList<FitModel> Stars { get; }

    /// <summary>The computed spectra of the stars, in their order.</summary>
    public IReadOnlyList<Template> StarTemplates { get; }

    public IReadOnlyList<FitModel> Galaxies { get; }

    public IReadOnlyList<FitModel> Quasars { get; }

    public IReadOnlyList<FitModel> Nebulae { get; }

    /// <summary>The models of one kind.</summary>
    public IReadOnlyList<FitModel> OfKind(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => Stars,
        ObjectKind.Galaxy => Galaxies,
        ObjectKind.Quasar => Quasars,
        ObjectKind.Nebula => Nebulae,
        _ => Comets,
    };

    /// <summary>σ of broad lines, km/s.</summary>
    public static IReadOnlyList<double> Widths { get; } = [800, 1700, 3500];

    private FitModel Star(StellarParameters parameters)
    {
        var star = Compute(parameters);
        var name = $"{star.SpectralType} {parameters.TemperatureK:F0} K log g {parameters.LogGravity:F1} [M/H] {parameters.Metallicity:F1}";
        return new() { Kind = ObjectKind.Star, Name = name, Template = new Template(name, ObjectKind.Star, StarFlux(parameters), star.SpectralType) };
    }

    /// <summary>
    /// A star's partners: the next hotter and cooler of its sort, the nearest of other gravity and of other metallicity,
    /// and itself spun up, for hot stars rotate.
    /// </summary>
    private static IEnumerable<FitModel> WithPartners(List<(StellarParameters Parameters, FitModel Model)> stars)
    {
        foreach (var (own, model) in stars)
        {
            var sort = stars.FindAll(s => s.Parameters.Variant == own.Variant && s.Parameters != own);
            bool SameGravity(StellarParameters p) => Math.Abs(p.LogGravity - own.LogGravity) < 0.8;
            bool SameMetals(StellarParameters p) => Math.Abs(p.Metallicity - own.Metallicity) < 0.3;
            FitModel? Nearest(Func<StellarParameters, bool> wanted) =>
                sort.Where(s => wanted(s.Parameters)).OrderBy(s => Math.Abs(Math.Log(s.Parameters.TemperatureK / own.TemperatureK))).FirstOrDefault().Model;
            FitModel?[] partners =
            [
                Nearest(p => SameGravity(p) && SameMetals(p) && p.TemperatureK > own.TemperatureK),
                Nearest(p => SameGravity(p) && SameMetals(p) && p.TemperatureK < own.TemperatureK),
                Nearest(p => !SameGravity(p) && SameMetals(p)),
                Nearest(p => SameGravity(p) && !SameMetals(p)),
            ];
            var templates = partners.Where(p => p is not null).Select(p => p!.Template!);
            if (own.TemperatureK > 6500 && own.LogGravity < 5) templates = templates.Append(model.Template!.Spun(120));
            yield return model with { Partners = [.. templates] };
        }
    }

    /// <summary>Populations mix with an old, a middle and a young one; young stars behind gas with thicker and thinner gas.</summary>
    private static List<FitModel> WithPartners(List<FitModel> galaxies)
    {
        string[] plain = ["old", "1.5 Gyr", "0.03 Gyr"], gas = ["0.005 Gyr behind thin gas", "0.03 Gyr behind neutral gas", "0.6 Gyr behind gas"];
        return galaxies.ConvertAll(g => g with
        {
            Partners = [.. galaxies.Where(p => (g.BehindOwnGas ? gas : plain).Contains(p.Name) && p != g).Select(p => p.Template!)],
        });
    }

    private StellarSpectrum Compute(StellarParameters parameters)
    {
        if (!_stars.TryGetValue(parameters, out var star)) _stars[parameters] = star = StellarModel.Compute(parameters, _grid);
        return star;
    }

    private float[] StarFlux(StellarParameters parameters)
    {
        var star = Compute(parameters);
        var flux = new float[TemplateGrid.Count];
        for (var i = 0; i < flux.Length; i++) flux[i] = star.Relative[i] * star.Continuum[i];
        return flux;
    }

    private static IEnumerable<(Template Template, double GreatestZ)> GalaxyTemplates(Dictionary<string, float[]> mixes)
    {
        foreach (var mix in StellarMix.Ages) yield return (new Template(mix.Name, ObjectKind.Galaxy, mixes[mix.Name]), mix.GreatestZ);
        yield return (Blend("old with young", mixes["old"], mixes["0.03 Gyr"], 0.5), 1.5);
        yield return (WithGas("0.005 Gyr behind thin gas", mixes["0.005 Gyr"], 0.5, 0), 9);
        yield return (WithGas("0.005 Gyr behind gas", mixes["0.005 Gyr"], 1, 0), 9);
        yield return (WithGas("0.03 Gyr behind neutral gas", mixes["0.03 Gyr"], 1.3, 3), 9);
        yield return (WithGas("0.6 Gyr behind gas", mixes["0.6 Gyr"], 1, 0), 4);
    }

    private static IEnumerable<Template?> QuasarTemplates(Dictionary<string, float[]> mixes)
    {
        yield return null;
        yield return Blend("with its galaxy", mixes["old"], FlatFlux, 0.5);
        yield return BroadAbsorption.Template;
    }

    /// <summary>A featureless continuum.</summary>
    public static Template Flat { get; } = new("featureless", ObjectKind.Unknown, FlatFlux);

    private static float[] FlatFlux
    {
        get
        {
            var flat = new float[TemplateGrid.Count];
            Array.Fill(flat, 1f);
            return flat;
        }
    }

    private static Template Blend(string name, float[] first, float[] second, double share)
    {
        var flux = new float[first.Length];
        for (var i = 0; i < flux.Length; i++) flux[i] = (float)(share * first[i] + (1 - share) * second[i]);
        return new(name, ObjectKind.Galaxy, flux);
    }

    private static Template WithGas(string name, float[] stars, double strength, double column)
    {
        var flux = (float[])stars.Clone();
        InterstellarAbsorption.Apply(flux, strength, column);
        return new(name, ObjectKind.Galaxy, flux);
    }

    private static FitModel Galaxy(Template template, double greatestZ) => new()
    {
        Kind = ObjectKind.Galaxy,
        Name = template.Name,
        Template = template,
        Forest = true,
        Groups = GalaxyLines.All,
        GreatestLnShift = Math.Log(1 + greatestZ),
        BehindOwnGas = template.Name.Contains("gas", StringComparison.Ordinal),
    };

    private static FitModel Quasar(Template? template, double broad, (string Name, IReadOnlyList<EmissionGroup> Groups) wind) => new()
    {
        Kind = ObjectKind.Quasar,
        Name = $"{template?.Name ?? "quasar"}, broad lines {2.355 * broad:F0} km/s, {wind.Name}",
        Template = template,
        Forest = true,
        Groups = wind.Groups,
        BroadKmS = broad,
        NarrowKmS = 200,
    };

    private static List<FitModel> WithEqualShares(IEnumerable<FitModel> models)
    {
        var all = models.ToList();
        return all.ConvertAll(m => m with { LnPrior = -Math.Log(all.Count) });
    }
}
