using Redshift.Pipeline.Batch;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Batch;

public sealed class FolderWatchTests : IDisposable
{
    private static readonly byte[] Whole = new FitsText().Header(
        "SIMPLE  =                    T", "BITPIX  =                  -32", "NAXIS   =                    1", "NAXIS1  =                  400")
        .Data(new byte[1600]).ToBytes();

    private readonly TemporaryFolder _folder = new();
    private readonly FolderWatch _watch;

    public FolderWatchTests() => _watch = new(_folder.Path, _folder.File("out"));

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_file_is_told_at_the_second_look_and_then_no_more()
    {
        File.WriteAllBytes(_folder.File("a.fits"), Whole);

        Assert.Null(Look());
        Assert.Equal(["a.fits"], Look());
        Assert.Null(Look());
    }

    [Fact]
    public void All_complete_files_are_told_when_one_comes_and_when_one_goes()
    {
        File.WriteAllBytes(_folder.File("a.fits"), Whole);
        Look();
        Look();
        File.WriteAllText(_folder.File("b.txt"), "1 2\n");

        Assert.Null(Look());
        Assert.Equal(["a.fits", "b.txt"], Look());
        File.Delete(_folder.File("a.fits"));
        Assert.Equal(["b.txt"], Look());
    }

    [Theory]
    [InlineData(100)]
    [InlineData(2880)]
    [InlineData(2880 + 1599)]
    [InlineData(2880 + 1600)]
    public void A_fits_file_that_rests_before_it_is_whole_is_waited_for(int length)
    {
        File.WriteAllBytes(_folder.File("a.fits"), Whole[..length]);
        for (var look = 0; look < FolderWatch.Patience; look++)
            Assert.Null(Look());
        File.WriteAllBytes(_folder.File("a.fits"), Whole);

        Assert.Null(Look());
        Assert.Equal(["a.fits"], Look());
    }

    [Fact]
    public void A_fits_file_that_is_never_completed_is_told_after_a_while()
    {
        File.WriteAllBytes(_folder.File("a.fits"), Whole[..100]);
        for (var look = 0; look < FolderWatch.Patience; look++)
            Assert.Null(Look());

        Assert.Equal(["a.fits"], Look());
    }

    [Fact]
    public void A_file_that_grows_is_not_told_until_it_rests()
    {
        for (var length = 1; length <= 5; length++)
        {
            File.WriteAllText(_folder.File("a.txt"), new string('1', length));
            Assert.Null(Look());
        }

        Assert.Equal(["a.txt"], Look());
        File.AppendAllText(_folder.File("a.txt"), "1");
        Assert.Equal([], Look());
        Assert.Equal(["a.txt"], Look());
    }

    [Fact]
    public void A_transfer_under_another_name_is_told_by_its_last_name()
    {
        File.WriteAllBytes(_folder.File("a.fits.part"), Whole[..2000]);
        Assert.Null(Look());
        File.WriteAllBytes(_folder.File("a.fits.part"), Whole);
        File.Move(_folder.File("a.fits.part"), _folder.File("a.fits"));

        Assert.Null(Look());
        Assert.Equal(["a.fits"], Look());
    }

    [Fact]
    public void A_folder_that_cannot_be_seen_changes_nothing()
    {
        File.WriteAllBytes(_folder.File("a.fits"), Whole);
        Look();
        Look();
        Directory.Move(_folder.Path, _folder.Path + "-away");
        Assert.Null(Look());
        Assert.False(_watch.IsThere);
        Directory.Move(_folder.Path + "-away", _folder.Path);

        Assert.True(_watch.IsThere);
        Assert.Null(Look());
    }

    private IEnumerable<string>? Look() => _watch.Look()?.Select(file => file.Source);
}
