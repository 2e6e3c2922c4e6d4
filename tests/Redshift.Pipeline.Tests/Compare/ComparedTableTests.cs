using Redshift.Fits;
using Redshift.Pipeline.Compare;
using Redshift.Pipeline.Report.Formats;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Tests.Report;
using Redshift.Pipeline.Tests.Report.Formats;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Compare;

public sealed class ComparedTableTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("csv")]
    [InlineData("fits")]
    public void A_catalogue_is_read_back(string format)
    {
        var path = _folder.File("catalogue.csv");
        TableFormats.Write(Tables.Catalogue([Examples.Full(), Examples.Nothing()]), format, path);

        Assert.Equal(
            [
                new ComparedRow
                {
                    Source = "night1/a.fits", Target = "M 42, core", RaDeg = 83.822083, DecDeg = -5.391111, Z = 0.1, Resolution = 2000,
                    Kind = "galaxy", Verdict = "firm",
                },
                new ComparedRow { Source = "night1/b.fits", Kind = "unknown", Verdict = "nothing" },
            ],
            Read(path));
        Assert.Equal(Read(path), Read(_folder.Path));
    }

    [Fact]
    public void Known_redshifts_may_come_from_anywhere()
    {
        Assert.Equal(
            [new ComparedRow { Target = "3C 273", RaDeg = 187.277916667, DecDeg = 2.052222222, Z = 0.158 }],
            Read(Write("# quasars\n\nName; RA ;DEC;note;Redshift\n3C 273;12:29:06.7;+02:03:08;\"bright; old\";0.158\n")));
        Assert.Equal([new ComparedRow { Target = "star", Z = 1 }], Read(Write("object\tvelocity_km_s\nstar\t299792.458\n")));
        Assert.Equal([new ComparedRow { Source = "a.fits", Row = 3 }], Read(Write("source,row,z\na.fits,3,\n")));
        // Our catalogues put an apostrophe before what a spreadsheet would run; tables from elsewhere do not.
        Assert.Equal([new ComparedRow { Target = "'-5 1234", Z = 0 }], Read(Write("target,z\n-5 1234,0\n")));
    }

    [Fact]
    public void Pairings_are_those_that_the_columns_allow()
    {
        using var table = ComparedTable.Open(Write("RA,DEC,source,z\n"));
        using var names = ComparedTable.Open(Write("ra,NAME,z\n"));

        Assert.Equal([Pairing.Source, Pairing.Position], table.Pairings);
        Assert.Equal([Pairing.Target], names.Pairings);
    }

    [Theory]
    [InlineData("target,z\na,0.1\nb,high\n", ", line 3, column z: found 'high'; expected a number, or nothing")]
    [InlineData("source,row,z\na,0.5,0\n", ", line 2, column row: found '0.5'; expected a whole number from 0, or nothing")]
    [InlineData("target,z\na,-1.5\n", ", line 2, column z: found '-1.5'; expected a redshift greater than -1")]
    [InlineData("ra,dec,z\n1,91,0\n", ", line 2, column dec: found '91'; expected an angle in degrees, or sexagesimal such as 12:29:06.7 or +02:03:08")]
    [InlineData("target,mag\na,1\n", ": found the columns target, mag; expected a column z or redshift, or velocity_km_s")]
    [InlineData("", ": found the columns ; expected a column z or redshift, or velocity_km_s")]
    public void What_is_wrong_is_named_with_its_place(string text, string message)
    {
        var path = Write(text);

        Assert.Equal(path + message, Assert.Throws<TableFileException>(() => Read(path)).Message);
    }

    [Fact]
    public void A_fits_file_without_a_table_is_refused()
    {
        var path = _folder.File("image.fits");
        using (var stream = File.Create(path))
            new FitsWriter(stream).WriteImage("", new double[3], [3]);

        Assert.Equal($"{path}: found no table; expected a FITS file with a table", Assert.Throws<TableFileException>(() => Read(path)).Message);
    }

    [Fact]
    public void A_file_that_is_not_there_is_named() => Assert.Equal(
        "/no/file: found no file that can be opened; expected a table in CSV or FITS",
        Assert.Throws<TableFileException>(() => Read("/no/file")).Message);

    [Fact]
    public void A_quote_without_end_is_not_read_into_memory_for_ever()
    {
        var path = Write("target,z\n\"" + new string('x', 5 << 20));

        Assert.Contains("found a record that is no CSV", Assert.Throws<TableFileException>(() => Read(path)).Message, StringComparison.Ordinal);
    }

    private static List<ComparedRow> Read(string path)
    {
        using var table = ComparedTable.Open(path);
        return [.. table.Rows().Select(row => row with { RaDeg = Rounded(row.RaDeg), DecDeg = Rounded(row.DecDeg) })];
    }

    // Taking angles modulo 360 costs the last bits.
    private static double? Rounded(double? degrees) => degrees is { } value ? Math.Round(value, 9) : null;

    private string Write(string text)
    {
        var path = _folder.File("known.csv");
        File.WriteAllText(path, text);
        return path;
    }
}
