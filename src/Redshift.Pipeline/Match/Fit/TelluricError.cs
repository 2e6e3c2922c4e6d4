using Redshift.Physics.Lines;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// What the Earth's atmosphere leaves in a spectrum, as a share of the continuum, corrected or not: too much to be taken at its noise.
/// The shares are rough (common practice: bands are corrected to some per cent, and to ten where little light passes).
/// </summary>
internal static class TelluricError
{
    private const double Bin = 2e-4;

    private static readonly double Start = Math.Log(5500);
    private static readonly float[] Shares = Tabulate();

    /// <summary>Share at a vacuum wavelength.</summary>
    public static double Share(double lnWavelength)
    {
        var at = (int)((lnWavelength - Start) / Bin);
        return (uint)at < (uint)Shares.Length ? Shares[at] : 0;
    }

    private static float[] Tabulate()
    {
        var shares = new float[(int)((Math.Log(25000) - Start) / Bin)];
        foreach (var band in TelluricBands.All)
        {
            var share = Residual(band.Strength);
            int from = (int)((Math.Log(band.StartVacuumAngstrom) - Start) / Bin), to = (int)((Math.Log(band.EndVacuumAngstrom) - Start) / Bin) + 1;
            for (var i = Math.Max(0, from); i < Math.Min(shares.Length, to); i++) shares[i] = Math.Max(shares[i], share);
        }

        return shares;
    }

    private static float Residual(TelluricStrength strength) => strength switch
    {
        TelluricStrength.Opaque => 0.3f,
        TelluricStrength.Strong => 0.07f,
        _ => 0.01f,
    };
}
