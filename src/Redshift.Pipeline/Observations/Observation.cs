using Redshift.Physics.Units;

namespace Redshift.Pipeline.Observations;

/// <summary>The unit of work: one object with one or more spectra, as read; everything a file says of it has been settled here.</summary>
public sealed record Observation
{
    /// <summary>Path below the common parent of all inputs, with <c>/</c>.</summary>
    public required string Source { get; init; }

    /// <summary>0-based spectrum of a file that holds several, otherwise 0.</summary>
    public required int Row { get; init; }

    /// <summary>The spectra; their likelihoods add.</summary>
    public required IReadOnlyList<Spectrum> Spectra { get; init; }

    /// <summary>The object's name as the file gives it (hostile text: print only through the report's cleaning).</summary>
    public string Target { get; init; } = "";

    /// <summary>Right ascension in degrees.</summary>
    public double? RaDeg { get; init; }

    /// <summary>Declination in degrees.</summary>
    public double? DecDeg { get; init; }

    /// <summary>Middle of the exposure, UTC.</summary>
    public DateTime? MidTimeUtc { get; init; }

    /// <summary>Exposure time in seconds.</summary>
    public double? ExposureS { get; init; }

    /// <summary>Instrument name as the file gives it.</summary>
    public string Instrument { get; init; } = "";

    /// <summary>The medium of the file's own wavelengths (those in <see cref="Spectra"/> are vacuum).</summary>
    public required WavelengthMedium Medium { get; init; }

    /// <summary>True where the medium is our default and not the file's word.</summary>
    public bool MediumAssumed { get; init; }

    /// <summary>The frame of the file's wavelengths.</summary>
    public VelocityFrame Frame { get; init; }

    /// <summary>What a person should check, see the catalogue's column of that name.</summary>
    public IReadOnlyList<string> Cautions { get; init; } = [];

    /// <summary>What was found in the file and what was chosen, for <c>explain --layout</c>.</summary>
    public IReadOnlyList<ReadingNote> Notes { get; init; } = [];

    /// <summary>Header cards that the pipeline file asks to keep, in its order.</summary>
    public IReadOnlyList<KeyValuePair<string, string>> Kept { get; init; } = [];
}

/// <summary>One thing settled while reading: a role, what fills it, and why.</summary>
/// <param name="Role">What was needed, e.g. <c>wavelength</c>.</param>
/// <param name="Choice">What fills it, e.g. <c>HDU 1 column LOGLAM</c>.</param>
/// <param name="Why">The reason, e.g. <c>unit log10(Angstrom)</c>.</param>
public sealed record ReadingNote(string Role, string Choice, string Why);
