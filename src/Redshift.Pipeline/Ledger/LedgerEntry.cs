using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Ledger;

/// <summary>One step of a run, to be written down.</summary>
/// <param name="Source">The file.</param>
/// <param name="Bytes">How much of the input is settled with it, for the progress.</param>
public abstract record LedgerEntry(string Source, double Bytes);

/// <summary>A file is read from now on, or, without stamp and hash, is left alone.</summary>
/// <param name="Source">The file.</param>
/// <param name="Stamp">Its size and time.</param>
/// <param name="Hash">Hash of its content.</param>
/// <param name="Fingerprint">What its answers depend on beside it.</param>
/// <param name="Keeps">Whether the outcomes of earlier runs stay, because nothing changed.</param>
public sealed record FileBegun(string Source, FileStamp Stamp, string Hash, string Fingerprint, bool Keeps) : LedgerEntry(Source, 0);

/// <summary>A spectrum has its answer, or a file or spectrum was refused.</summary>
/// <param name="Source">The file.</param>
/// <param name="Outcome">What is stored.</param>
/// <param name="Milliseconds">What the measurement took.</param>
/// <param name="Bytes">Its share in the file.</param>
/// <param name="Reject">Why it was refused, or null.</param>
public sealed record SpectrumDone(string Source, StoredOutcome Outcome, double Milliseconds, double Bytes, Reject? Reject = null) : LedgerEntry(Source, Bytes);

/// <summary>All spectra of a file are done.</summary>
/// <param name="Source">The file.</param>
/// <param name="Bytes">What no spectrum accounts for.</param>
/// <param name="Spoilt">Why nothing of it can be used after all, or null.</param>
public sealed record FileEnded(string Source, double Bytes, Reject? Spoilt) : LedgerEntry(Source, Bytes);
