using System.Collections.Frozen;

namespace Redshift.Pipeline.Load.Roles;

/// <summary>The words by which files name their arrays.</summary>
internal static class Vocabulary
{
    /// <summary>Names of the spectral coordinate.</summary>
    public static readonly FrozenSet<string> Wavelength = Set(
        "wave", "waves", "wavelength", "wavelengths", "wavel", "wavelen", "wlen", "lambda", "lambdas", "lam", "lamda", "lamb", "wl", "wls",
        "wvl", "wav", "wavs", "awav", "loglam", "loglambda", "loglamb", "logwave", "logwavelength", "angstrom", "angstroms", "ang", "freq",
        "frequency", "wavenumber", "wavenumbers", "wavn", "energy", "spectralaxis", "dispersion", "airwave", "vacwave", "waveobs", "microns",
        "micron", "wavevac", "waveair");

    /// <summary>Names of the flux, the usual ones with the lowest number.</summary>
    public static readonly FrozenDictionary<string, int> Flux = new Dictionary<string, int>
    {
        ["flux"] = 0,
        ["fluxes"] = 0,
        ["flam"] = 0,
        ["flambda"] = 0,
        ["fnu"] = 0,
        ["fluxcal"] = 0,
        ["fluxdensity"] = 0,
        ["spec"] = 2,
        ["spectrum"] = 2,
        ["spectra"] = 2,
        ["signal"] = 2,
        ["intensity"] = 2,
        ["inten"] = 2,
        ["data"] = 2,
        ["sci"] = 2,
        ["relflux"] = 2,
        ["normflux"] = 3,
        ["nflux"] = 3,
        ["brightness"] = 4,
        ["bright"] = 4,
        ["counts"] = 4,
        ["count"] = 4,
        ["adu"] = 4,
        ["net"] = 4,
        ["int"] = 4,
        ["amplitude"] = 4,
        ["value"] = 5,
        ["electrons"] = 5,
        ["f"] = 5,
    }.ToFrozenDictionary();

    /// <summary>Names of a standard deviation.</summary>
    public static readonly FrozenSet<string> Error = Set(
        "err", "error", "errs", "errors", "erro", "sigma", "sigmas", "sig", "std", "stdev", "stddev", "noise", "unc", "uncert", "uncertainty",
        "uncertainties", "staterror", "staterr", "rms", "rmse", "eflux", "dflux", "fluxerr", "fluxerror", "fluxsig", "ferr", "errflux", "flamerr", "sd");

    /// <summary>Names of a variance.</summary>
    public static readonly FrozenSet<string> Variance = Set("var", "variance", "variances", "vari", "fluxvar", "mse");

    /// <summary>Names of an inverse variance.</summary>
    public static readonly FrozenSet<string> InverseVariance = Set(
        "ivar", "ivars", "invvar", "invvariance", "inversevariance", "inverse", "fluxivar", "invar");

    /// <summary>Names of quality flags.</summary>
    public static readonly FrozenSet<string> Mask = Set(
        "mask", "masks", "dq", "qual", "quality", "badpix", "badpixel", "badpixels", "bpm", "bpmap", "bad", "flag", "flags", "andmask", "ormask",
        "dataqual", "dataquality", "good", "goodpix", "goodpixels", "pixmask", "edit", "msk");

    /// <summary>Names of sky and background.</summary>
    public static readonly FrozenSet<string> Sky = Set("sky", "background", "backgr", "bkg", "bkgd", "bkgnd", "bg", "skyflux", "fluxbkgd", "bgd");

    /// <summary>Words that make an array something else: models, calibrations, counts of something.</summary>
    public static readonly FrozenSet<string> Foreign = Set(
        "model", "models", "fit", "best", "continuum", "cont", "subcontinuum", "template", "telluric", "tell", "trans", "transmission", "atm",
        "response", "sens", "sensitivity", "sensfunc", "calib", "calibration", "contam", "contamination", "line", "lines", "dark", "scatter",
        "scatterup", "scatterlow", "extinction", "throughput", "resid", "residual", "residuals", "weight", "weights", "wht", "exptime", "exposure",
        "snr", "sn", "mag", "ratio", "sys", "syserror", "syserr", "systematic", "min", "max", "eff", "step", "delta", "width", "npix",
        "chi", "order", "index", "id", "time", "number", "nexp", "covar", "covariance", "lya", "spot", "trace", "profile");

    /// <summary>Words of a flux that is divided by its continuum, and so comes second to the flux itself.</summary>
    public static readonly FrozenSet<string> Normalised = Set("nor", "norm", "normalized", "normalised", "normflux", "nflux");

    /// <summary>Words that choose the better of two forms of the same array.</summary>
    public static readonly FrozenSet<string> Better = Set("opt", "optimal", "optimally", "horne", "coadd", "coadded", "combined", "vac", "vacuum", "merged", "final", "main");

    /// <summary>Words that change nothing.</summary>
    public static readonly FrozenSet<string> Neutral = Set(
        "density", "total", "cal", "calibrated", "obs", "observed", "axis", "spectral", "grid", "array", "vector", "log", "log10", "ln", "nm", "um", "aa",
        "of", "the", "per", "in", "values", "column", "object", "target", "stat", "statistical", "inverse", "extracted", "source", "10", "and");

    private static FrozenSet<string> Set(params string[] words) => words.ToFrozenSet(StringComparer.Ordinal);
}
