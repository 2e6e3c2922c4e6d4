namespace Redshift.Pipeline.Report.Explain;

/// <summary>What each caution means and what a person should do about it.</summary>
public static class CautionGuide
{
    private static readonly Dictionary<string, string> Advice = new(StringComparer.Ordinal)
    {
        ["check-medium"] =
            "The file does not say whether its wavelengths are in air or in vacuum; the two differ by some 83 km/s in the visible. "
            + "Find out how the lamp lines were given and state medium in a pipeline file.",
        ["check-frame"] =
            "The file does not say whether the motion of the Earth has been taken out, which can change a velocity by 30 km/s. "
            + "State frame in a pipeline file.",
        ["check-wavelength-unit"] =
            "The unit of the wavelengths was inferred from their size. See how the file was read with --layout "
            + "and state wavelength_unit in a pipeline file if it is wrong.",
        ["check-flux-unit"] =
            "The unit of the flux was not recognised. Redshifts do not depend on it, line fluxes do.",
        ["one-line-only"] =
            "The answer rests on a single line, which could be another one at another redshift. "
            + "Look for a second line, in another spectrum if need be, before you believe it.",
        ["rival-redshift"] =
            "Another redshift explains the spectrum nearly as well; it is listed under the rivals. Compare both with your eyes.",
        ["covers-few-lines"] =
            "At this redshift few strong lines fall into the range of the spectrum, so little could confirm or refute the answer. "
            + "A spectrum of another range would settle it.",
        ["noise-from-residuals"] =
            "The file has no usable errors; the noise was estimated from the scatter of the spectrum itself. "
            + "Files with errors give more trustworthy confidences.",
        ["errors-rescaled"] =
            "The errors in the file do not match the scatter of the spectrum and were multiplied by noise_scale. "
            + "A factor far from 1 points to a fault in the reduction.",
        ["resolution-estimated"] =
            "The file does not say how sharp the spectrograph is; the resolution was estimated from the sampling. "
            + "State resolution or fwhm_a in a pipeline file for better widths and fits.",
        ["two-components"] =
            "The lines are double or the spectrum is a sum of two objects: a binary star, a chance alignment, a star before a galaxy. "
            + "The answer is for the stronger one.",
        ["sky-fibre"] =
            "The file marks this spectrum as one of empty sky.",
    };

    /// <summary>The advice for a caution, or null for a word that explains itself.</summary>
    public static string? Find(string caution) => Advice.GetValueOrDefault(caution);
}
