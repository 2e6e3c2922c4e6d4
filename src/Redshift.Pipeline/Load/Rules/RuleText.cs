using System.Globalization;
using System.Text;
using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Assembly;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Tables;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>
/// Writes the rule that reads a file as it was read, to be pasted into a pipeline file. What was assumed is commented out: pasted as
/// it is, the rule changes nothing, not even the cautions.
/// </summary>
internal sealed class RuleText
{
    // The headers that tell one instrument's files from another's.
    private static readonly string[] Origins = ["INSTRUME", "TELESCOP", "DETECTOR"];

    private readonly StringBuilder _text = new();
    private readonly Layout _layout;
    private readonly string? _unit;

    private RuleText(Layout layout, string? unit)
    {
        _layout = layout;
        _unit = unit;
    }

    /// <summary>The rule of a layout.</summary>
    /// <param name="layout">The layout.</param>
    /// <param name="given">The rule by which it was read, or null.</param>
    /// <param name="fluxHdus">Index and name of the units with the flux, one for each layout of the file.</param>
    /// <param name="medium">The medium as it was settled.</param>
    /// <param name="frame">The frame as it was settled.</param>
    /// <returns>TOML.</returns>
    public static string Write(
        Layout layout, LoadRule? given, IReadOnlyList<(string Index, string Name)> fluxHdus, Setting<WavelengthMedium> medium, Setting<VelocityFrame> frame)
    {
        var rule = new RuleText(layout, fluxHdus.Count > 1 ? layout.Spectra[0].Flux.Place.Split(' ')[1] : null);
        // The orders of an arm are one entry, whatever their number.
        var arms = layout.Spectra.DistinctBy(static one => one.Orders is null ? (one.Label, "") : (one.Arm, one.Flux.Place)).ToList();
        var hasArms = arms.Count > 1 || arms[0].Arm.Length > 0;
        rule.Head(fluxHdus);
        if (!hasArms) rule.Roles(arms[0]);
        rule.Value("medium", Words.Of(medium.Value), medium.Assumed, medium.Why);
        rule.Value("frame", Words.Of(frame.Value), frame.Assumed, frame.Why);
        rule.Targets(given ?? new());
        if (hasArms) rule.Arms(arms);
        return rule._text.ToString();
    }

    private void Head(IReadOnlyList<(string Index, string Name)> fluxHdus)
    {
        _text.Append("[[load]]\n");
        var conditions = Origins.Select(keyword => (keyword, Text: _layout.Header.Text(keyword))).Where(static origin => origin.Text is not null).ToList();
        if (conditions.Count == 0) _text.Append("# It holds for all files: name header cards in when = { KEYWORD = \"value\" } to choose some.\n");
        else _text.Append("when = { ").AppendJoin(", ", conditions.Select(static origin => $"{origin.keyword} = {Quoted(origin.Text!)}")).Append(" }\n");
        if (fluxHdus.Count == 1) return;
        if (fluxHdus[0].Name.Length > 0 && fluxHdus.All(hdu => hdu.Name == fluxHdus[0].Name)) Value("hdu", fluxHdus[0].Name);
        else _text.Append("hdu = [").AppendJoin(", ", fluxHdus.Select(static hdu => hdu.Index)).Append("]\n");
    }

    private void Targets(LoadRule given)
    {
        var targets = _layout.Targets;
        var (ra, dec) = (PlaceOf(targets?.Ra) ?? given.Ra, PlaceOf(targets?.Dec) ?? given.Dec);
        Value("target", PlaceOf(targets?.Names) ?? given.Target);
        if (ra is not null && dec is not null)
        {
            Value("ra", ra);
            Value("dec", dec);
            Value("angle_unit", (targets is null ? given.AngleUnit : targets.Unit)?.ToString().ToLowerInvariant());
        }
        Value("fibre", PlaceOf(targets?.Fibres));
    }

    private static string? PlaceOf(TableColumn? column) => column is null ? null : TableUnits.PlaceOf(column);

    private static string NameOf(SpectrumSources arm) => arm.Orders is null ? arm.Label : arm.Arm;

    private void Arms(IReadOnlyList<SpectrumSources> arms)
    {
        foreach (var arm in arms)
        {
            _text.Append("\n[[load.arm]]\n");
            Value("name", NameOf(arm) is { Length: > 0 } name ? name : null);
            Roles(arm);
        }
    }

    private void Roles(SpectrumSources spectrum)
    {
        Value("wavelength", spectrum.Wavelength.Place);
        if (spectrum.Wavelength is StepWavelengths steps) Value("wavelength_step", steps.StepPlace);
        if (spectrum.Wavelength.Unit is { } unit) Value("wavelength_unit", unit, spectrum.Wavelength.IsUnitAssumed, "judged by the size of the values");
        Value("flux", spectrum.Flux.Place);
        Value("flux_unit", spectrum.FluxUnit);
        if (spectrum.Noise is { } noise) Value(ReadingNotes.NameOf(noise.Role), noise.Values.Place);
        if (spectrum.Mask is { } mask) Value(mask.Key, mask.Place);
        if (spectrum is { Width: { } width, Resolution: null })
        {
            Value(width.Key, width.Place);
            Value("width_unit", width.Unit);
        }
        Number("resolution", spectrum.Resolution?.Power);
        Number("fwhm_a", spectrum.Resolution?.FwhmA);
        Value("order", spectrum.Orders);
    }

    private void Number(string key, double? number)
    {
        if (number is { } value) _text.Append(CultureInfo.InvariantCulture, $"{key} = {value:R}\n");
    }

    private void Value(string key, string? text, bool isAssumed = false, string why = "")
    {
        if (text is null) return;
        if (isAssumed) _text.Append("# ");
        _text.Append(key).Append(" = ").Append(Quoted(Relative(text)));
        if (isAssumed) _text.Append("   # ").Append(HarmlessText.Printable(why));
        _text.Append('\n');
    }

    // Of several units of one name the rule names the columns alone.
    private string Relative(string place) =>
        _unit is not null && place.StartsWith($"HDU {_unit} ", StringComparison.Ordinal) ? place[$"HDU {_unit} ".Length..] : place;

    private static string Quoted(string text)
    {
        var quoted = new StringBuilder("\"");
        foreach (var letter in text.EnumerateRunes())
        {
            if (letter.Value is '"' or '\\') quoted.Append('\\').Append(letter);
            else if (letter.IsAscii && !Rune.IsControl(letter)) quoted.Append(letter);
            else quoted.Append(CultureInfo.InvariantCulture, $"\\U{letter.Value:X8}");
        }
        return quoted.Append('"').ToString();
    }
}
