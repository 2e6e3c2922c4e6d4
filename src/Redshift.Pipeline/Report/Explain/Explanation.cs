using System.Globalization;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report.Explain;

/// <summary>One answer in words: what it is, why, what else it could be, what is missing, and what to be careful about.</summary>
public static class Explanation
{
    private const int MostCandidates = 6;
    private const int BarWidth = 20;
    private const string Indent = "  ";

    /// <summary>Writes the explanation of a result.</summary>
    public static void Write(TextWriter output, ObservationResult result)
    {
        WriteAnswer(output, result);
        if (result.Z is not null)
            WriteReasons(output, result);
        WriteMissing(output, result);
        WriteRivals(output, result);
        WriteCautions(output, result);
    }

    /// <summary>Writes what was found in the file and how it was read.</summary>
    public static void WriteLayout(TextWriter output, Observation? observation, FileDescription file)
    {
        if (file.Contents.Count > 0)
        {
            output.WriteLine("What the file holds");
            WriteNotes(output, file.Contents);
            output.WriteLine();
        }

        if (observation is not null)
            WriteReading(output, observation, file);
    }

    private static void WriteReading(TextWriter output, Observation observation, FileDescription file)
    {
        output.WriteLine($"How {Name(observation)} was read");
        WriteNotes(output, observation.Notes);
        foreach (var spectrum in observation.Spectra)
            output.WriteLine(Indent + Describe(spectrum));
        output.WriteLine();
        output.WriteLine("The same as a rule for a pipeline file");
        output.WriteLine();
        output.Write(file.Rule);
    }

    private static void WriteNotes(TextWriter output, IReadOnlyList<ReadingNote> notes)
    {
        var table = new TextTable();
        foreach (var note in notes)
            table.AddWords(HarmlessText.Printable(note.Role), HarmlessText.Printable(note.Choice), HarmlessText.Printable(note.Why));
        table.Write(output, Indent);
    }

    private static void WriteAnswer(TextWriter output, ObservationResult result)
    {
        output.WriteLine(Name(result.Observation));
        output.WriteLine();
        output.WriteLine(Answer(result));
        var table = new TextTable();
        if (result.Z is { } z)
        {
            table.AddWords("velocity c z", $"{Number(Velocity.SpeedOfLightKmS * z, 1)} ± "
                + $"{Number(Velocity.SpeedOfLightKmS * result.ZErr, 1)} km/s, {Frame(result)}");
            table.AddWords("verdict", $"{Words.Of(result.Verdict)}: right with probability {Number(result.Confidence, 4)}"
                + $" (raw ln odds {Number(result.LnOdds, 1)})");
            table.AddWords("kind", $"{Words.Of(result.Kind)} with probability {Number(result.KindConfidence, 4)}{Type(result)}");
        }

        table.AddWords("signal to noise", $"{Number(result.SnrPixel, 1)} a pixel, {Number(result.SnrAngstrom, 1)} an Å");
        table.AddWords("resolving power", Resolution(result));
        table.Write(output, Indent);
    }

    private static string Answer(ObservationResult result) => result.Z is { } z
        ? $"{Article(result.Kind)} at z = {Number(z, 7)} ± {Number(result.ZErr, 7)}"
        : "Nothing: there is no evidence of an object in this spectrum.";

    private static string Article(ObjectKind kind) => kind == ObjectKind.Unknown
        ? "Something that none of the models explains,"
        : "A " + Words.Of(kind);

    private static string Type(ObservationResult result) =>
        result.SpectralType.Length == 0 ? "" : $", most like type {HarmlessText.Printable(result.SpectralType)}"
            + (result.SpectralTypeErr is { } error ? $" ± {Number(error, 1)} subclasses" : "");

    private static string Frame(ObservationResult result)
    {
        var frame = result.Observation.Frame switch
        {
            VelocityFrame.Barycentric => "seen from the centre of mass of the solar system",
            VelocityFrame.Heliocentric => "seen from the Sun",
            VelocityFrame.Topocentric => "as seen from the observatory: the motion of the Earth is still in it",
            VelocityFrame.LocalStandardOfRest => "relative to the local standard of rest",
            VelocityFrame.Rest => "relative to a redshift that the file has already taken out",
            _ => "in a frame that the file does not state",
        };
        return result.VelocityCorrectionKmS is { } correction ? $"{frame} (corrected by {Number(correction, 3)} km/s)" : frame;
    }

    private static string Resolution(ObservationResult result) => result.Resolution is { } resolution
        ? Number(resolution, 0) + result.ResolutionFrom switch
        {
            ResolutionSource.Pipeline => ", from the pipeline file",
            ResolutionSource.File => ", from the values in the file",
            ResolutionSource.Keyword => ", from the header",
            _ => ", an estimate",
        }
        : "not known";

    private static string Number(double? value, int decimals) => Cell.Fixed(value, decimals) is { Text.Length: > 0 } cell ? cell.Text : "?";

    // The lines' shares, other features, priors and volume add up to the evidence of the answer, so that nothing is hidden.
    private static void WriteReasons(TextWriter output, ObservationResult result)
    {
        var lines = result.Lines.Where(line => line.LnLikelihoodGain is not null).OrderByDescending(line => line.LnLikelihoodGain).ToList();
        var most = lines.Select(line => line.LnLikelihoodGain!.Value).DefaultIfEmpty(0).Max();
        var table = new TextTable();
        foreach (var line in lines)
            table.Add(Gain(line.LnLikelihoodGain), Cell.Of(line.Line), Bar(line.LnLikelihoodGain!.Value / most), new(Measured(line), false));
        if (result.Candidates.Count > 0)
        {
            table.Add(Gain(result.OtherFeaturesLnGain), Cell.Of("other features"), Cell.Empty, Cell.Of("breaks, unlisted lines"));
            table.Add(Gain(result.PriorAndVolumeLnGain), Cell.Of("prior and volume"), Cell.Empty, Cell.Of("what the freedom of the model costs"));
            table.Add(Gain(result.Candidates[0].LnEvidence), Cell.Of("in all"));
        }

        output.WriteLine();
        output.WriteLine($"Why: what each line adds to the ln likelihood, over a spectrum without lines ({Expected(result)})");
        table.Write(output, Indent);
    }

    // The model need not be sure of a line that is found, so that more lines may be listed than are expected.
    private static string Expected(ObservationResult result) => "lines that have to show: " + (result.LinesExpected == 0
        ? "none"
        : string.Create(CultureInfo.InvariantCulture, $"{result.LinesMatched} of {result.LinesExpected} found"));

    private static Cell Gain(double? gain) => Cell.Fixed(gain, 1);

    private static Cell Bar(double share) => new(new string('█', (int)Math.Round(BarWidth * Math.Clamp(share, 0, 1))), false);

    private static string Measured(LineMeasurement line)
    {
        var parts = new List<string>();
        if (line.ObservedVacuumA is { } wavelength)
            parts.Add(string.Create(CultureInfo.InvariantCulture, $"at {wavelength:F2} Å"));
        if (line.EquivalentWidthRestA is { } width)
            parts.Add(string.Create(CultureInfo.InvariantCulture, $"{(width < 0 ? "emission" : "absorption")} of {Math.Abs(width):F2} Å"));
        if (line.OffsetKmS is { } offset)
            parts.Add(string.Create(CultureInfo.InvariantCulture, $"{offset:+0;-0;0} ± {line.OffsetErrKmS:F0} km/s"));
        if (line.State != LineState.Matched)
            parts.Add(Words.Of(line.State));
        if (line.Note.Length > 0)
            parts.Add(HarmlessText.Printable(line.Note));
        return string.Join(", ", parts);
    }

    private static void WriteMissing(TextWriter output, ObservationResult result)
    {
        var missing = result.Lines.Where(line => line.State == LineState.ExpectedMissing).ToList();
        if (missing.Count == 0)
            return;
        output.WriteLine();
        output.WriteLine("Missing: lines that should be seen at this redshift and are not");
        var table = new TextTable();
        foreach (var line in missing)
        {
            var place = result.ZFile is { } z && line.RestVacuumA is { } rest
                ? string.Create(CultureInfo.InvariantCulture, $"expected at {rest * (1 + z):F1} Å") : "";
            var limit = line.FluxErr is { } flux
                ? $"fainter than {Cell.Significant(flux).Text} {LineFluxUnit(line)}" : "";
            table.AddWords(HarmlessText.Printable(line.Line), place, limit);
        }

        table.Write(output, Indent);
    }

    private static string LineFluxUnit(LineMeasurement line) =>
        line.FluxUnit.Trim() is { Length: > 0 } unit ? $"({HarmlessText.Printable(unit)}) Å" : "Å times the unit of the flux";

    private static void WriteRivals(TextWriter output, ObservationResult result)
    {
        if (result.Candidates.Count == 0)
            return;
        output.WriteLine();
        output.WriteLine("What else: the candidates, the answer first");
        var table = new TextTable();
        table.AddWords("share", "kind", "z as in the file", "ln evidence", "model");
        foreach (var candidate in result.Candidates.Take(MostCandidates))
        {
            table.Add(
                Cell.Fixed(candidate.Probability, 4), Cell.Of(Words.Of(candidate.Kind)), Cell.Fixed(candidate.Z, 5),
                Cell.Fixed(candidate.LnEvidence, 1), Cell.Of(candidate.Template));
        }

        table.Write(output, Indent);
    }

    private static void WriteCautions(TextWriter output, ObservationResult result)
    {
        var cautions = CatalogueColumns.Cautions(result).ToList();
        if (cautions.Count == 0)
            return;
        output.WriteLine();
        output.WriteLine("Be careful");
        foreach (var caution in cautions)
        {
            output.WriteLine(Indent + HarmlessText.Printable(caution));
            if (CautionGuide.Find(caution) is { } advice)
                WriteWrapped(output, advice);
        }
    }

    private static void WriteWrapped(TextWriter output, string text)
    {
        const int width = 76;
        var line = Indent + " ";
        foreach (var word in text.Split(' '))
        {
            if (line.Length + 1 + word.Length > width)
            {
                output.WriteLine(line);
                line = Indent + " ";
            }

            line += " " + word;
        }

        output.WriteLine(line);
    }

    private static string Name(Observation observation)
    {
        var file = observation.Row == 0 ? observation.Source : $"{observation.Source} row {observation.Row}";
        var target = HarmlessText.Printable(observation.Target.Trim());
        return target.Length == 0 ? file : $"{file} ({target})";
    }

    private static string Describe(Spectrum spectrum)
    {
        var label = spectrum.Label.Length == 0 ? "spectrum" : HarmlessText.Printable(spectrum.Label);
        var usable = spectrum.InverseVariance.Count(weight => weight > 0);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{label}: {spectrum.Count} pixels, {usable} usable, {spectrum.Wavelength[0]:F2} to {spectrum.Wavelength[^1]:F2} Å in vacuum, "
            + $"{(spectrum.HasErrors ? "with errors" : "without errors")}, flux in {Unit(spectrum)}");
    }

    private static string Unit(Spectrum spectrum) =>
        spectrum.FluxUnit.Trim().Length == 0 ? "a unit that is not stated" : HarmlessText.Printable(spectrum.FluxUnit.Trim());
}
