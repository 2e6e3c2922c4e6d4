namespace Redshift.Physics.Constants;

/// <summary>A measured or defined constant of nature, with everything needed to trace it.</summary>
/// <param name="Name">The quantity in words.</param>
/// <param name="Symbol">The usual symbol, in ASCII.</param>
/// <param name="Value">The recommended value, in <paramref name="Unit"/>.</param>
/// <param name="StandardUncertainty">One standard deviation, in <paramref name="Unit"/>; zero for an exact constant.</param>
/// <param name="IsExact">Whether the value is exact by the definition of the SI.</param>
/// <param name="Unit">The SI unit, "1" for a pure number.</param>
/// <param name="Edition">The adjustment the value belongs to.</param>
/// <param name="Source">The publication of that adjustment.</param>
public sealed record PhysicalConstant(
    string Name,
    string Symbol,
    double Value,
    double StandardUncertainty,
    bool IsExact,
    string Unit,
    string Edition,
    string Source);
