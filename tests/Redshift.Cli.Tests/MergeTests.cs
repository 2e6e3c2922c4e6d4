using System.Globalization;
using Xunit;

namespace Redshift.Cli.Tests;

/// <summary>A run that is shared out.</summary>
public sealed class MergeTests : IDisposable
{
    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void One_run_and_seven_parts_with_any_workers_in_any_order_give_the_same_bytes()
    {
        for (var i = 0; i < 8; i++)
            File.WriteAllText(_folder.At($"clouds/{i}.txt"), $"clouds {i}");
        _folder.WriteFits("f.fits");
        var list = _folder.Out("list");
        File.WriteAllLines(list, Directory.GetFiles(_folder.Spectra, "*", SearchOption.AllDirectories).OrderDescending(StringComparer.Ordinal));
        Zladder.Run("run", _folder.Spectra, "--out", _folder.Out("whole"));

        int[] order = [4, 7, 1, 3, 6, 2, 5];
        foreach (var part in order)
        {
            var jobs = (1 + part % 2).ToString(CultureInfo.InvariantCulture);
            Assert.Equal(0, Zladder.Run("run", "--from", list, "--shard", $"{part}/7", "--jobs", jobs, "--out", _folder.Out($"part{part}")).Status);
        }

        var some = Zladder.Run(["merge", "--out", _folder.Out("merged"), .. order[..5].Select(part => _folder.Out($"part{part}"))]);
        var all = Zladder.Run(["merge", "--out", _folder.Out("merged"), .. order.Select(part => _folder.Out($"part{part}"))]);

        Assert.Equal(3, some.Status);
        Assert.Contains(": found no ledger beside it for part 2/7, 5/7; expected all parts; ", some.Errors, StringComparison.Ordinal);
        Assert.Equal((0, ""), (all.Status, all.Errors));
        Assert.StartsWith("3 spectra: ", all.Output, StringComparison.Ordinal);
        foreach (var table in new[] { "catalogue.csv", "lines.csv", "rejects.csv", "columns.csv" })
            Assert.Equal(File.ReadAllBytes(Path.Combine(_folder.Out("whole"), table)), File.ReadAllBytes(Path.Combine(_folder.Out("merged"), table)));
    }

    [Fact]
    public void A_part_is_no_place_for_the_catalogue()
    {
        var outcome = Zladder.Run("merge", _folder.Out("a"), "--out", _folder.Out("a") + "/");

        Assert.Equal(2, outcome.Status);
        Assert.EndsWith(": expected a folder that is none of the parts\n", outcome.Errors, StringComparison.Ordinal);
    }
}
