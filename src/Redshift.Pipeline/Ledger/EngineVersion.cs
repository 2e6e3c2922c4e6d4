namespace Redshift.Pipeline.Ledger;

/// <summary>The version of the answers, which is not that of the program.</summary>
public static class EngineVersion
{
    /// <summary>
    /// Raised by one with every change that can alter a cell of the catalogue, the lines or the rejects: ledgers then measure again what
    /// an older engine answered. Left alone by everything else (speed, messages, options), so that no night is measured twice for nothing.
    /// </summary>
    public const int Current = 11;
}
