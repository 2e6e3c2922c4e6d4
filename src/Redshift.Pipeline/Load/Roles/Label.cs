using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Load.Roles;

/// <summary>What a file says of one of its arrays.</summary>
/// <param name="Name">Name of the column, image row or HDU.</param>
/// <param name="Unit">Its unit as written.</param>
/// <param name="Ucd">Its UCD of the Virtual Observatory.</param>
/// <param name="Utype">Its data-model role of the Virtual Observatory.</param>
/// <param name="Comment">The comment at its name.</param>
internal sealed partial record Label(string Name, string Unit = "", string Ucd = "", string Utype = "", string Comment = "")
{
    /// <summary>The words of the name, in lower case: <c>OPT_FLAM</c> and <c>optFlam</c> are <c>opt</c> and <c>flam</c>.</summary>
    public IReadOnlyList<string> Words { get; } =
        [.. WordPattern().Matches(Name).Select(static match => match.Value.ToLowerInvariant())];

    [GeneratedRegex(@"[A-Z]?[a-z]+|[A-Z]+(?![a-z])|\d+", RegexOptions.CultureInvariant)]
    private static partial Regex WordPattern();
}
