using Redshift.Pipeline.Ledger;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class JournalChoiceTests
{
    [Theory]
    [InlineData("ext4", true)]
    [InlineData("NTFS", true)]
    [InlineData("nfs", false)]
    [InlineData("nfs4", false)]
    [InlineData("cifs", false)]
    [InlineData("smb2", false)]
    [InlineData("lustre", false)]
    [InlineData("gpfs", false)]
    [InlineData("fuse.sshfs", false)]
    [InlineData("something new", false)]
    [InlineData("", false)]
    public void Only_disks_known_to_be_local_share_memory(string format, bool local) => Assert.Equal(local, JournalChoice.IsLocal(format));

    [Fact]
    public void A_closed_ledger_is_a_single_file()
    {
        using var folder = new TemporaryFolder();
        LedgerFile.Open(folder.Path).Dispose();

        Assert.Equal(["ledger.db"], Directory.GetFiles(folder.Path).Select(Path.GetFileName));
    }
}
