namespace Redshift.Physics.Stars;

/// <summary>Partial pressures of free atoms and molecules in a cool gas.</summary>
internal sealed class MolecularEquilibrium
{
    private static readonly Element CarbonAtom = Element.Find("C");
    private static readonly Element Oxygen = Element.Find("O");
    private readonly Gas _gas;
    private readonly Dictionary<Element, double> _free = [];
    private readonly double[] _constants;
    private readonly double _waterConstant;

    public MolecularEquilibrium(Gas gas)
    {
        _gas = gas;
        _constants = [.. Molecule.All.Select(m => m.DissociationConstant(gas.Temperature))];

        // H2O against H2 and O: 5.09 eV, entropy from memory of the JANAF tables.
        _waterConstant = Math.Pow(10, 12.6 - (25650 / gas.Temperature));
        foreach (var element in Molecule.All.SelectMany(m => (Element[])[m.First, m.Second]).Distinct())
            _free[element] = element == Element.Hydrogen ? gas.AtomicHydrogenPressure : Total(element) * gas.Fraction(element, 0);
        for (var round = 0; round < 40; round++)
            Iterate();
    }

    /// <summary>Molecules per hydrogen nucleus.</summary>
    public double Abundance(Molecule molecule) =>
        _free[molecule.First] * _free[molecule.Second] / _constants[Array.IndexOf(Molecule.All, molecule)] / _gas.NucleiPressure;

    /// <summary>Water molecules per hydrogen nucleus.</summary>
    public double Water => _gas.MoleculePressure * _free[Oxygen] / _waterConstant / _gas.NucleiPressure;

    private double Total(Element element) => _gas.AbundanceOf(element) * _gas.NucleiPressure;

    // CO binds nearly all carbon or oxygen, so that pair is solved together; the rest relaxes one element at a time.
    private void Iterate()
    {
        foreach (var element in _free.Keys.Where(e => e != Element.Hydrogen && e != CarbonAtom && e != Oxygen).ToArray())
            _free[element] = Math.Sqrt(_free[element] * Total(element) / Demand(element, null));
        var (c, o) = (Demand(CarbonAtom, Molecule.CarbonMonoxide), Demand(Oxygen, Molecule.CarbonMonoxide));
        var k = c * o * _constants[0];
        var (totalC, totalO) = (Total(CarbonAtom), Total(Oxygen));
        var linear = totalC - totalO - k;
        var carbon = (linear + Math.Sqrt((linear * linear) + (4 * k * totalC))) / 2;
        carbon = linear < 0 ? 2 * k * totalC / (Math.Sqrt((linear * linear) + (4 * k * totalC)) - linear) : carbon;
        _free[CarbonAtom] = Math.Sqrt(_free[CarbonAtom] * carbon / c);
        _free[Oxygen] = Math.Sqrt(_free[Oxygen] * totalO / (o + (_free[CarbonAtom] / _constants[0])));
    }

    // All nuclei of an element over its free neutral atoms.
    private double Demand(Element element, Molecule? except)
    {
        var sum = 1 / Math.Max(_gas.Fraction(element, 0), 1e-30);
        for (var i = 0; i < Molecule.All.Length; i++)
        {
            var m = Molecule.All[i];
            if (m == except)
                continue;
            if (m.First == element)
                sum += _free[m.Second] / _constants[i];
            if (m.Second == element)
                sum += _free[m.First] / _constants[i];
        }

        return element == Oxygen ? sum + (_gas.MoleculePressure / _waterConstant) : sum;
    }
}
