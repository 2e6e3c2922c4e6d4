using Redshift.Fits;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>The spectra of one header-data unit: one spectrum for each of many objects, or several of one object.</summary>
/// <param name="Spectra">One, whose arrays have <paramref name="Rows"/> rows; or several, with one row.</param>
/// <param name="Rows">Number of observations.</param>
internal sealed record UnitContent(IReadOnlyList<SpectrumSources> Spectra, int Rows)
{
    /// <summary>Whether wavelengths are listed and not computed from an axis.</summary>
    public bool ListsWavelengths { get; init; }

    /// <summary>The unit with the wavelengths, where it is another than that with the flux.</summary>
    public Hdu? WavelengthHdu { get; init; }

    /// <summary>The table of the rows' targets.</summary>
    public TargetTable? Targets { get; init; }

    /// <summary>What was chosen beside the roles.</summary>
    public IReadOnlyList<ReadingNote> Notes { get; init; } = [];

    /// <summary>The spectra with the name of their arm before their own labels.</summary>
    public IEnumerable<SpectrumSources> Labelled(string arm) =>
        Spectra.Select(spectrum => spectrum with { Arm = arm, Label = $"{arm} {spectrum.Label}".Trim() });
}
