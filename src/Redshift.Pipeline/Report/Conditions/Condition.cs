namespace Redshift.Pipeline.Report.Conditions;

/// <summary>
/// A small language that picks rows of a table by their cells, such as
/// <c>verdict = 'firm' and (z &gt; 2 or cautions contains 'one-line-only')</c>.
/// </summary>
/// <remarks>
/// <para>
/// <c>or</c> binds weaker than <c>and</c>, <c>and</c> weaker than <c>not</c>. A comparison has a column at its left, then
/// <c>=</c>, <c>!=</c>, <c>&lt;</c>, <c>&lt;=</c>, <c>&gt;</c>, <c>&gt;=</c> or, for texts, <c>contains</c>, then a number, a text in
/// single quotes or another column; or it is <c>COLUMN is empty</c> or <c>COLUMN is not empty</c>. Columns whose names are no plain words
/// stand in double quotes.
/// </para>
/// <para>
/// Texts are compared letter by letter. An unknown number equals nothing and is neither smaller nor larger than anything, so that
/// <c>!=</c> holds for it, as <c>not</c> and <c>=</c> do.
/// </para>
/// </remarks>
public static class Condition
{
    /// <summary>Makes the test of a row.</summary>
    /// <param name="text">The condition.</param>
    /// <param name="columns">The columns that it can name.</param>
    /// <exception cref="ConditionException">It cannot be understood.</exception>
    public static Func<TRow, bool> Parse<TRow>(string text, IReadOnlyList<Column<TRow>> columns) =>
        new ConditionParser<TRow>(columns, Tokenizer.Split(text)).Parse();
}
