using System.Buffers.Binary;
using System.Runtime.InteropServices;
using BenchmarkDotNet.Attributes;
using Redshift.Fits;
using Redshift.Testing;

namespace Redshift.Benchmarks.Stages;

/// <summary>
/// A stack of 32-bit floats into an array, from memory and from a file in the system's cache: ours, beside copying as many
/// bytes in memory, reading them without decoding, and a plain stream whose values are parsed one by one.
/// </summary>
public class StackDecoding
{
    private const int Width = 4400;
    private const int Rows = 2000;
    private const int BlockLength = 2880;

    private readonly TemporaryFolder _folder = new();
    private readonly float[] _stack = new float[Width * Rows];
    private byte[] _bytes = [];
    private string _path = "";
    private FitsFile? _file;
    private FitsFile? _inMemory;

    /// <summary>Writes the stack.</summary>
    [GlobalSetup]
    public void Prepare()
    {
        _path = _folder.File("stack.fits");
        using (var stream = File.Create(_path))
            new FitsWriter(stream).WriteImage("", [.. Enumerable.Range(0, Width * Rows).Select(i => 1 + i % 1000 / 7f)], [Width, Rows]);
        _bytes = File.ReadAllBytes(_path);
        _file = FitsFile.Open(_path);
        _inMemory = FitsFile.Open(new MemoryStream(_bytes, 0, _bytes.Length, writable: false, publiclyVisible: true), "stack");
    }

    /// <summary>Removes the stack.</summary>
    [GlobalCleanup]
    public void CleanUp()
    {
        _file?.Dispose();
        _inMemory?.Dispose();
        _folder.Dispose();
    }

    /// <summary>Memory to memory.</summary>
    [Benchmark(Baseline = true)]
    public void Copy() => _bytes.AsSpan(BlockLength, 4 * _stack.Length).CopyTo(MemoryMarshal.AsBytes(_stack.AsSpan()));

    /// <summary>Our reader, from memory.</summary>
    [Benchmark]
    public void DecodeMemory() => ((ImageHdu)_inMemory!.Hdus[0]).ReadSingles(0, _stack);

    /// <summary>The system's cache to memory, without decoding: what no reader of files can be faster than.</summary>
    [Benchmark]
    public void ReadFile()
    {
        using var handle = File.OpenHandle(_path);
        RandomAccess.Read(handle, MemoryMarshal.AsBytes(_stack.AsSpan()), BlockLength);
    }

    /// <summary>Our reader, from the file.</summary>
    [Benchmark]
    public void DecodeFile() => ((ImageHdu)_file!.Hdus[0]).ReadSingles(0, _stack);

    /// <summary>A buffered stream, value by value.</summary>
    [Benchmark]
    public void StreamAndParse()
    {
        using var stream = new BufferedStream(File.OpenRead(_path), 1 << 16);
        stream.Position = BlockLength;
        Span<byte> value = stackalloc byte[4];
        foreach (ref var element in _stack.AsSpan())
        {
            stream.ReadExactly(value);
            element = BinaryPrimitives.ReadSingleBigEndian(value);
        }
    }
}
