using System.Globalization;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Report.Conditions;

/// <summary>Reads a condition by recursive descent.</summary>
internal sealed class ConditionParser<TRow>(IReadOnlyList<Column<TRow>> columns, IReadOnlyList<Token> tokens)
{
    // A person nests two or three deep; the limit keeps a made-up condition from exhausting the stack.
    private const int Deepest = 100;

    private static readonly string[] Comparisons = ["=", "!=", "<", "<=", ">", ">=", "contains"];

    private int _at;
    private int _depth;

    private Token Next => tokens[_at];

    /// <summary>The test of a row.</summary>
    public Func<TRow, bool> Parse()
    {
        var test = Any();
        return Next.Kind == TokenKind.End ? test : throw Unexpected("'and', 'or' or the end");
    }

    private Func<TRow, bool> Any()
    {
        var parts = Chain(All, "or");
        return parts.Length == 1 ? parts[0] : row => Array.Exists(parts, part => part(row));
    }

    private Func<TRow, bool> All()
    {
        var parts = Chain(One, "and");
        return parts.Length == 1 ? parts[0] : row => Array.TrueForAll(parts, part => part(row));
    }

    private Func<TRow, bool>[] Chain(Func<Func<TRow, bool>> part, string word)
    {
        var parts = new List<Func<TRow, bool>> { part() };
        while (Take(word))
            parts.Add(part());
        return [.. parts];
    }

    private Func<TRow, bool> One()
    {
        if (Take("not"))
        {
            var test = Deeper(One);
            return row => !test(row);
        }

        if (!Take("("))
            return Comparison();
        var inner = Deeper(Any);
        Require(")", "')'");
        return inner;
    }

    private Func<TRow, bool> Comparison()
    {
        var column = TakeColumn();
        if (Take("is"))
            return Emptiness(column);
        if (!Comparisons.Any(Next.Is))
            throw Unexpected($"a comparison ({string.Join(' ', Comparisons)} is)");
        var comparison = tokens[_at++];
        return column.Type == CellType.Text ? TextComparison(column, comparison) : NumberComparison(column, comparison);
    }

    private Func<TRow, bool> Emptiness(Column<TRow> column)
    {
        var wanted = !Take("not");
        Require("empty", wanted ? "'empty' or 'not empty'" : "'empty'");
        return row => column.Value(row).Text.Length == 0 == wanted;
    }

    private Func<TRow, bool> TextComparison(Column<TRow> column, Token comparison)
    {
        var right = TextOperand(column);
        if (comparison.Is("contains"))
            return row => column.Value(row).Text.Contains(right(row), StringComparison.Ordinal);
        return row => Holds(comparison.Text, string.CompareOrdinal(column.Value(row).Text, right(row)));
    }

    private Func<TRow, bool> NumberComparison(Column<TRow> column, Token comparison)
    {
        if (comparison.Is("contains"))
            throw new ConditionException(comparison.Position, "'contains'", $"another comparison, since {column.Name} holds numbers");
        var right = NumberOperand(column);
        return row => Number(column.Value(row)) is { } a && right(row) is { } b
            ? Holds(comparison.Text, a.CompareTo(b))
            : comparison.Is("!=");
    }

    private Func<TRow, string> TextOperand(Column<TRow> left)
    {
        var expected = $"a text in single quotes or a column of texts, since {left.Name} holds texts";
        if (Next.Kind == TokenKind.Text)
        {
            var text = tokens[_at++].Text;
            return _ => text;
        }

        var column = OperandColumn(expected, type => type == CellType.Text);
        return row => column.Value(row).Text;
    }

    private Func<TRow, double?> NumberOperand(Column<TRow> left)
    {
        var expected = $"a number or a column of numbers, since {left.Name} holds numbers";
        if (Next.Kind == TokenKind.Number)
        {
            var number = double.Parse(tokens[_at++].Text, CultureInfo.InvariantCulture);
            return _ => number;
        }

        var column = OperandColumn(expected, type => type != CellType.Text);
        return row => Number(column.Value(row));
    }

    private Column<TRow> OperandColumn(string expected, Func<CellType, bool> fits)
    {
        if (Next.Kind is not (TokenKind.Word or TokenKind.QuotedColumn))
            throw Unexpected(expected);
        var token = Next;
        var column = TakeColumn();
        return fits(column.Type) ? column : throw new ConditionException(token.Position, token.ToString(), expected);
    }

    private Column<TRow> TakeColumn()
    {
        if (Next.Kind is not (TokenKind.Word or TokenKind.QuotedColumn))
            throw Unexpected("a column");
        var name = Next.Text;
        if (columns.FirstOrDefault(column => column.Name == name) is not { } found)
            throw Unexpected(NearestName.Find(name, columns.Select(column => column.Name)) is { } near ? $"a column, perhaps {near}" : "a column of the table");
        _at++;
        return found;
    }

    private bool Take(string word)
    {
        if (!Next.Is(word))
            return false;
        _at++;
        return true;
    }

    private void Require(string word, string expected)
    {
        if (!Take(word))
            throw Unexpected(expected);
    }

    private Func<TRow, bool> Deeper(Func<Func<TRow, bool>> part)
    {
        if (++_depth > Deepest)
            throw new ConditionException(Next.Position, $"more than {Deepest} parts inside each other", "a simpler condition");
        var test = part();
        _depth--;
        return test;
    }

    private ConditionException Unexpected(string expected) => new(Next.Position, Next.ToString(), expected);

    private static double? Number(Cell cell) => cell.Text.Length == 0 ? null : double.Parse(cell.Text, CultureInfo.InvariantCulture);

    private static bool Holds(string comparison, int order) => comparison switch
    {
        "=" => order == 0,
        "!=" => order != 0,
        "<" => order < 0,
        "<=" => order <= 0,
        ">" => order > 0,
        _ => order >= 0,
    };
}
