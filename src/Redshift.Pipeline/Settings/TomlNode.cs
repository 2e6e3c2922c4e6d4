using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace Redshift.Pipeline.Settings;

/// <summary>A value of a TOML file together with where it stands.</summary>
/// <param name="File">Name of the file.</param>
/// <param name="Line">1-based line.</param>
/// <param name="Column">1-based column.</param>
/// <param name="Value">
/// A string, long, double or bool; a list of nodes; a dictionary of nodes by key; or null for what no setting uses (dates).
/// </param>
internal sealed record TomlNode(string File, int Line, int Column, object? Value)
{
    /// <summary>Parses a whole file into its root table.</summary>
    /// <exception cref="SettingsException">The text is not TOML.</exception>
    public static TomlNode Parse(string text, string file)
    {
        var document = SyntaxParser.Parse(text, file, validate: true);
        foreach (var problem in document.Diagnostics)
            throw NoToml(text, file, problem.Span.Start);

        var root = new TomlNode(file, 1, 1, NewTable());
        AddAll(root, document.KeyValues, file);
        foreach (var table in document.Tables)
            AddAll(Open(root, table, file), table.Items, file);
        return root;
    }

    /// <summary>The value as the author of the file would call it.</summary>
    public string Describe() => Value switch
    {
        string text => $"the text \"{text}\"",
        long number => $"the number {number}",
        double number => FormattableString.Invariant($"the number {number}"),
        bool flag => flag ? "true" : "false",
        List<TomlNode> => "a list",
        Dictionary<string, TomlNode> => "a table",
        _ => "a date",
    };

    /// <summary>The error that this node is not what was expected.</summary>
    public SettingsException Unlike(string expected, string? found = null) =>
        new(File, Line, Column, found ?? Describe(), expected);

    // The parser speaks of tokens; who wrote the line sees what is wrong in it.
    private static SettingsException NoToml(string text, string file, TextPosition place) => new(
        file, place.Line + 1, place.Column + 1, $"the line \"{text.Split('\n')[place.Line].Trim()}\"",
        "TOML: [section], key = number, key = \"text\", or # and a remark");

    private static Dictionary<string, TomlNode> NewTable() => new(StringComparer.Ordinal);

    private static void AddAll(TomlNode table, IEnumerable<KeyValueSyntax> items, string file)
    {
        foreach (var item in items)
        {
            var path = Path(item.Key!);
            var parent = path.SkipLast(1).Aggregate(table, (node, key) => Child(node, key, item, file));
            Keys(parent)[path[^1]] = Convert(item.Value!, file);
        }
    }

    // A header [a.b] opens table b of table a; [[a]] opens a new element of the list a.
    private static TomlNode Open(TomlNode root, TableSyntaxBase header, string file)
    {
        var path = Path(header.Name!);
        var parent = path.SkipLast(1).Aggregate(root, (node, key) => Child(node, key, header, file));
        if (header is not TableArraySyntax)
            return Child(parent, path[^1], header, file);
        if (!Keys(parent).TryGetValue(path[^1], out var list))
            Keys(parent)[path[^1]] = list = At(header, new List<TomlNode>(), file);
        var element = At(header, NewTable(), file);
        ((List<TomlNode>)list.Value!).Add(element);
        return element;
    }

    private static TomlNode Child(TomlNode parent, string key, SyntaxNodeBase where, string file)
    {
        if (!Keys(parent).TryGetValue(key, out var child))
            Keys(parent)[key] = child = At(where, NewTable(), file);
        return child.Value is List<TomlNode> list ? list[^1] : child;
    }

    private static Dictionary<string, TomlNode> Keys(TomlNode table) => (Dictionary<string, TomlNode>)table.Value!;

    private static TomlNode Convert(SyntaxNode value, string file) => value switch
    {
        StringValueSyntax text => At(value, text.Value, file),
        IntegerValueSyntax number => At(value, number.Value, file),
        FloatValueSyntax number => At(value, number.Value, file),
        BooleanValueSyntax flag => At(value, flag.Value, file),
        ArraySyntax array => At(value, array.Items.Select(item => Convert(item.Value!, file)).ToList(), file),
        InlineTableSyntax table => Inline(table, file),
        _ => At(value, null, file),
    };

    private static TomlNode Inline(InlineTableSyntax table, string file)
    {
        var node = At(table, NewTable(), file);
        AddAll(node, table.Items.Select(item => item.KeyValue!), file);
        return node;
    }

    private static TomlNode At(SyntaxNodeBase where, object? value, string file) =>
        new(file, where.Span.Start.Line + 1, where.Span.Start.Column + 1, value);

    private static List<string> Path(KeySyntax key) =>
        [Name(key.Key!), .. key.DotKeys.Select(dotted => Name(dotted.Key!))];

    private static string Name(BareKeyOrStringValueSyntax key) => key switch
    {
        StringValueSyntax quoted => quoted.Value ?? "",
        BareKeySyntax bare => bare.Key?.Text ?? "",
        _ => "",
    };
}
