using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Roles;

/// <summary>Tells what an array is from its utype, its UCD or its name, in this order of trust.</summary>
internal static class RoleGuesser
{
    private const int VariantPenalty = 2;
    private const int UncalibratedPenalty = 4;

    /// <summary>The role of an array.</summary>
    public static RoleGuess Of(Label label)
    {
        var byName = ByName(label);
        if (Declared(label) is not { } declared) return byName;
        var rank = byName.Role == declared.Role ? byName.Rank : VariantPenalty;
        if (label.Ucd.ContainsAny("uncalib")) rank += UncalibratedPenalty;
        if (label.Utype.BeginsWithAny("eso:")) rank += UncalibratedPenalty;
        return declared with { Rank = rank };
    }

    private static RoleGuess? Declared(Label label)
    {
        if (ByUtype(label.Utype.ToLowerInvariant()) is { } byUtype) return new(byUtype, 0, $"utype {label.Utype}");
        return ByUcd(label.Ucd.ToLowerInvariant()) is { } byUcd ? new(byUcd, 0, $"UCD {label.Ucd}") : null;
    }

    // IVOA Spectrum Data Model 1.1; prefixes "spec:" and "Spectrum." are both in use.
    private static Role? ByUtype(string utype)
    {
        if (utype.EndsWith("spectralaxis.value", StringComparison.Ordinal)) return Role.Wavelength;
        if (utype.EndsWith("fluxaxis.value", StringComparison.Ordinal)) return Role.Flux;
        if (utype.EndsWith("fluxaxis.accuracy.staterror", StringComparison.Ordinal)) return Role.Error;
        if (utype.EndsWith("fluxaxis.quality", StringComparison.Ordinal) || utype.EndsWith("accuracy.qualitystatus", StringComparison.Ordinal))
            return Role.Mask;
        return utype.EndsWith("backgroundmodel.value", StringComparison.Ordinal) ? Role.Sky : null;
    }

    private static Role? ByUcd(string ucd)
    {
        if (ucd.Length == 0) return null;
        if (ucd.ContainsAny("stat.snr")) return Role.Other;
        if (ucd.ContainsAny("stat.error"))
            return ucd.ContainsAny("phot") ? Role.Error : Role.Other;
        if (ucd.ContainsAny("background", ".sky")) return Role.Sky;
        if (ucd.BeginsWithAny("em.wl", "em.freq", "em.energy", "em.wavenumber")) return Role.Wavelength;
        if (ucd.BeginsWithAny("meta.code")) return Role.Mask;
        return ucd.BeginsWithAny("phot.flux", "phot.count")
            ? Role.Flux
            : null;
    }

    private static RoleGuess ByName(Label label)
    {
        var words = label.Words;
        var role = RoleOf(words);
        return role == Role.Other ? ByUnit(label) : new(role, RankOf(role, words), $"name {label.Name}");
    }

    // The order matters: SIGMA_FLUX is an error, FLUX_IVAR an inverse variance, SKY_ERR neither.
    private static Role RoleOf(IReadOnlyList<string> words)
    {
        bool Any(IReadOnlySet<string> set) => words.Any(set.Contains);
        if (words.Count == 0) return Role.Other;
        if (words.Contains("fwhm")) return Role.Fwhm;
        if (words.Contains("wdisp") || words.Contains("wavedisp") || words.Contains("wresl")) return Role.Sigma;
        if (words.Contains("resolution") || words.Contains("resol")) return Role.Resolution;
        var deviation = DeviationOf(words);
        var foreign = Any(Vocabulary.Foreign);
        var isOfWavelength = Any(Vocabulary.Wavelength) && !words.Any(Vocabulary.Flux.ContainsKey);
        if (deviation != Role.Other) return foreign || isOfWavelength || Any(Vocabulary.Sky) ? Role.Other : deviation;
        if (Any(Vocabulary.Sky)) return Role.Sky;
        if (foreign) return Role.Other;
        if (Any(Vocabulary.Mask)) return Role.Mask;
        var isWavelength = Any(Vocabulary.Wavelength);
        if (words.Any(Vocabulary.Flux.ContainsKey))
            return isWavelength && !words.Contains("flux") && !words.Contains("f") ? Role.Wavelength : Role.Flux;
        return isWavelength ? Role.Wavelength : Role.Other;
    }

    private static Role DeviationOf(IReadOnlyList<string> words)
    {
        bool Any(IReadOnlySet<string> set) => words.Any(set.Contains);
        if (Any(Vocabulary.InverseVariance) || (words.Contains("inv") && Any(Vocabulary.Variance))) return Role.InverseVariance;
        // The partner of an image called DATA holds its statistical variance.
        if (Any(Vocabulary.Variance) || words is ["stat"]) return Role.Variance;
        var prefixed = words.Count > 1 && words[0] is "e" or "d" && words.Skip(1).Any(Vocabulary.Flux.ContainsKey);
        return Any(Vocabulary.Error) || prefixed ? Role.Error : Role.Other;
    }

    private static int RankOf(Role role, IReadOnlyList<string> words)
    {
        var rank = role == Role.Flux ? words.Where(Vocabulary.Flux.ContainsKey).Min(word => Vocabulary.Flux[word]) : 0;
        if (role == Role.Wavelength && words.Contains("air")) rank++;
        if (role == Role.Flux && words.Any(Vocabulary.Normalised.Contains)) rank++;
        if (role == Role.Mask && (words.Contains("ormask") || words.Contains("or"))) rank++;
        return rank + VariantPenalty * Qualifiers(words).Count(static word => !Vocabulary.Better.Contains(word) && word is not "air");
    }

    /// <summary>The words that tell one form of an array from another, such as <c>opt</c> and <c>box</c>.</summary>
    public static IEnumerable<string> Qualifiers(IReadOnlyList<string> words) => words.Where(static word =>
        !Vocabulary.Wavelength.Contains(word) && !Vocabulary.Flux.ContainsKey(word) && !Vocabulary.Error.Contains(word)
        && !Vocabulary.Variance.Contains(word) && !Vocabulary.InverseVariance.Contains(word) && !Vocabulary.Mask.Contains(word)
        && !Vocabulary.Neutral.Contains(word) && word is not ("e" or "d" or "inv" or "or" or "fwhm" or "wdisp" or "wavedisp" or "wresl"));

    // A column of unknown name in a unit of wavelength is the wavelength; widths and steps have names that say so.
    private static RoleGuess ByUnit(Label label)
    {
        var plain = !label.Words.Any(Vocabulary.Foreign.Contains) && DeviationOf(label.Words) == Role.Other;
        return plain && SpectralUnit.Parse(label.Unit) is { Quantity: not SpectralQuantity.Velocity }
            ? new(Role.Wavelength, 2 * VariantPenalty, $"unit {label.Unit}")
            : new(Role.Other, 0, "");
    }
}
