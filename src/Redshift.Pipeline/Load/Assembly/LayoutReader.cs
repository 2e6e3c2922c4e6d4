using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.Rules;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>Reads the observations of a layout, after what they share has been settled once.</summary>
internal sealed class LayoutReader
{
    private readonly Layout _layout;
    private readonly LoadRule? _rule;
    private readonly string _source;
    private readonly ObservationFacts _facts;
    private readonly Setting<WavelengthMedium> _medium;
    private readonly Setting<VelocityFrame> _frame;
    private readonly List<string> _cautions;
    private readonly IReadOnlyList<SpectrumBuilder> _builders;
    private readonly IReadOnlyList<ReadingNote> _notes;

    /// <summary>Settles medium, frame and resolution.</summary>
    /// <exception cref="LoadException">The wavelengths cannot be read.</exception>
    public LayoutReader(Layout layout, string source, LoadSettings settings, LoadRule? rule)
    {
        _layout = layout;
        _rule = rule;
        _source = source;
        _facts = ObservationFacts.Read(layout.Header, settings, rule);
        _medium = MediumChoice.Make(layout, settings, rule);
        _frame = FrameChoice.Make(layout, settings, rule);
        var resolution = ResolutionFinder.Find(layout.Header, settings);
        var normalised = IsNormalised(layout);
        _builders = [.. layout.Spectra.Select(sources => new SpectrumBuilder(sources, _medium.Value, resolution, normalised))];
        _cautions = [.. Cautions()];
        _notes =
        [
            .. ReadingNotes.Of(layout),
            new("medium", Words.Of(_medium.Value), _medium.Why),
            new("frame", Words.Of(_frame.Value), _frame.Why),
            .. ReadingNotes.OfResolution(layout, resolution),
        ];
    }

    /// <summary>Reads one observation.</summary>
    /// <param name="row">Which of the layout.</param>
    /// <param name="catalogueRow">Its number in the file.</param>
    /// <exception cref="LoadException">It cannot be used.</exception>
    public Observation Read(int row, int catalogueRow)
    {
        var state = _layout.Targets?.State(row) ?? FibreState.Object;
        if (state is FibreState.Parked or FibreState.Broken)
            throw new LoadException(_layout.Targets!.Place, $"a {state.ToString().ToLowerInvariant()} fibre", "a fibre on a target");
        var spectra = _builders.SelectMany(builder => builder.Read(row)).ToList();
        if (spectra.Count == 0) throw Unusable();
        var position = _layout.Targets?.Position(row) ?? _facts.Position;
        return new()
        {
            Source = _source,
            Row = catalogueRow,
            Spectra = spectra,
            Target = _layout.Targets?.Name(row) is { Length: > 0 } name ? name : _facts.Target,
            RaDeg = position?.Ra,
            DecDeg = position?.Dec,
            MidTimeUtc = _facts.Middle,
            ExposureS = _facts.ExposureS,
            Instrument = _facts.Instrument,
            Medium = _medium.Value,
            MediumAssumed = _medium.Assumed,
            Frame = _frame.Value,
            Cautions = state == FibreState.Sky ? [.. _cautions, "sky-fibre"] : _cautions,
            Notes = _notes,
            Kept = _facts.Kept,
        };
    }

    /// <summary>Index and name of the unit with the flux.</summary>
    public (string Index, string Name) FluxHdu => (_layout.Spectra[0].Flux.Place.Split(' ') is ["HDU", var index, ..] ? index : "", _layout.Header.Text("EXTNAME") ?? "");

    /// <summary>The load rule that gives the same reading.</summary>
    /// <param name="fluxHdus">The units with the flux of all layouts of the file.</param>
    public string Rule(IReadOnlyList<(string Index, string Name)> fluxHdus) => RuleText.Write(_layout, _rule, fluxHdus, _medium, _frame);

    private IEnumerable<string> Cautions()
    {
        if (_medium.Assumed) yield return "check-medium";
        if (_frame.Value == VelocityFrame.Unknown) yield return "check-frame";
        if (_layout.Spectra.Any(static spectrum => spectrum.Wavelength.IsUnitAssumed)) yield return "check-wavelength-unit";
    }

    private LoadException Unusable() => new(
        _layout.Spectra[0].Flux.Place,
        $"fewer than {WavelengthGrid.ShortestRun} usable pixels",
        $"at least {WavelengthGrid.ShortestRun} pixels with a wavelength and a finite flux that is not the same everywhere");

    // A flux divided by the continuum keeps no unit, whatever its column says.
    private static bool IsNormalised(Layout layout) =>
        layout.Header.Flag("CONTNORM") == true
        || layout.Header.Text("FLUX_CAL", "FLUXCAL")?.BeginsWithAny("NORMALI") == true
        || layout.Spectra[0].Flux.Label.Words.Any(Vocabulary.Normalised.Contains);
}
