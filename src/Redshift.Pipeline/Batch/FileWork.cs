namespace Redshift.Pipeline.Batch;

/// <summary>A file to be read.</summary>
/// <param name="File">The file.</param>
/// <param name="Known">What an earlier run with the same fingerprint did of it, or null.</param>
public sealed record FileWork(InputFile File, EarlierWork? Known);

/// <summary>What an earlier run did of a file; good as long as its content is the same.</summary>
/// <param name="Hash">Hash of the content then.</param>
/// <param name="Complete">Whether all was done.</param>
/// <param name="Done">Which spectra were done where not all were; -1 stands for the whole file.</param>
public sealed record EarlierWork(string Hash, bool Complete, IReadOnlySet<int> Done);
