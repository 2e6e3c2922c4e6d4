using System.Globalization;

namespace Redshift.Pipeline.Settings;

/// <summary>Reads one table of a pipeline file. The keys asked for are the keys known: whatever else stands there is an error.</summary>
internal sealed class SectionReader(TomlNode table)
{
    private readonly HashSet<string> _known = [];

    private Dictionary<string, TomlNode> Keys { get; } =
        table.Value as Dictionary<string, TomlNode> ?? throw table.Unlike("a table");

    /// <summary>A number within limits, which are part of what is allowed.</summary>
    public double? Number(string key, double low, double high) =>
        Find(key) is { } node ? Number(node, low, high) : null;

    /// <summary>A text that is not empty.</summary>
    public string? Text(string key) => Find(key) is { } node ? Text(node) : null;

    /// <summary>A text, or a number taken as text.</summary>
    public string? TextOrInteger(string key) => Find(key) is { } node ? TextOrInteger(node) : null;

    /// <summary>One or several texts, or numbers taken as texts; empty where the key is absent.</summary>
    public IReadOnlyList<string> TextsOrIntegers(string key) => Find(key) switch
    {
        null => [],
        { Value: List<TomlNode> { Count: > 0 } list } => list.ConvertAll(TextOrInteger),
        var single => [TextOrInteger(single)],
    };

    /// <summary>A number within limits, or a text.</summary>
    public (double? Number, string? Text) NumberOrText(string key, double low, double high) =>
        Find(key) is { Value: string } ? (null, Text(key)) : (Number(key, low, high), null);

    /// <summary>One of several words.</summary>
    public T? Choice<T>(string key, IReadOnlyDictionary<string, T> words) where T : struct
    {
        if (Find(key) is not { } node)
            return null;
        var expected = "one of " + string.Join(", ", words.Keys);
        return node.Value is string word && words.TryGetValue(word, out var value) ? value : throw node.Unlike(expected);
    }

    /// <summary>A list of texts; empty where the key is absent.</summary>
    public IReadOnlyList<string> Texts(string key)
    {
        if (Find(key) is not { } node)
            return [];
        var list = node.Value as List<TomlNode> ?? throw node.Unlike("a list of texts, such as [\"AIRMASS\"]");
        var texts = list.ConvertAll(Text);
        var twice = texts.GroupBy(text => text, StringComparer.Ordinal).FirstOrDefault(group => group.Count() > 1);
        return twice is null ? texts : throw node.Unlike("each card once", $"{twice.Key} twice");
    }

    /// <summary>Two numbers in rising order.</summary>
    public (double Low, double High)? Range(string key, double low, double high)
    {
        if (Find(key) is not { } node)
            return null;
        if (node.Value is not List<TomlNode> { Count: 2 } pair)
            throw node.Unlike("two numbers, such as [0.0, 1.5]");
        var (first, second) = (Number(pair[0], low, high), Number(pair[1], low, high));
        return first < second ? (first, second) : throw node.Unlike("the lower number first", $"[{first:R}, {second:R}]");
    }

    /// <summary>A table inside this one.</summary>
    public SectionReader? Section(string key) => Find(key) is { } node ? new(node) : null;

    /// <summary>A list of tables, written <c>[[key]]</c>.</summary>
    public IEnumerable<SectionReader> Sections(string key)
    {
        if (Find(key) is not { } node)
            return [];
        var list = node.Value as List<TomlNode> ?? throw node.Unlike($"a list of tables, written [[{key}]]");
        return list.Select(element => new SectionReader(element));
    }

    /// <summary>A table of free keys with a text or an integer each.</summary>
    public IReadOnlyDictionary<string, string> Pairs(string key)
    {
        if (Section(key) is not { } section)
            return new Dictionary<string, string>();
        return section.Keys.ToDictionary(pair => pair.Key, pair => section.TextOrInteger(pair.Key)!);
    }

    /// <summary>Refuses keys that say the same thing in several ways.</summary>
    public void NotBoth(params string[] keys)
    {
        if (keys.Where(Keys.ContainsKey).ToList() is [var first, var second, ..])
            throw Keys[second].Unlike($"only one of {first} and {second}", "both");
    }

    /// <summary>Refuses one of two keys without the other.</summary>
    public void Together(string first, string second)
    {
        if (Keys.ContainsKey(first) != Keys.ContainsKey(second))
            throw (Keys.GetValueOrDefault(first) ?? Keys[second]).Unlike($"both {first} and {second}", "only one of them");
    }

    /// <summary>Refuses every key that nobody has asked for.</summary>
    /// <exception cref="SettingsException">There is one; the nearest known key is named.</exception>
    public void RejectOthers()
    {
        foreach (var (key, node) in Keys.Where(pair => !_known.Contains(pair.Key)))
            throw node.Unlike($"one of {string.Join(", ", _known)}{Guess(key)}", $"the unknown key \"{key}\"");
    }

    private static double Number(TomlNode node, double low, double high)
    {
        double? value = node.Value switch { long whole => whole, double real => real, _ => null };
        return value >= low && value <= high
            ? value.Value
            : throw node.Unlike(FormattableString.Invariant($"a number from {low} to {high}"));
    }

    private static string TextOrInteger(TomlNode node) =>
        node.Value is long number ? number.ToString(CultureInfo.InvariantCulture) : Text(node);

    private static string Text(TomlNode node) =>
        node.Value is string { Length: > 0 } text ? text : throw node.Unlike("a text in quotes");

    private string Guess(string key) =>
        NearestName.Find(key, _known) is { } near ? $" (did you mean {near}?)" : "";

    private TomlNode? Find(string key)
    {
        _known.Add(key);
        return Keys.GetValueOrDefault(key);
    }
}
