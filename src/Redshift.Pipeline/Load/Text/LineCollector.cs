using System.Collections.Frozen;
using System.Globalization;

namespace Redshift.Pipeline.Load.Text;

/// <summary>Takes the lines of a text file one by one: remarks, a line of names, perhaps one of units, then numbers.</summary>
internal sealed class LineCollector
{
    // Words above the numbers beyond which a file is prose.
    private const int MostWordLines = 200;

    // Some dialects state the type of each column in a line of its own.
    private static readonly FrozenSet<string> ColumnTypes = new[] { "double", "float", "real", "int", "integer", "long", "char", "string", "str", "date", "d", "r", "i", "c", "N", "S" }
        .ToFrozenSet(StringComparer.Ordinal);

    private readonly List<string> _remarks = [];
    private readonly List<List<double>> _columns = [];
    private readonly List<double> _numbers = [];
    private string[]? _names;
    private string[]? _units;
    private int _line;
    private int _wordLines;

    /// <summary>Takes a line.</summary>
    /// <exception cref="LoadException">It is not what can stand at its place.</exception>
    public void Add(string text)
    {
        _line++;
        if (NumberLine.TryReadPlain(text, _numbers)) AddNumbers(text);
        else if (text.Trim('\uFEFF', ' ', '\t', '\r', '\0') is { Length: > 0 } line) AddOther(line);
    }

    /// <summary>The table of all lines.</summary>
    /// <exception cref="LoadException">There were no numbers.</exception>
    public TextTable ToTable()
    {
        DropEmptyColumns();
        if (_columns.Count > 0) return HeaderLines.Assemble(_columns, _names, _units, _remarks);
        var found = _names is null ? "no line of numbers" : $"no line of numbers, but '{Shown(string.Join(' ', _names))}'";
        throw new LoadException("text", found, "columns of numbers, or a FITS file");
    }

    // A separator at the end of every line begins a column that nobody names or fills.
    private void DropEmptyColumns()
    {
        while (_columns.Count > (_names?.Length ?? 0) && _columns[^1].TrueForAll(double.IsNaN)) _columns.RemoveAt(_columns.Count - 1);
    }

    private void AddOther(string line)
    {
        if (IsRemark(line)) _remarks.Add(line.TrimStart('#', '%', ';', '!', '/', '*', ' ', '\t'));
        else if (NumberLine.IsDecimalComma(line)) throw At(line, "numbers with a decimal point, not a comma");
        else if (NumberLine.TryRead(NumberLine.Fields(line), _numbers)) AddNumbers(line);
        else AddWords(line);
    }

    // Of several lines of words the last two can be names and units.
    private void AddWords(string line)
    {
        if (_columns.Count > 0 || IsBinary(line) || !HasWord(line) || ++_wordLines > MostWordLines) throw At(line, "columns of numbers");
        var words = NumberLine.Fields(line);
        if (words.All(ColumnTypes.Contains)) return;
        if (_names is null) _names = words;
        else (_names, _units) = _units is null ? (_names, words) : (_units, words);
    }

    private void AddNumbers(string line)
    {
        // A first line of one number counts the lines that follow.
        if (_columns is [{ Count: 1 }] && _numbers.Count > 1) _columns.Clear();
        if (_columns.Count == 0) _columns.AddRange(_numbers.Select(static _ => new List<double>()));
        if (_numbers.Count != _columns.Count)
            throw At(line, string.Create(CultureInfo.InvariantCulture, $"{_columns.Count} columns as in the lines before, not {_numbers.Count}"));
        for (var i = 0; i < _numbers.Count; i++) _columns[i].Add(_numbers[i]);
    }

    private static bool IsRemark(string line) =>
        line[0] is '#' or '%' or '!' or ';' or '*' || line.StartsWith("//", StringComparison.Ordinal) || IsRule(line);

    // Lines drawn between the names and the numbers, of at least three signs.
    private static bool IsRule(string line) => line.Length >= 3 && line.All(static letter => letter is '-' or '=' or '+' or '|' or ' ' or '\t');

    private static bool IsBinary(string line) => line.Any(static character => character is < ' ' and not '\t');

    // Names have letters; a line of digits that is no number has columns that run together.
    private static bool HasWord(string line) =>
        line.Any(static character => char.IsLetter(character) && character is not ('e' or 'E' or 'd' or 'D'));

    private LoadException At(string text, string expected) =>
        new(string.Create(CultureInfo.InvariantCulture, $"line {_line}"), $"'{Shown(text)}'", expected);

    private static string Shown(string text) =>
        new([.. text.Take(60).Select(static character => char.IsControl(character) ? '?' : character)]);
}
