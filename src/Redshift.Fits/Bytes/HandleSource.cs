using Microsoft.Win32.SafeHandles;

namespace Redshift.Fits;

/// <summary>
/// A file read by position. It is not mapped into memory: a mapped file that somebody shortens kills the process,
/// a read that comes back short is an exception. The owner is disposed with the source.
/// </summary>
internal sealed class HandleSource(string name, SafeFileHandle handle, IDisposable owner) : ByteSource(name)
{
    public override long Length { get; } = RandomAccess.GetLength(handle);

    public override void Read(long offset, Span<byte> into)
    {
        var asked = into.Length;
        var position = offset;
        while (!into.IsEmpty)
        {
            var got = RandomAccess.Read(handle, into, position);
            if (got == 0) throw EndsBefore(offset, asked);
            into = into[got..];
            position += got;
        }
    }

    public override void Dispose() => owner.Dispose();
}
