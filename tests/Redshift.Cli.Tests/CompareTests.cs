using System.Text.Json;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class CompareTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_catalogue_is_held_against_known_redshifts()
    {
        var known = Write("known.csv", "name,ra,dec,redshift\nNGC 1,10.0,20.0,0.0150\nNGC 2,10.1,20.0,0.0200\nNGC 3,10.2,20.0,0.0300\n");
        var catalogue = Write("catalogue.csv", """
            source,row,target,ra_deg,dec_deg,z,kind,verdict
            a.fits,0,ngc1,10.0002,20.0,0.0150100,galaxy,firm
            b.fits,0,ngc2,,,1.2000000,quasar,likely
            c.fits,0,,10.2,20.0,,unknown,nothing

            """);
        var byName = Zladder.Run("compare", known, catalogue);
        var byPlace = Zladder.Run("compare", known, catalogue, "--by", "position", "--radius", "3", "--json");

        Assert.Equal((0, ""), (byName.Status, byName.Errors));
        ApprovedText.Check(
            byName.Output.Replace(_folder.Path, "FOLDER", StringComparison.Ordinal), "tests", "Redshift.Cli.Tests", "Approved", "compare.txt");
        using var json = JsonDocument.Parse(byPlace.Output);
        Assert.Equal("position", json.RootElement.GetProperty("paired_by").GetString());
        Assert.Equal(2, json.RootElement.GetProperty("pairs").GetInt32());
        Assert.Equal(1, json.RootElement.GetProperty("changes").GetProperty("z-lost").GetInt32());
        // c (0.01501 - 0.015) / 1.015
        Assert.Equal(2.954, json.RootElement.GetProperty("redshifts")[0].GetProperty("median_km_s").GetDouble());
    }

    [Fact]
    public void Rows_that_differ_are_written()
    {
        var old = Write("old.csv", "source,z\na,0.1\nb,0.2\n");
        var now = Write("new.csv", "source,z\nb,0.2\nc,0.3\n");
        var outcome = Zladder.Run("compare", old, now, "--csv", _folder.File("differences.csv"));

        Assert.Equal(0, outcome.Status);
        Assert.Equal(
            """
            changes,source,row,target,old_z,z,offset_km_s,tolerance_km_s,old_kind,kind,old_verdict,verdict
            added,c,0,,,0.3000000,,1000.000,,,,
            missing,a,0,,0.1000000,,,1000.000,,,,

            """,
            File.ReadAllText(_folder.File("differences.csv")));
    }

    [Fact]
    public void Tables_without_a_common_object_end_with_status_4() =>
        Assert.Equal(4, Zladder.Run("compare", Write("old.csv", "target,z\na,0.1\n"), Write("new.csv", "target,z\nb,0.1\n")).Status);

    [Fact]
    public void Wrong_usage_is_said_in_one_line_with_status_2()
    {
        var names = Write("names.csv", "target,z\na,0.1\n");
        var places = Write("places.csv", "ra,dec,z\n1,2,0.1\n");
        Check($"nothing pairs the rows of {names} and {places}: both need a column source, target, or ra_deg and dec_deg", names, places);
        Check($"--by target: {places} has no such column", names, places, "--by", "target");
        Check("--radius: found 'wide'; expected a radius in arcseconds, above 0 and up to 3600", names, names, "--radius", "wide");
        Check("/no/old: found no file that can be opened; expected a table in CSV or FITS", "/no/old", names);
        Check("there is no option --jsno", "--jsno", names);
    }

    private static void Check(string message, params string[] arguments)
    {
        var outcome = Zladder.Run(["compare", .. arguments]);

        Assert.Equal((2, ""), (outcome.Status, outcome.Output));
        Assert.Equal("zladder: " + message, outcome.Errors.Split('\n')[0]);
    }

    private string Write(string name, string text)
    {
        File.WriteAllText(_folder.File(name), text);
        return _folder.File(name);
    }
}
