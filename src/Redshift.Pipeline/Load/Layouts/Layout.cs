using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>How a file, or one of its units, holds observations: everything decided, nothing read yet.</summary>
internal sealed record Layout
{
    /// <summary>The spectra of each observation.</summary>
    public required IReadOnlyList<SpectrumSources> Spectra { get; init; }

    /// <summary>Number of observations.</summary>
    public int Rows { get; init; } = 1;

    /// <summary>The headers that speak of them.</summary>
    public required HeaderScope Header { get; init; }

    /// <summary>The headers that speak of the wavelengths, where these have a unit of their own.</summary>
    public HeaderScope? WavelengthHeader { get; init; }

    /// <summary>The headers that can speak of the wavelengths, those of their own unit first.</summary>
    public IEnumerable<HeaderScope> WavelengthHeaders => WavelengthHeader is { } own ? [own, Header] : [Header];

    /// <summary>Comment lines of a text file.</summary>
    public IReadOnlyList<string> Remarks { get; init; } = [];

    /// <summary>Target and fibre of each row, where a table tells them.</summary>
    public TargetTable? Targets { get; init; }

    /// <summary>What was found and chosen beside the roles.</summary>
    public IReadOnlyList<ReadingNote> Notes { get; init; } = [];

    /// <summary>Whether the wavelengths are listed in a binary table or an array, as pipelines of surveys and space telescopes do.</summary>
    public bool ListsWavelengths { get; init; }
}
