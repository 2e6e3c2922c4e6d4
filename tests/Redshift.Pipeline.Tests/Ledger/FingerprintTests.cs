using System.Reflection;
using Redshift.Physics.Units;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class FingerprintTests
{
    [Fact]
    public void The_same_settings_have_the_same_fingerprint() =>
        Assert.Equal(Fingerprint.Of(PipelineFile.Parse("[read]\nmedium = \"air\"", "a")), Fingerprint.Of(new() { Load = new() { Medium = WavelengthMedium.Air } }));

    [Fact]
    public void Every_setting_changes_it()
    {
        var prints = new List<string> { Fingerprint.Of(new()) };
        foreach (var load in Variants(() => new LoadSettings()))
            prints.Add(Fingerprint.Of(new() { Load = load }));
        foreach (var rule in Variants(() => new LoadRule()))
            prints.Add(Fingerprint.Of(new() { Load = new() { Rules = [rule] } }));
        foreach (var match in Variants(() => new MatchSettings()))
            prints.Add(Fingerprint.Of(new() { Match = match }));
        foreach (var maps in Variants(() => new ConfidenceMaps()))
            prints.Add(Fingerprint.Of(new() { Match = new() { Confidence = maps } }));
        foreach (var map in Variants(() => new ConfidenceMaps().Quasar with { }))
            prints.Add(Fingerprint.Of(new() { Match = new() { Confidence = new() { Quasar = map } } }));
        foreach (var arm in Variants(() => new ArmRule { Name = "red" }))
            prints.Add(Fingerprint.Of(new() { Load = new() { Rules = [new() { Arms = [arm] }] } }));

        Assert.Equal(
            1 + Count<LoadSettings>() + Count<LoadRule>() + Count<ArmRule>() + Count<MatchSettings>() + Count<ConfidenceMaps>() + Count<ConfidenceMap>(),
            prints.Count);
        Assert.Distinct(prints);
    }

    [Fact]
    public void It_tells_the_version_of_the_engine() =>
        Assert.StartsWith(FormattableString.Invariant($"{EngineVersion.Current}-"), Fingerprint.Of(new()), StringComparison.Ordinal);

    private static int Count<T>() => Properties<T>().Length;

    private static PropertyInfo[] Properties<T>() => typeof(T).GetProperties(BindingFlags.Public | BindingFlags.Instance);

    // One copy for each property, with another value there.
    private static IEnumerable<T> Variants<T>(Func<T> create)
    {
        foreach (var property in Properties<T>())
        {
            var variant = create();
            property.SetValue(variant, Other(property.PropertyType));
            yield return variant;
        }
    }

    private static object Other(Type type) => type switch
    {
        _ when type == typeof(string) => "text",
        _ when type == typeof(double) || type == typeof(double?) => 3.25,
        _ when Nullable.GetUnderlyingType(type) is { IsEnum: true } choice => Enum.GetValues(choice).GetValue(1)!,
        _ when type == typeof(bool) => true,
        _ when type == typeof(ConfidenceMap) => new ConfidenceMap(-3, 0.1, 1, 0),
        _ when type == typeof(ConfidenceMaps) => new ConfidenceMaps { Galaxy = new(-4, 0.1, 1, 0) },
        _ when type == typeof(int) || type == typeof(int?) => 7,
        _ when type == typeof(IReadOnlyList<string>) => new[] { "AIRMASS" },
        _ when type == typeof(IReadOnlyList<LoadRule>) => new[] { new LoadRule { Flux = "FLUX" } },
        _ when type == typeof(IReadOnlyList<ArmRule>) => new[] { new ArmRule { Name = "blue", Flux = "FLUX" } },
        _ when type == typeof(IReadOnlyDictionary<string, string>) => new Dictionary<string, string> { ["INSTRUME"] = "X" },
        _ => throw new NotSupportedException($"a setting of type {type}: add another value for it here"),
    };
}
