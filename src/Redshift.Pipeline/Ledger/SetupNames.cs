namespace Redshift.Pipeline.Ledger;

/// <summary>The names in the table <c>setup</c>.</summary>
internal static class SetupNames
{
    /// <summary>Kept header cards, as a JSON list.</summary>
    public const string Keep = "keep";
}
