namespace Redshift.Simulation;

/// <summary>How often a set-up looks at a class of objects, and at which redshifts.</summary>
/// <param name="Setup">Set-up name.</param>
/// <param name="ObjectClass">Class name; <c>blank</c> is empty sky.</param>
/// <param name="Weight">Relative frequency.</param>
/// <param name="ZFrom">Lowest redshift; for stars and nebulae the velocity scatter in km/s over c.</param>
/// <param name="ZTo">Highest redshift.</param>
public sealed record SurveyEntry(string Setup, string ObjectClass, double Weight, double ZFrom, double ZTo);

/// <summary>A mixture of observations.</summary>
public sealed record SurveyMix(IReadOnlyList<SurveyEntry> Entries)
{
    /// <summary>Everything the simulation knows.</summary>
    public static SurveyMix Default { get; } = new(
    [
        .. Stars("fibre", 130, 1), .. Stars("fibre-stars", 110, 1.2), .. Stars("three-arms", 130, 0.7), .. Stars("amateur", 45, 1), .. Stars("course", 60, 0.8),
        .. Nearby("fibre", 0.8, 1.5), .. Nearby("three-arms", 1.1, 1), .. Nearby("course", 0.12, 0.5), .. Nearby("fibre-stars", 0.12, 0.3),
        .. Quasars("fibre", 0.05, 4.8, 4), .. Quasars("three-arms", 0.05, 4.5, 2.5), .. Quasars("course", 0.02, 3, 0.5), .. Quasars("fibre-stars", 0.1, 3, 0.4),
        new("fibre", "galaxy-ultraviolet", 0.3, 2.2, 4), new("three-arms", "galaxy-ultraviolet", 0.6, 2.2, 4.5),
        new("three-arms", "galaxy-star-forming", 1, 0.6, 1.6), new("three-arms", "galaxy-starburst", 0.3, 0.6, 1.6),
        new("fibre", "blank", 0.6, 0, 0), new("three-arms", "blank", 0.5, 0, 0), new("fibre-stars", "blank", 0.1, 0, 0),
        .. Faint("faint-slit"),
        .. Infrared("near-infrared"),
        new("two-arms", "quasar", 2, 5.7, 7), new("two-arms", "quasar-bal", 0.4, 5.7, 6.8), new("two-arms", "quasar", 0.6, 1.5, 5.7),
        new("two-arms", "galaxy-starburst", 0.4, 0.5, 2.6), new("two-arms", "galaxy-ultraviolet", 0.3, 3.5, 6.2), new("two-arms", "star-m", 0.3, 50, 0), new("two-arms", "blank", 0.2, 0, 0),
        new("amateur", "star-be", 0.6, 40, 0), new("amateur", "comet", 0.4, 0, 0), new("amateur", "supernova", 0.5, 0.003, 0.05), new("amateur", "nebula-planetary", 0.4, 40, 0),
        new("amateur", "nebula-hii", 0.3, 30, 0), new("amateur", "quasar", 0.3, 0.02, 0.5), new("amateur", "galaxy-active", 0.2, 0.002, 0.05), new("amateur", "galaxy-passive", 0.15, 0.001, 0.05),
        new("amateur-high", "star-be", 0.8, 40, 0), new("amateur-high", "star-hot", 0.4, 40, 0), new("amateur-high", "star-a", 0.3, 30, 0), new("amateur-high", "star-fg", 0.3, 30, 0),
        new("amateur-high", "star-giant", 0.3, 40, 0), new("amateur-high", "nebula-planetary", 0.2, 40, 0), new("amateur-high", "star-k", 0.2, 30, 0),
        new("echelle", "star-fg", 0.3, 40, 0), new("echelle", "star-hot", 0.2, 40, 0), new("echelle", "star-a", 0.2, 30, 0), new("echelle", "star-giant", 0.3, 50, 0), new("echelle", "star-m", 0.1, 40, 0),
        new("ultraviolet", "quasar", 0.8, 0.05, 1.6), new("ultraviolet", "galaxy-ultraviolet", 0.7, 0.02, 0.45), new("ultraviolet", "star-hot", 0.4, 60, 0),
        new("ultraviolet", "star-a", 0.2, 40, 0), new("ultraviolet", "star-da", 0.2, 40, 0), new("ultraviolet", "star-fg", 0.2, 40, 0),
        new("course", "nebula-planetary", 0.2, 40, 0), new("course", "nebula-hii", 0.2, 30, 0), new("course", "supernova", 0.2, 0.005, 0.08), new("course", "comet", 0.1, 0, 0), new("course", "blazar", 0.05, 0, 0),
        new("fibre", "blazar", 0.1, 0, 0), new("fibre", "supernova", 0.1, 0.02, 0.15), new("fibre", "nebula-planetary", 0.05, 80, 0), new("fibre-stars", "nebula-hii", 0.15, 60, 0),
    ]);

    /// <summary>The entries of the named set-ups and classes only; an empty list means all. A class may be given by its first part, e.g. <c>star</c>.</summary>
    public SurveyMix Only(IReadOnlyCollection<string> setups, IReadOnlyCollection<string> classes)
    {
        var entries = Entries.Where(entry => Named(setups, entry.Setup, exact: true) && Named(classes, entry.ObjectClass, exact: false)).ToArray();
        return entries.Length > 0 ? new(entries) : throw new ArgumentException("no entry of the mix has these set-ups and classes");
    }

    private static bool Named(IReadOnlyCollection<string> names, string name, bool exact) =>
        names.Count == 0 || names.Contains(name) || (!exact && names.Any(start => name.StartsWith(start + "-", StringComparison.Ordinal)));

    private static SurveyEntry[] Stars(string setup, double velocity, double weight) =>
    [
        new(setup, "star-hot", 0.2 * weight, velocity, 0), new(setup, "star-a", 0.3 * weight, velocity, 0), new(setup, "star-fg", 0.8 * weight, velocity, 0),
        new(setup, "star-k", 0.4 * weight, velocity, 0), new(setup, "star-m", 0.45 * weight, velocity, 0), new(setup, "star-giant", 0.3 * weight, velocity, 0),
        new(setup, "star-metal-poor", 0.2 * weight, velocity, 0), new(setup, "star-da", 0.15 * weight, velocity / 2, 0), new(setup, "star-db", 0.06 * weight, velocity / 2, 0),
        new(setup, "star-be", 0.05 * weight, velocity / 2, 0), new(setup, "star-dme", 0.12 * weight, velocity / 2, 0), new(setup, "star-carbon", 0.06 * weight, velocity, 0),
    ];

    private static SurveyEntry[] Nearby(string setup, double highest, double weight) =>
    [
        new(setup, "galaxy-passive", 1 * weight, 0.01, highest), new(setup, "galaxy-star-forming", 1 * weight, 0.005, highest), new(setup, "galaxy-starburst", 0.3 * weight, 0.002, highest),
        new(setup, "galaxy-post-starburst", 0.15 * weight, 0.02, highest), new(setup, "galaxy-active", 0.25 * weight, 0.01, highest),
    ];

    private static SurveyEntry[] Quasars(string setup, double lowest, double highest, double weight) =>
        [new(setup, "quasar", 0.75 * weight, lowest, highest), new(setup, "quasar-red", 0.1 * weight, lowest, Math.Min(2.5, highest)), new(setup, "quasar-bal", 0.15 * weight, 1.5, highest)];

    private static SurveyEntry[] Faint(string setup) =>
    [
        new(setup, "galaxy-ultraviolet", 3, 2, 6.2), new(setup, "galaxy-star-forming", 1, 0.2, 1.4), new(setup, "galaxy-starburst", 0.5, 0.2, 1.5), new(setup, "galaxy-passive", 0.7, 0.2, 1.2),
        new(setup, "galaxy-post-starburst", 0.2, 0.3, 1.2), new(setup, "galaxy-active", 0.2, 0.2, 1), new(setup, "quasar", 0.5, 0.4, 5.5), new(setup, "star-m", 0.3, 130, 0),
        new(setup, "star-k", 0.15, 130, 0), new(setup, "star-fg", 0.1, 130, 0), new(setup, "blank", 0.3, 0, 0),
    ];

    private static SurveyEntry[] Infrared(string setup) =>
    [
        new(setup, "galaxy-quiescent", 1.2, 1.3, 2.6), new(setup, "galaxy-star-forming", 0.6, 0.7, 2.5), new(setup, "galaxy-starburst", 0.5, 0.7, 2.6), new(setup, "galaxy-active", 0.2, 0.6, 2.4),
        new(setup, "quasar", 0.8, 1, 6.9), new(setup, "star-m", 0.3, 60, 0), new(setup, "star-giant", 0.2, 60, 0), new(setup, "star-fg", 0.2, 60, 0), new(setup, "star-a", 0.1, 40, 0), new(setup, "blank", 0.2, 0, 0),
    ];
}
