using System.Text.Json;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report.Explain;
using Redshift.Pipeline.Results;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class ExplanationTests
{
    [Fact]
    public void Explanation_of_a_galaxy_is_as_approved() => Check(Written(Examples.Explained()), "galaxy.txt");

    [Fact]
    public void Explanation_of_nothing_is_as_approved() => Check(Written(Examples.Nothing()), "nothing.txt");

    [Fact]
    public void Layout_is_as_approved()
    {
        using var output = new StringWriter { NewLine = "\n" };
        Explanation.WriteLayout(output, Examples.Read(), Examples.File());
        Check(output.ToString(), "layout.txt");
    }

    [Fact]
    public void Json_is_as_approved() => Check(ExplanationJson.Build(Examples.Explained(), ["AIRMASS"]) + "\n", "galaxy.json");

    [Fact]
    public void Json_holds_numbers_as_numbers()
    {
        using var json = JsonDocument.Parse(ExplanationJson.Build(Examples.Explained(), []));

        Assert.Equal(0.1, json.RootElement.GetProperty("answer").GetProperty("z").GetDouble());
        Assert.Equal("H alpha", json.RootElement.GetProperty("lines")[0].GetProperty("line").GetString());
        Assert.Equal(JsonValueKind.Null, json.RootElement.GetProperty("answer").GetProperty("mid_time_bjd_tdb").ValueKind);
    }

    [Fact]
    public void Shares_of_the_lines_and_the_rest_add_up()
    {
        var result = Examples.Explained();
        var shares = Written(result).Split('\n').SkipWhile(line => !line.StartsWith("Why", StringComparison.Ordinal)).Skip(1)
            .TakeWhile(line => line.Length > 0)
            .Select(line => double.Parse(line.Trim().Split(' ')[0], System.Globalization.CultureInfo.InvariantCulture)).ToList();

        Assert.Equal(result.Candidates[0].LnEvidence, shares[^1]);
        Assert.Equal(shares[^1], shares.SkipLast(1).Sum(), 0.05 * shares.Count);
    }

    [Fact]
    public void Hostile_text_never_reaches_the_terminal()
    {
        var observation = Examples.Observation() with { Target = "\u001b]0;gone\u0007", Cautions = ["\u001b[2J"] };
        var text = Written(Examples.Explained() with { Observation = observation });

        Assert.DoesNotContain(text, letter => char.IsControl(letter) && letter != '\n');
    }

    private static string Written(ObservationResult result)
    {
        using var output = new StringWriter { NewLine = "\n" };
        Explanation.Write(output, result);
        return output.ToString();
    }

    private static void Check(string text, string file) =>
        ApprovedText.Check(text, "tests", "Redshift.Pipeline.Tests", "Report", "Approved", file);
}
