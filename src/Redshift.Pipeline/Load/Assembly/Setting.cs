namespace Redshift.Pipeline.Load.Assembly;

/// <summary>A value with the reason for it.</summary>
/// <param name="Value">The value.</param>
/// <param name="Assumed">Whether it is our default.</param>
/// <param name="Why">Who states it, or why it is the default.</param>
internal readonly record struct Setting<T>(T Value, bool Assumed, string Why);
