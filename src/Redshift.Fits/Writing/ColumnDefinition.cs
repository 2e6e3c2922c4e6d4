using System.Globalization;

namespace Redshift.Fits;

/// <summary>
/// A column of a binary table to be written, for example
/// <c>ColumnDefinition.Doubles("WAVELENGTH", values) with { Unit = "Angstrom", Ucd = "em.wl" }</c>.
/// Values come from an array, in row order, or from a delegate that is asked for each row, twice when checksums are written.
/// </summary>
public sealed record ColumnDefinition
{
    private ColumnDefinition(string name, string format, int width, CellEncoder encode)
    {
        Name = name;
        Format = format;
        Width = width;
        Encode = encode;
    }

    internal delegate void CellEncoder(long row, Span<byte> into);

    /// <summary>TTYPEn.</summary>
    public string Name { get; }

    /// <summary>TFORMn.</summary>
    public string Format { get; }

    /// <summary>TUNITn.</summary>
    public string? Unit { get; init; }

    /// <summary>TUCDn.</summary>
    public string? Ucd { get; init; }

    /// <summary>TUTYPn.</summary>
    public string? Utype { get; init; }

    /// <summary>TCOMMn.</summary>
    public string? Comment { get; init; }

    /// <summary>TNULLn: the integer that stands for no value.</summary>
    public long? Null { get; init; }

    /// <summary>TZEROn: what a reader adds to every stored integer.</summary>
    public double? Zero { get; init; }

    /// <summary>TDIMn: axes of a cell, the fastest first.</summary>
    public IReadOnlyList<int>? Dimensions { get; init; }

    internal int Width { get; }

    internal CellEncoder Encode { get; }

    /// <summary>64-bit floats, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Doubles(string name, double[] values, int repeat = 1) => OfArray(name, 'D', values, repeat);

    /// <summary>One 64-bit float a row.</summary>
    public static ColumnDefinition Doubles(string name, Func<long, double> value) => OfScalar(name, 'D', value);

    /// <summary>A vector of 64-bit floats a row.</summary>
    public static ColumnDefinition Doubles(string name, int repeat, Func<long, double[]> cell) => OfVector(name, 'D', repeat, cell);

    /// <summary>32-bit floats, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Singles(string name, float[] values, int repeat = 1) => OfArray(name, 'E', values, repeat);

    /// <summary>One 32-bit float a row.</summary>
    public static ColumnDefinition Singles(string name, Func<long, float> value) => OfScalar(name, 'E', value);

    /// <summary>A vector of 32-bit floats a row.</summary>
    public static ColumnDefinition Singles(string name, int repeat, Func<long, float[]> cell) => OfVector(name, 'E', repeat, cell);

    /// <summary>64-bit integers, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Int64s(string name, long[] values, int repeat = 1) => OfArray(name, 'K', values, repeat);

    /// <summary>One 64-bit integer a row.</summary>
    public static ColumnDefinition Int64s(string name, Func<long, long> value) => OfScalar(name, 'K', value);

    /// <summary>32-bit integers, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Int32s(string name, int[] values, int repeat = 1) => OfArray(name, 'J', values, repeat);

    /// <summary>One 32-bit integer a row.</summary>
    public static ColumnDefinition Int32s(string name, Func<long, int> value) => OfScalar(name, 'J', value);

    /// <summary>A vector of 32-bit integers a row.</summary>
    public static ColumnDefinition Int32s(string name, int repeat, Func<long, int[]> cell) => OfVector(name, 'J', repeat, cell);

    /// <summary>16-bit integers, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Int16s(string name, short[] values, int repeat = 1) => OfArray(name, 'I', values, repeat);

    /// <summary>One 16-bit integer a row.</summary>
    public static ColumnDefinition Int16s(string name, Func<long, short> value) => OfScalar(name, 'I', value);

    /// <summary>Unsigned 8-bit integers, <paramref name="repeat"/> of them a row.</summary>
    public static ColumnDefinition Bytes(string name, byte[] values, int repeat = 1) => OfArray(name, 'B', values, repeat);

    /// <summary>One logical value a row; null is written as undefined.</summary>
    public static ColumnDefinition Logicals(string name, Func<long, bool?> value) =>
        OfScalar(name, 'L', row => value(row) switch { true => (byte)'T', false => (byte)'F', null => (byte)0 });

    /// <summary>One string a row, as wide as the longest. Characters beyond ASCII become question marks.</summary>
    public static ColumnDefinition Strings(string name, IReadOnlyList<string> values) =>
        Strings(name, values.Select(value => value.Length).DefaultIfEmpty(0).Max(), row => values[(int)row]);

    /// <summary>One string a row in a field of fixed width.</summary>
    /// <exception cref="ArgumentException">When written: a string is longer than the field.</exception>
    public static ColumnDefinition Strings(string name, int width, Func<long, string> value) =>
        new(name, Form(width, 'A'), width, (row, into) => EncodeText(value(row), into));

    private static ColumnDefinition OfArray<T>(string name, char code, T[] values, int repeat)
        where T : unmanaged =>
        Of<T>(name, code, repeat, (row, into) => HostOrder.Encode(values.AsSpan(checked((int)row * repeat), repeat), into));

    private static ColumnDefinition OfScalar<T>(string name, char code, Func<long, T> value)
        where T : unmanaged =>
        Of<T>(name, code, 1, (row, into) => HostOrder.Encode([value(row)], into));

    private static ColumnDefinition OfVector<T>(string name, char code, int repeat, Func<long, T[]> cell)
        where T : unmanaged =>
        Of<T>(name, code, repeat, (row, into) => HostOrder.Encode(Exactly(cell(row), repeat, name), into));

    private static ColumnDefinition Of<T>(string name, char code, int repeat, CellEncoder encode)
        where T : unmanaged =>
        new(name, Form(repeat, code), checked(repeat * HostOrder.SizeOf<T>()), encode);

    private static string Form(int repeat, char code) => string.Create(CultureInfo.InvariantCulture, $"{repeat}{code}");

    private static ReadOnlySpan<T> Exactly<T>(T[] cell, int repeat, string name) =>
        cell.Length == repeat ? cell : throw new ArgumentException($"column '{name}': a cell has {cell.Length} elements instead of {repeat}");

    private static void EncodeText(string text, Span<byte> into)
    {
        if (text.Length > into.Length) throw new ArgumentException($"'{text}' is longer than its field of {into.Length}");
        into.Fill((byte)' ');
        for (var i = 0; i < text.Length; i++) into[i] = text[i] is >= ' ' and <= '~' ? (byte)text[i] : (byte)'?';
    }
}
