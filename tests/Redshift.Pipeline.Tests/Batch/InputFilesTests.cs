using Redshift.Pipeline.Batch;
using Xunit;

namespace Redshift.Pipeline.Tests.Batch;

public sealed class InputFilesTests : IDisposable
{
    private readonly string _root = Directory.CreateTempSubdirectory("inputs").FullName;

    public InputFilesTests()
    {
        foreach (var file in new[] { "a/x.fits", "a/b/y.fits", "a/b/.hidden", "c/z.fits", "out/catalogue.csv", "a-b.fits" })
        {
            Directory.CreateDirectory(Path.GetDirectoryName(At(file))!);
            File.WriteAllText(At(file), "");
        }
    }

    public void Dispose() => Directory.Delete(_root, recursive: true);

    [Fact]
    public void A_folder_gives_everything_below_it_in_ordinal_order() =>
        Assert.Equal(["a-b.fits", "a/b/y.fits", "a/x.fits", "c/z.fits"], Sources([_root], At("out")));

    [Fact]
    public void Sources_start_below_the_common_parent() =>
        Assert.Equal(["a/b/y.fits", "c/z.fits"], Sources([At("c/z.fits"), At("a/b")]));

    [Fact]
    public void A_single_file_is_named_by_itself() => Assert.Equal(["y.fits"], Sources([At("a/b/y.fits")]));

    [Fact]
    public void Order_and_repetition_of_the_paths_do_not_matter() =>
        Assert.Equal(
            Sources([At("a"), At("c")]),
            Sources([At("c") + "/", At("a/b/y.fits"), At("c/z.fits"), At("a/./x.fits"), At("a"), At("c")]));

    [Fact]
    public void A_missing_path_becomes_a_reject()
    {
        var file = Assert.Single(InputFiles.Find([At("a/x.fits"), At("a/none.fits")], null), file => file.Reject is not null);

        Assert.Equal("none.fits: path: found nothing at this path; expected a file or folder", file.Reject!.ToString());
    }

    [Fact]
    public void A_linked_folder_that_leads_back_is_not_followed()
    {
        Directory.CreateSymbolicLink(At("a/loop"), At("a"));

        Assert.Equal(["b/y.fits", "x.fits"], Sources([At("a")]));
    }

    [Fact]
    public void Names_that_look_the_same_in_print_are_told_apart()
    {
        File.WriteAllText(At("c/z.fits "), "");
        File.WriteAllText(At("c/ z.fits"), "");

        Assert.Equal(["z.fits", "z.fits (2)", "z.fits (3)"], Sources([At("c")]));
    }

    [Fact]
    public void Odd_names_are_printable()
    {
        File.WriteAllText(At("a/=caf\u00e9\n.fits"), "");

        Assert.Contains("'=caf\\u00e9\\u000a.fits", Sources([At("a")]));
    }

    private static string[] Sources(string[] paths, string? except = null) =>
        [.. InputFiles.Find(paths, except).Select(file => file.Source)];

    private string At(string path) => Path.Combine(_root, path);
}
