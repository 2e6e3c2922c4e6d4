using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Arrays with their guessed roles, and the choice among several for one role.</summary>
internal sealed class RoleChoice
{
    private readonly IReadOnlyList<(NumberArray Array, RoleGuess Guess)> _candidates;
    private readonly string _place;

    /// <summary>Guesses the roles.</summary>
    /// <param name="arrays">The arrays of one unit.</param>
    /// <param name="place">The unit, for messages.</param>
    public RoleChoice(IEnumerable<NumberArray> arrays, string place)
    {
        _candidates = [.. arrays.Select(static array => (array, RoleGuesser.Of(array.Label)))];
        _place = place;
    }

    /// <summary>Whether some array has the role.</summary>
    public bool Has(Role role) => _candidates.Any(candidate => candidate.Guess.Role == role);

    /// <summary>The array of a role that is closest to its plain form, or null.</summary>
    /// <exception cref="LoadException">Two are equally close.</exception>
    public NumberArray? Single(Role role) => Closest(role) switch
    {
        [] => null,
        [var only] => only,
        var several => throw Ambiguous(role, several),
    };

    /// <summary>The arrays of a role that are equally close to its plain form.</summary>
    public IReadOnlyList<NumberArray> Closest(Role role)
    {
        var candidates = _candidates.Where(candidate => candidate.Guess.Role == role).ToList();
        return [.. candidates.Where(candidate => candidate.Guess.Rank == candidates.Min(static other => other.Guess.Rank)).Select(static candidate => candidate.Array)];
    }

    /// <summary>The array of a role that belongs to another array: the one whose name differs least from it.</summary>
    public NumberArray? Belonging(Role role, NumberArray to)
    {
        var theirs = RoleGuesser.Qualifiers(to.Label.Words).ToHashSet();
        return _candidates
            .Where(candidate => candidate.Guess.Role == role)
            .OrderBy(candidate => Distance(candidate.Array, theirs, to))
            .ThenBy(static candidate => candidate.Guess.Rank)
            .Select(static candidate => candidate.Array)
            .FirstOrDefault();
    }

    /// <summary>The noise that belongs to a flux: inverse variance before error before variance.</summary>
    public (Role, NumberArray)? NoiseOf(NumberArray flux)
    {
        foreach (var role in (ReadOnlySpan<Role>)[Role.InverseVariance, Role.Error, Role.Variance])
            if (Belonging(role, flux) is { } array && Serves(array, flux)) return (role, array);
        return null;
    }

    /// <summary>The width of the pixels, in whatever form.</summary>
    public WidthSource? WidthOf(NumberArray flux)
    {
        foreach (var role in (ReadOnlySpan<Role>)[Role.Fwhm, Role.Sigma, Role.Resolution])
        {
            if (Belonging(role, flux) is not { } array) continue;
            var width = new WidthSource(array, role);
            if (width.Fits(flux.Length) && width.IsSpectral) return width;
        }
        return null;
    }

    /// <summary>The quality flags of a flux.</summary>
    public MaskSource? MaskOf(NumberArray flux) =>
        Belonging(Role.Mask, flux) is { } mask && mask.Length == flux.Length ? new(mask) : null;

    /// <summary>A flux with all that belongs to it.</summary>
    public SpectrumSources SpectrumOf(NumberArray flux, WavelengthSource wavelength) => new()
    {
        Wavelength = wavelength,
        Flux = flux,
        Noise = NoiseOf(flux),
        Mask = MaskOf(flux),
        Width = WidthOf(flux),
    };

    /// <summary>Names of the arrays that have a role but do not fill it.</summary>
    /// <param name="usedPlaces">Places of those that do.</param>
    public IEnumerable<string> Unused(IReadOnlyCollection<string> usedPlaces) => _candidates
        .Where(candidate => candidate.Guess.Role != Role.Other && !usedPlaces.Contains(candidate.Array.Place))
        .Select(static candidate => candidate.Array.Label.Name);

    // Errors in other units than the flux, as of counts beside a calibrated flux, are not its own.
    private static bool Serves(NumberArray noise, NumberArray flux)
    {
        if (noise.Length != flux.Length) return false;
        var theirs = FluxWord(noise);
        return theirs is null || FluxWord(flux) is not { } own || theirs == own || !IsCounts(theirs);
    }

    private static bool IsCounts(string word) => word is "counts" or "count" or "adu" or "electrons" or "net";

    private static string? FluxWord(NumberArray array) => array.Label.Words.FirstOrDefault(Vocabulary.Flux.ContainsKey);

    private static int Distance(NumberArray array, HashSet<string> theirs, NumberArray to)
    {
        var own = RoleGuesser.Qualifiers(array.Label.Words).ToHashSet();
        own.SymmetricExceptWith(theirs);
        var otherFlux = FluxWord(array) is { } word && FluxWord(to) is { } flux && word != flux ? 1 : 0;
        return 2 * own.Count + otherFlux;
    }

    private LoadException Ambiguous(Role role, IReadOnlyList<NumberArray> equal)
    {
        var found = $"several candidates for the {role.ToString().ToLowerInvariant()}: {string.Join(", ", equal.Select(static array => array.Label.Name))}";
        return new(_place, found, "one, or a [[load]] rule that names it");
    }
}
