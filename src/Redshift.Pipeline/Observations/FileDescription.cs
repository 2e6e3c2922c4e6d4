namespace Redshift.Pipeline.Observations;

/// <summary>What a file holds and how it is read.</summary>
/// <param name="Contents">Its images and columns, with what each looks like.</param>
/// <param name="Rule">The <c>[[load]]</c> rule (TOML) that gives the same reading; null where it cannot be read.</param>
public sealed record FileDescription(IReadOnlyList<ReadingNote> Contents, string? Rule);
