namespace Redshift.Physics.Stars;

/// <summary>A line of an atom or ion, with a strength that holds for every star.</summary>
/// <param name="Element">Element that absorbs.</param>
/// <param name="Stage">Ionization stage, 0 for neutral atoms.</param>
/// <param name="Wavelength">Vacuum wavelength in Å.</param>
/// <param name="Excitation">Energy of the lower level in eV.</param>
/// <param name="Weight">Statistical weight of the lower level times oscillator strength, g f.</param>
internal sealed record SpectralLine(Element Element, int Stage, double Wavelength, double Excitation, double Weight)
{
    /// <summary>Line-to-continuum opacity ratio at the centre, per unit g f, in a layer.</summary>
    public static double CentralRatioPerWeight(Layer layer, Element element, int stage, double wavelength, double excitation)
    {
        var gas = layer.Gas;
        var absorbers = gas.AbundanceOf(element) * gas.Fraction(element, stage) / element.Partition[stage]
            * Math.Exp(-excitation / (Constants.BoltzmannEv * gas.Temperature));
        var emission = 1 - Math.Exp(-Constants.SecondRadiation / (wavelength * gas.Temperature));
        var perDoppler = Constants.ClassicalCrossSection * Constants.LightSpeedCm * wavelength * 1e-8 / (Math.Sqrt(Math.PI) * layer.DopplerCm(element));
        return absorbers * emission * perDoppler / layer.ContinuousOpacityAt(wavelength);
    }

    /// <summary>Line-to-continuum opacity ratio at the centre in a layer.</summary>
    public double CentralRatio(Layer layer) => Weight * CentralRatioPerWeight(layer, Element, Stage, Wavelength, Excitation);
}
