using System.Globalization;
using System.IO.Hashing;
using System.Text.Json;
using System.Text.Json.Serialization;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Ledger;

/// <summary>What an answer depends on beside the file: the engine and the parameters of its stages.</summary>
public static class Fingerprint
{
    /// <summary>The same text for the same engine version and the same settings, wherever these were stated.</summary>
    public static string Of(PipelineSettings settings)
    {
        var canonical = JsonSerializer.SerializeToUtf8Bytes(settings, LedgerJson.Default.PipelineSettings);
        return string.Create(CultureInfo.InvariantCulture, $"{EngineVersion.Current}-{XxHash128.HashToUInt128(canonical):x32}");
    }
}

/// <summary>What the ledger writes as JSON.</summary>
[JsonSerializable(typeof(PipelineSettings))]
[JsonSerializable(typeof(string[]))]
internal sealed partial class LedgerJson : JsonSerializerContext;
