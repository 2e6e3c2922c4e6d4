using System.Globalization;
using System.IO.Compression;
using System.Text;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Reads columns of numbers, with or without a line of names, with comments, separated by blanks, commas, semicolons or bars.</summary>
internal static class TextTableReader
{
    private const int MostLines = 20_000_000;

    /// <summary>Reads a file, plain or compressed with gzip.</summary>
    /// <exception cref="LoadException">A line is not numbers, and the message says which.</exception>
    public static TextTable Read(string path)
    {
        using var file = File.OpenRead(path);
        using var stream = IsGzip(file) ? new GZipStream(file, CompressionMode.Decompress) : (Stream)file;
        using var reader = new StreamReader(stream, Encoding.Latin1);
        return Read(reader);
    }

    private static bool IsGzip(FileStream file)
    {
        Span<byte> magic = stackalloc byte[2];
        var read = file.ReadAtLeast(magic, 2, throwOnEndOfStream: false);
        file.Position = 0;
        return read == 2 && magic[0] == 0x1f && magic[1] == 0x8b;
    }

    private static TextTable Read(StreamReader reader)
    {
        var remarks = new List<string>();
        var columns = new List<List<double>>();
        var numbers = new List<double>();
        string[]? header = null;
        string[]? units = null;
        for (var line = 1; reader.ReadLine() is { } text && line <= MostLines; line++)
        {
            var trimmed = text.Trim('\uFEFF', ' ', '\t', '\r', '\0');
            if (trimmed.StartsWith("ï»¿", StringComparison.Ordinal)) trimmed = trimmed[3..];
            if (trimmed.Length == 0) continue;
            if (IsComment(trimmed)) remarks.Add(trimmed.TrimStart('#', '%', ';', '!', '/', '*', ' ', '\t'));
            else if (NumberLine.IsDecimalComma(trimmed)) throw At(line, trimmed, "numbers with a decimal point, not a comma");
            else if (NumberLine.TryRead(NumberLine.Fields(trimmed), numbers)) Append(columns, numbers, line, trimmed);
            else if (columns.Count > 0 || IsBinary(trimmed) || !HasWord(trimmed)) throw At(line, trimmed, "columns of numbers");
            else if (header is null) header = NumberLine.Fields(trimmed);
            else if (units is null) units = NumberLine.Fields(trimmed);
            else if (line > 200) throw At(line, trimmed, "columns of numbers");
            else (header, units) = (units, NumberLine.Fields(trimmed));
        }
        if (columns.Count == 0) throw new LoadException("text", header is null ? "no line of numbers" : $"no line of numbers behind '{Shown(string.Join(' ', header))}'", "columns of numbers, or a FITS file");
        return HeaderLines.Assemble(columns, header, units, remarks);
    }

    private static bool IsComment(string line) => line[0] is '#' or '%' or '!' or ';' or '*' || line.StartsWith("//", StringComparison.Ordinal);

    private static void Append(List<List<double>> columns, List<double> numbers, int line, string text)
    {
        // A first line of one number counts the lines that follow.
        if (columns is [{ Count: 1 }] && numbers.Count > 1) columns.Clear();
        if (columns.Count == 0)
            for (var i = 0; i < numbers.Count; i++) columns.Add([]);
        if (numbers.Count != columns.Count)
            throw At(line, text, string.Create(CultureInfo.InvariantCulture, $"{columns.Count} columns as in the lines before, not {numbers.Count}"));
        for (var i = 0; i < numbers.Count; i++) columns[i].Add(numbers[i]);
    }

    // Names have letters; a line of digits that is no number has columns that run together.
    private static bool HasWord(string line) => line.Any(static character => char.IsLetter(character) && character is not ('e' or 'E' or 'd' or 'D'));

    private static bool IsBinary(string line) => line.Any(static character => character is < ' ' and not '\t');

    private static LoadException At(int line, string text, string expected) =>
        new(string.Create(CultureInfo.InvariantCulture, $"line {line}"), $"'{Shown(text)}'", expected);

    private static string Shown(string text) => new([.. text.Take(60).Select(static character => char.IsControl(character) ? '?' : character)]);
}
