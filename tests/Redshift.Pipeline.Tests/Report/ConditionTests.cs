using System.Globalization;
using CsCheck;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Conditions;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class ConditionTests
{
    // source, n, x, kind, EXP TIME
    private static readonly string[] Full = ["a.fits", "3", "-0.5", "galaxy", "it's 1\""];
    private static readonly string[] Bare = ["b.fits", "0", "", "", ""];

    private static readonly string[] Pieces =
        ["n", "x", "kind", "=", "<", "(", ")", "and", "or", "not", "is", "empty", "'a'", "'", "\"", "3", "-", "e", " ", "."];

    private static readonly Column<string[]>[] Columns =
    [
        Column("source", CellType.Text, 0), Column("n", CellType.Whole, 1), Column("x", CellType.Real, 2), Column("kind", CellType.Text, 3),
        Column("EXP TIME", CellType.Text, 4),
    ];

    [Theory]
    [InlineData("n = 3", true, false)]
    [InlineData("n = 3.0", true, false)]
    [InlineData("n != 3", false, true)]
    [InlineData("n < 3", false, true)]
    [InlineData("n <= 3", true, true)]
    [InlineData("n > 2.5e0", true, false)]
    [InlineData("n >= +3", true, false)]
    [InlineData("x > -1e-3", false, false)]
    [InlineData("x < n", true, false)]
    [InlineData("x = x", true, false)]
    [InlineData("x != 7", true, true)]
    [InlineData("not x = 7", true, true)]
    [InlineData("x < 7", true, false)]
    [InlineData("x is empty", false, true)]
    [InlineData("x is not empty", true, false)]
    [InlineData("kind = 'galaxy'", true, false)]
    [InlineData("kind = 'Galaxy'", false, false)]
    [InlineData("kind = ''", false, true)]
    [InlineData("kind contains 'lax'", true, false)]
    [InlineData("source > 'a.fits'", false, true)]
    [InlineData("source != kind", true, true)]
    [InlineData("\"EXP TIME\" = 'it''s 1\"'", true, false)]
    [InlineData("\"n\" = 3", true, false)]
    [InlineData("NOT n = 0 Or kind IS Not EMPTY", true, false)]
    [InlineData("n = 3 or n = 0 and kind = 'star'", true, false)]
    [InlineData("(n = 3 or n = 0) and kind = 'star'", false, false)]
    [InlineData("not n = 3 and n = 0", false, true)]
    [InlineData("not (n = 3 or n = 0)", false, false)]
    [InlineData("not not n=3", true, false)]
    public void Rows_are_picked_by_their_cells(string text, bool full, bool bare)
    {
        var test = Condition.Parse(text, Columns);

        Assert.Equal((full, bare), (test(Full), test(Bare)));
    }

    [Theory]
    [InlineData("", "at letter 1: found the end; expected a column")]
    [InlineData("m = 3", "at letter 1: found 'm'; expected a column, perhaps n")]
    [InlineData("velocity = 3", "at letter 1: found 'velocity'; expected a column of the table")]
    [InlineData("n 3", "at letter 3: found '3'; expected a comparison (= != < <= > >= contains is)")]
    [InlineData("n == 3", "at letter 4: found '='; expected a number or a column of numbers, since n holds numbers")]
    [InlineData("n = 'three'", "at letter 5: found the text 'three'; expected a number or a column of numbers, since n holds numbers")]
    [InlineData("n = kind", "at letter 5: found 'kind'; expected a number or a column of numbers, since n holds numbers")]
    [InlineData("n contains '3'", "at letter 3: found 'contains'; expected another comparison, since n holds numbers")]
    [InlineData("kind = 3", "at letter 8: found '3'; expected a text in single quotes or a column of texts, since kind holds texts")]
    [InlineData("kind = galaxy", "at letter 8: found 'galaxy'; expected a column of the table")]
    [InlineData("kind = 'galaxy", "at letter 8: found a quote that does not end; expected a text such as 'galaxy'")]
    [InlineData("n = 1.2.3", "at letter 5: found '1.2.3'; expected a number such as 0.5 or 1e-3")]
    [InlineData("n = 5a", "at letter 5: found '5a'; expected a number such as 0.5 or 1e-3")]
    [InlineData("n = 1e999", "at letter 5: found '1e999'; expected a number such as 0.5 or 1e-3")]
    [InlineData("n = 3 n = 4", "at letter 7: found 'n'; expected 'and', 'or' or the end")]
    [InlineData("(n = 3", "at letter 7: found the end; expected ')'")]
    [InlineData("n = 3 and", "at letter 10: found the end; expected a column")]
    [InlineData("x is 3", "at letter 6: found '3'; expected 'empty' or 'not empty'")]
    [InlineData("n = 3; n = 4", "at letter 6: found ';'; expected a column, a number, a text in single quotes or a comparison")]
    [InlineData("n = \u00e9", "at letter 5: found '\\u00e9'; expected a column, a number, a text in single quotes or a comparison")]
    public void A_mistake_is_named_with_its_place(string text, string message) =>
        Assert.Equal(message, Assert.Throws<ConditionException>(() => Condition.Parse(text, Columns)).Message);

    [Fact]
    public void A_condition_of_any_depth_does_not_exhaust_the_stack()
    {
        var text = string.Concat(Enumerable.Repeat("(", 100_000)) + "n = 3";

        Assert.Contains("expected a simpler condition", Assert.Throws<ConditionException>(() => Condition.Parse(text, Columns)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_list_of_names_may_be_long()
    {
        var text = string.Join(" or ", Enumerable.Range(0, 10_000).Select(i => $"source = '{(char)('a' + i % 26)}.fits' and n = {i}"));
        var test = Condition.Parse(text, Columns);

        Assert.False(test(Full));
        Assert.True(test(["d.fits", "3", "", "", ""]));
    }

    [Fact]
    public void Any_text_is_a_condition_or_a_mistake() =>
        Gen.Int[0, Pieces.Length - 1].Array[0, 12].Sample(numbers =>
        {
            var text = string.Join(' ', numbers.Select(number => Pieces[number]));
            try
            {
                Condition.Parse(text, Columns)(Full);
            }
            catch (ConditionException mistake)
            {
                Assert.InRange(mistake.Position, 1, text.Length + 1);
            }
        });

    [Fact]
    public void Comparisons_agree_with_those_of_numbers() =>
        Gen.Select(Gen.Double[-10, 10], Gen.Double[-10, 10]).Sample((a, b) =>
        {
            string[] row = ["", "0", a.ToString("R", CultureInfo.InvariantCulture), "", ""];
            bool Holds(string comparison) =>
                Condition.Parse($"x {comparison} {b.ToString("R", CultureInfo.InvariantCulture)}", Columns)(row);
            Assert.Equal((a < b, a <= b, a > b, a >= b), (Holds("<"), Holds("<="), Holds(">"), Holds(">=")));
        });

    private static Column<string[]> Column(string name, CellType type, int index) =>
        new(name, "", "", "", type, row => new Cell(row[index], type != CellType.Text));
}
