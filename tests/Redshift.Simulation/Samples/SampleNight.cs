using System.IO.Compression;
using Redshift.Fits;

namespace Redshift.Simulation.Samples;

/// <summary>The files of <c>sample-spectra</c>: one invented night, every layout a reader meets, computed from fixed seeds.</summary>
public static class SampleNight
{
    private const string Plate = "LATTICE";
    private const string Slit = "THISTLE";
    private const string Infrared = "EMBERLINE";

    /// <summary>Writes all files and the table of truths below a folder.</summary>
    public static void WriteTo(string folder)
    {
        foreach (var file in Files())
            Write(folder, file.Path, file.Write);
        Write(folder, "truth.csv", WriteTruth);
    }

    private static void Write(string folder, string path, Action<Stream> write)
    {
        var target = Path.Combine([folder, .. path.Split('/')]);
        Directory.CreateDirectory(Path.GetDirectoryName(target)!);
        using var stream = File.Create(target);
        write(stream);
    }

    private static void WriteTruth(Stream stream)
    {
        using var writer = new StreamWriter(stream) { NewLine = "\n" };
        writer.WriteLine("source,row,kind,z,note");
        foreach (var file in Files().OrderBy(file => file.Path, StringComparer.Ordinal))
        {
            for (var row = 0; row < file.Truths.Count; row++)
                writer.WriteLine(FormattableString.Invariant($"{file.Path},{row},{file.Truths[row].Kind},{file.Truths[row].Z:0.000000},{file.Truths[row].Note}"));
        }
    }

    private static IEnumerable<SampleFile> Files() => [.. ClubSlit(), .. Fibres(), .. Deep(), .. Texts(), .. Broken()];

    private static IEnumerable<SampleFile> ClubSlit()
    {
        yield return Single("slit/dunmere-14.fits", 101, "amateur", "star-a", 0.000070, 90, "A star; linear air axis, no errors", (stream, o) =>
            ImageLayouts.LinearAir(stream, o.Spectra[0], Observatory.Cards("Dunmere 14", Slit, 279.31, 38.72, "2031-08-12T21:10:05", 300)));
        yield return Single("slit/dunmere-15.fits", 102, "course", "star-giant", -0.000110, 60, "giant star; CD1_1 and no medium stated (it is air)", (stream, o) =>
            ImageLayouts.LinearUnstated(stream, o.Spectra[0], [.. Observatory.Cards("Dunmere 15", Slit, 213.92, 19.18, "2031-08-12T21:31:40", 120), .. Observatory.Site()]));
        yield return Single("slit/dunmere-16-red.fits", 103, "amateur-high", "star-be", -0.000050, 80, "Be star; 250 A around H alpha at high resolution", (stream, o) =>
            ImageLayouts.LinearAir(stream, o.Spectra[0], Observatory.Cards("Dunmere 16", "THISTLE-HR", 10.13, 48.63, "2031-08-12T23:02:11", 900)));
        yield return Single("slit/dunmere-17.fits", 109, "course", "galaxy-active", 0.0163, 18, "galaxy with an active nucleus; errors in a sibling unit", (stream, o) =>
            ImageLayouts.WithSibling(stream, o.Spectra[0], Observatory.Cards("Dunmere 17", Slit, 40.67, -0.01, "2031-08-13T02:15:30", 2400)));
        yield return Single("slit/dunmere-18.fits", 105, "echelle", "star-fg", 0.000152, 45, "F or G star; echelle orders one a row in air", (stream, o) =>
            TableLayouts.Orders(stream, o.Spectra, Observatory.Cards("Dunmere 18", "THISTLE-X", 331.45, 12.2, "2031-08-13T00:44:00", 1200)));
    }

    private static IEnumerable<SampleFile> Fibres()
    {
        yield return Fibre("fibre/plate-101-017.fits", 111, "galaxy-passive", 0.1042, 16, "passive galaxy");
        yield return Fibre("fibre/plate-101-018.fits", 112, "galaxy-star-forming", 0.0721, 11, "star-forming galaxy");
        yield return Fibre("fibre/plate-101-023.fits", 113, "quasar", 2.134, 9, "quasar");
        yield return Fibre("fibre/plate-101-031.fits", 114, "star-m", -0.000083, 12, "M dwarf");
        yield return Fibre("fibre/plate-101-044.fits", 115, "blank", 0, 1, "fibre on blank sky");
        yield return Single("fibre/plate-101-052.fits", 116, "fibre-stars", "star-fg", -0.000391, 40, "F or G star; log10 axis in an image", (stream, o) =>
            ImageLayouts.Log10(stream, o.Spectra[0], Observatory.Cards("P101-052", Plate, 151.2, 22.3, "2031-03-02T01:00:00", 3600)));
        yield return Single("fibre/plate-102-004.fits.gz", 117, "fibre", "star-da", 0.000120, 20, "white dwarf; compressed", (stream, o) =>
        {
            using var gzip = new GZipStream(stream, CompressionLevel.SmallestSize, leaveOpen: true);
            TableLayouts.PixelARow(gzip, o.Spectra[0], Observatory.Cards("P102-004", Plate, 151.9, 23.0, "2031-03-02T02:10:00", 3600));
        });
        yield return Stack();
        yield return Arms();
    }

    private static IEnumerable<SampleFile> Deep()
    {
        yield return Single("deep/field-3-08.fits", 130, "faint-slit", "galaxy-ultraviolet", 3.312, 4.5, "galaxy in its ultraviolet light; one row of vector cells in nm", (stream, o) =>
            TableLayouts.VectorCells(stream, o.Spectra[0], Observatory.Cards("Field 3 object 8", "HOLLOW", 53.1, -27.8, "2031-11-20T03:00:00", 72000)));
        yield return Single("deep/field-3-21-visual.fits", 137, "two-arms", "quasar", 6.02, 7, "quasar beyond z 6; visual arm, one row of vector cells in nm", (stream, o) =>
            TableLayouts.VectorCells(stream, o.Spectra[0], Observatory.Cards("Field 3 object 21", "TWINFELL", 53.3, -27.7, "2031-11-21T03:00:00", 14400)));
        yield return Single("deep/cluster-7-h.fits", 132, "near-infrared", "galaxy-starburst", 1.438, 6, "starburst galaxy in the near infrared; axis in micrometres", (stream, o) =>
            ImageLayouts.Micrometres(stream, o.Spectra[0], Observatory.Cards("Cluster 7 member", Infrared, 34.3, -5.2, "2031-11-22T03:00:00", 7200)));
    }

    private static IEnumerable<SampleFile> Texts()
    {
        yield return Single("text/sable-ring.txt", 140, "amateur", "nebula-planetary", -0.000130, 40, "planetary nebula; blank-separated columns in air", (stream, o) =>
            TextLayouts.Columns(stream, o.Spectra[0], "Sable Ring, club night, 600 s", "wavelength in air [Angstrom]   relative flux"));
        yield return Single("text/visitor-2031c.csv", 141, "course", "comet", 0, 40, "comet: sunlight with molecular bands; no redshift model explains it", (stream, o) =>
            TextLayouts.Csv(stream, o.Spectra[0]));
        yield return Single("text/survey-qso.csv", 142, "fibre", "quasar-bal", 2.41, 12, "quasar with broad absorption; CSV with errors", (stream, o) =>
            TextLayouts.Csv(stream, o.Spectra[0]));
    }

    private static IEnumerable<SampleFile> Broken()
    {
        yield return new("slit/interrupted.fits", stream =>
        {
            using var whole = new MemoryStream();
            var spectrum = SimulatedSurvey.Observe(150, "amateur", "star-k", 0, 40).Spectra[0];
            ImageLayouts.LinearAir(whole, spectrum, Observatory.Cards("Dunmere 19", Slit, 12, 12, "2031-08-13T03:40:00", 300));
            // The transfer stopped in the middle of the header's second card row: there is no END.
            stream.Write(whole.GetBuffer().AsSpan(0, 1000));
        }, []);
    }

    private static SampleFile Fibre(string path, ulong seed, string objectClass, double z, double snr, string note) =>
        Single(path, seed, "fibre", objectClass, z, snr, note + "; one pixel a row with inverse variance and mask", (stream, o) =>
            TableLayouts.PixelARow(stream, o.Spectra[0], Observatory.Cards("P" + path[12..19], Plate, 150 + (seed / 100.0), 22.5, "2031-03-02T01:00:00", 3600)));

    private static SampleFile Stack()
    {
        (string Class, double Z, double Snr)[] targets =
        [
            ("galaxy-passive", 0.412, 5), ("galaxy-star-forming", 0.233, 4), ("galaxy-star-forming", 0.671, 3), ("galaxy-starburst", 0.118, 6), ("galaxy-post-starburst", 0.318, 7), ("galaxy-active", 0.154, 8),
            ("quasar", 1.612, 8), ("quasar", 0.842, 6), ("star-k", 0.00021, 20), ("star-hot", -0.00009, 25), ("galaxy-passive", 0.287, 9), ("blank", 0, 1),
        ];
        SimulatedObservation[] objects = [.. targets.Select((target, i) => OnOneAxis(SimulatedSurvey.Observe(200 + (ulong)i, "three-arms", target.Class, target.Z, target.Snr)))];
        string[] names = [.. targets.Select((_, i) => FormattableString.Invariant($"P117-{i + 1:000}"))];
        return new("fibre/plate-117-red.fits",
            stream => ImageLayouts.Stack(stream, [.. objects.Select(o => o.Spectra[0])], names, [Card.Of("INSTRUME", "LATTICE-R"), Card.Of("EXPTIME", 5400.0), Card.Of("DATE-OBS", "2031-03-03T00:20:00")]),
            [.. objects.Select(o => SampleTruth.Of(o, $"{o.ObjectClass}; row of a stack (errors as 1 sigma)"))]);
    }

    // The middle arm alone: all its exposures share one axis.
    private static SimulatedObservation OnOneAxis(SimulatedObservation observation) => observation with { Spectra = [observation.Spectra[1]] };

    private static SampleFile Arms()
    {
        (string Class, double Z, double Snr)[] targets = [("galaxy-star-forming", 1.187, 2.5), ("quasar", 2.874, 4), ("star-fg", 0.00012, 15), ("galaxy-passive", 0.734, 3)];
        SimulatedObservation[] objects = [.. targets.Select((target, i) => SimulatedSurvey.Observe(220 + (ulong)i, "three-arms", target.Class, target.Z, target.Snr))];
        return new("fibre/tile-5521.fits",
            stream => TableLayouts.Arms(stream, objects, [.. targets.Select((_, i) => FormattableString.Invariant($"T5521-{i + 1}"))], [Card.Of("INSTRUME", "TRIFOLD"), Card.Of("SPECSYS", "BARYCENT")]),
            [.. objects.Select(o => SampleTruth.Of(o, $"{o.ObjectClass}; three arms one object a row"))]);
    }

    private static SampleFile Single(string path, ulong seed, string setup, string objectClass, double z, double snr, string note, Action<Stream, SimulatedObservation> write)
    {
        var observation = SimulatedSurvey.Observe(seed, setup, objectClass, z, snr);
        return new(path, stream => write(stream, observation), [SampleTruth.Of(observation, note)]);
    }
}
