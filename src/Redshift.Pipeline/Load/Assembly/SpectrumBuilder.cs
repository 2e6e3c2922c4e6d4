using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>Reads the arrays of a spectrum and brings them into the form that the stages need.</summary>
/// <param name="sources">What fills the roles.</param>
/// <param name="medium">Medium of the file's wavelengths.</param>
/// <param name="resolution">Resolution that applies to all pixels, from the pipeline file or from keywords.</param>
/// <param name="normalised">Whether the flux is divided by a continuum, so that its unit, if any, is a leftover.</param>
internal sealed class SpectrumBuilder(SpectrumSources sources, WavelengthMedium medium, StatedResolution? resolution, bool normalised)
{
    private readonly FluxUnit _unit = sources.FluxUnit is { } stated ? FluxUnit.Parse(stated)
        : normalised ? new("", null)
        : UnitOf(sources.Flux);

    private readonly StatedResolution? _resolution = sources.Resolution ?? resolution;

    private WavelengthGrid? _shared;

    /// <summary>Whether another resolution than the column or matrix of the file is used.</summary>
    private bool Overridden => _resolution is { From: ResolutionSource.Pipeline };

    /// <summary>Reads one row.</summary>
    /// <returns>The usable spectra of it; none where fewer than <see cref="WavelengthGrid.ShortestRun"/> pixels are usable.</returns>
    /// <exception cref="LoadException">Arrays do not fit together.</exception>
    public IReadOnlyList<Spectrum> Read(int row)
    {
        var flux = sources.Flux.Read(row);
        var grid = GridFor(row, flux.Length);
        if (grid.Angstroms.Length != flux.Length)
            throw Unequal(sources.Wavelength, grid.Angstroms.Length, flux.Length);
        var inverseVariance = InverseVariance(row, flux, out var hasErrors);
        var fwhm = Overridden ? null : sources.Width?.FwhmKmS(row, grid.Angstroms);
        return [.. grid.Runs
            .Select((run, i) => Build(run, Label(i, grid.Runs.Count), flux, inverseVariance, hasErrors, fwhm))
            .Where(IsUsable)];
    }

    private static FluxUnit UnitOf(NumberArray flux) => FluxUnit.IsLogarithmic(flux.Label.Unit)
        ? throw new LoadException(flux.Place, $"values in {flux.Label.Unit}", "a flux, counts or a normalised intensity, but no magnitudes or logarithms")
        : FluxUnit.Parse(flux.Label.Unit);

    private static LoadException Unequal(WavelengthSource wavelength, int wavelengths, int fluxes) =>
        new(wavelength.Place, $"{wavelengths} wavelengths for {fluxes} fluxes", "as many of one as of the other");

    // A flux that is the same everywhere is a fibre without light or an array that was never filled. Sound spectra are known after a
    // few pixels.
    private static bool IsUsable(Spectrum spectrum)
    {
        var usable = 0;
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        var (flux, inverseVariance) = (spectrum.Flux, spectrum.InverseVariance);
        for (var i = 0; i < flux.Length && (usable < WavelengthGrid.ShortestRun || high <= low); i++)
        {
            if (inverseVariance[i] <= 0) continue;
            usable++;
            low = Math.Min(low, flux[i]);
            high = Math.Max(high, flux[i]);
        }
        return usable >= WavelengthGrid.ShortestRun && high > low;
    }

    private WavelengthGrid GridFor(int row, int count)
    {
        if (_shared is { } known && known.Angstroms.Length == count) return known;
        var grid = WavelengthGrid.Build(sources.Wavelength.Angstroms(row, count), medium);
        if (sources.Wavelength.IsShared) _shared = grid;
        return grid;
    }

    private string Label(int run, int runs) => runs == 1 ? sources.Label : $"{sources.Label} part {run + 1}".TrimStart();

    private double[] InverseVariance(int row, double[] flux, out bool hasErrors)
    {
        var weights = Noise(row, flux.Length, out hasErrors);
        if (!hasErrors) MarkBlankEnds(flux, weights);
        var good = Mask(row, flux.Length);
        for (var i = 0; i < flux.Length; i++)
        {
            var finite = double.IsFinite(flux[i]);
            if (!finite || good is not null && !good[i]) weights[i] = 0;
            if (!finite) flux[i] = 0;
        }
        return weights;
    }

    private double[] Noise(int row, int count, out bool hasErrors)
    {
        hasErrors = false;
        if (sources.Noise is { } noise)
        {
            var values = noise.Values.Read(row);
            if (values.Length != count)
                throw new LoadException(noise.Values.Place, $"{values.Length} values for {count} fluxes", "one a pixel");
            hasErrors = NoiseReader.ToInverseVariance(noise.Role, values);
            if (hasErrors) return values;
        }
        var ones = new double[count];
        Array.Fill(ones, 1);
        return ones;
    }

    // Without errors, exact zeros at the ends are where the detector or the order has no data.
    private static void MarkBlankEnds(double[] flux, double[] weights)
    {
        for (var i = 0; i < flux.Length && IsBlank(flux[i]); i++) weights[i] = 0;
        for (var i = flux.Length - 1; i >= 0 && IsBlank(flux[i]); i--) weights[i] = 0;
    }

    private static bool IsBlank(double flux) => flux == 0 || !double.IsFinite(flux);

    // A mask that leaves almost nothing means something else than "bad": the noise then speaks alone.
    private bool[]? Mask(int row, int count)
    {
        if (sources.Mask is not { } mask || mask.Length != count) return null;
        var good = mask.Good(row);
        return good.Length == count && good.Count(static value => value) * 10 >= count ? good : null;
    }

    private Spectrum Build(GridRun run, string label, double[] flux, double[] weights, bool hasErrors, float[]? fwhm)
    {
        var (values, inverseVariance) = (run.Take(flux), run.Take(weights));
        if (_unit.ErgPerSecondCm2Hz is not null) ToPerAngstrom(run.Vacuum, values, inverseVariance, hasErrors);
        var widths = fwhm is null ? _resolution?.FwhmKmS(run.Vacuum) : run.Take(fwhm);
        return new()
        {
            Label = label,
            Wavelength = run.Vacuum,
            Flux = values,
            InverseVariance = inverseVariance,
            HasErrors = hasErrors,
            FwhmKmS = widths,
            ResolutionFrom = fwhm is not null ? ResolutionSource.File : _resolution?.From ?? ResolutionSource.Estimate,
            FluxUnit = _unit.Text,
        };
    }

    private void ToPerAngstrom(double[] vacuum, double[] flux, double[] inverseVariance, bool hasErrors)
    {
        for (var i = 0; i < flux.Length; i++)
        {
            var factor = _unit.PerAngstrom(vacuum[i]);
            flux[i] *= factor;
            if (hasErrors) inverseVariance[i] /= factor * factor;
        }
    }
}
