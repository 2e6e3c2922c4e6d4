using MathNet.Numerics.Integration;
using Redshift.Physics.Constants;

namespace Redshift.Physics.Tests.Recombination;

/// <summary>
/// Line emission of recombining hydrogen from first principles, in the limit of low density, Lyman lines trapped
/// (case B): capture into every (n, l) by Burgess 1965 and a cascade by exact transition rates
/// (M. Brocklehurst, Mon. Not. R. Astron. Soc. 153, 471 (1971)).
/// </summary>
internal sealed class CaseBCascade
{
    // Energy of ionization over k, in kelvin.
    private static readonly double IonizationTemperature = Codata2022.Rydberg.Value * Codata2022.Planck.Value
        * Codata2022.SpeedOfLight.Value / Codata2022.Boltzmann.Value;

    private static readonly double CaptureUnit = 2 * Math.Sqrt(Math.PI) / 3 * 1e6 * Codata2022.SpeedOfLight.Value
        * Math.Pow(Codata2022.FineStructure.Value, 4) * Math.Pow(Codata2022.BohrRadius.Value, 2);

    private static readonly GaussLegendreRule Nodes = new(0, 1, 64);

    private readonly double _temperature;
    private readonly int _shells;
    private readonly double[][] _gain;

    public CaseBCascade(double temperature, int shells)
    {
        (_temperature, _shells) = (temperature, shells);
        _gain = new double[shells + 1][];
        for (int n = 1; n <= shells; n++)
            _gain[n] = Capture(n);
        for (int n = shells; n > 2; n--)
            Decay(n);
    }

    /// <summary>Emission of the line in erg cm^3/s, times 4 pi, per electron and proton.</summary>
    public Dictionary<(int Upper, int Lower), double> Emission { get; } = [];

    /// <summary>Emission with the shells above the last one added, whose contribution falls as 1/n^2.</summary>
    public static Func<int, int, double> Extrapolated(double temperature, int shells)
    {
        var half = new CaseBCascade(temperature, shells / 2);
        var full = new CaseBCascade(temperature, shells);
        return (upper, lower) =>
        {
            double last = full.Emission[(upper, lower)];
            return last + (last - half.Emission[(upper, lower)]) / 3;
        };
    }

    /// <summary>Captures into (n, l) in cm^3/s, by l.</summary>
    public double[] Capture(int n)
    {
        double y = IonizationTemperature / _temperature;
        double range = Math.Log(1 + n * n * 40 / y);
        var rate = new double[n];
        for (int i = 0; i < Nodes.Order; i++)
            AddCapture(rate, n, range * Nodes.GetAbscissa(i), range * Nodes.GetWeight(i), y);
        return rate;
    }

    // The variable t = ln(1 + n^2 K^2) spreads the steep fall of the integrand evenly.
    private static void AddCapture(double[] rate, int n, double t, double weight, double y)
    {
        double kSquared = (Math.Exp(t) - 1) / (n * n);
        ShellIntegrals integrals = ShellIntegrals.Free(kSquared, n);
        double factor = CaptureUnit * 2 * Math.Pow(y, 1.5) / Math.Pow(n, 4) * weight * Math.Exp(4 * t - kSquared * y);
        for (int l = 0; l < n; l++)
        {
            double strength = (l + 1) * Math.Pow(integrals.FromHigherL[l + 1], 2) + l * Math.Pow(integrals.FromLowerL[l], 2);
            rate[l] += factor * strength;
        }
    }

    // What comes into shell n leaves it for lower shells; not for n = 1, whose photons are caught again.
    private void Decay(int n)
    {
        ShellIntegrals[] integrals = [.. Enumerable.Range(0, n).Select(m => m < 2 ? null! : ShellIntegrals.Bound(n, m))];
        for (int l = 0; l < n; l++)
        {
            double total = Enumerable.Range(2, n - 2).Sum(m => Rate(integrals[m], n, m, l, l - 1) + Rate(integrals[m], n, m, l, l + 1));
            double population = _gain[n][l] / total;
            for (int m = 2; m < n; m++)
            {
                Feed(n, m, l - 1, population * Rate(integrals[m], n, m, l, l - 1));
                Feed(n, m, l + 1, population * Rate(integrals[m], n, m, l, l + 1));
            }
        }
    }

    private void Feed(int n, int m, int l, double rate)
    {
        if (rate == 0)
            return;
        _gain[m][l] += rate;
        double photon = 1e7 * Codata2022.Boltzmann.Value * IonizationTemperature * Energy(n, m);
        Emission[(n, m)] = Emission.GetValueOrDefault((n, m)) + rate * photon;
    }

    // A(n l -> m k) in 1/s: (4/3) alpha^3 omega^3 l_> R^2 / (2l + 1) in atomic units.
    private static double Rate(ShellIntegrals integrals, int n, int m, int l, int k)
    {
        if (k < 0 || k >= m)
            return 0;
        double integral = k < l ? integrals.FromHigherL[l] : integrals.FromLowerL[k];
        double perSecond = 4 * Math.PI * Codata2022.Rydberg.Value * Codata2022.SpeedOfLight.Value;
        double omega = Codata2022.FineStructure.Value * Energy(n, m) / 2;
        return 4.0 / 3 * perSecond * omega * omega * omega * Math.Max(l, k) * integral * integral / (2 * l + 1);
    }

    // In units of the ionization energy.
    private static double Energy(int n, int m) => 1.0 / (m * m) - 1.0 / (n * n);
}
