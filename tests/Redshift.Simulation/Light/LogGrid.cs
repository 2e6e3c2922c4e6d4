namespace Redshift.Simulation.Light;

/// <summary>Fine wavelength axis, equidistant in ln λ, on which light is drawn before an instrument sees it.</summary>
public sealed class LogGrid
{
    /// <summary>Speed of light, km/s.</summary>
    public const double C = 299792.458;

    private LogGrid(double lnStart, double step, double[] wavelength)
    {
        LnStart = lnStart;
        Step = step;
        Wavelength = wavelength;
    }

    /// <summary>ln of the first wavelength.</summary>
    public double LnStart { get; }

    /// <summary>Step in ln λ.</summary>
    public double Step { get; }

    /// <summary>Vacuum wavelengths in Å.</summary>
    public double[] Wavelength { get; }

    /// <summary>Number of points.</summary>
    public int Count => Wavelength.Length;

    /// <summary>Step in km/s.</summary>
    public double StepKmS => Step * C;

    /// <summary>Covers a range in Å with steps of the given velocity.</summary>
    public static LogGrid Cover(double from, double to, double stepKmS)
    {
        var step = stepKmS / C;
        var start = Math.Log(from);
        var wavelength = new double[(int)Math.Ceiling((Math.Log(to) - start) / step) + 1];
        for (var i = 0; i < wavelength.Length; i++)
            wavelength[i] = Math.Exp(start + (i * step));
        return new(start, step, wavelength);
    }

    /// <summary>The same points in the frame of an object at redshift z.</summary>
    public LogGrid RestFrame(double z)
    {
        var wavelength = new double[Count];
        for (var i = 0; i < Count; i++)
            wavelength[i] = Wavelength[i] / (1 + z);
        return new(LnStart - Math.Log(1 + z), Step, wavelength);
    }

    /// <summary>Fractional index of a wavelength; may lie outside.</summary>
    public double Position(double wavelength) => (Math.Log(wavelength) - LnStart) / Step;

    /// <summary>Whether a wavelength lies inside, or within a velocity of the edges.</summary>
    public bool Reaches(double wavelength, double marginKmS = 0)
    {
        var position = Position(wavelength);
        var margin = marginKmS / StepKmS;
        return position > -margin && position < Count - 1 + margin;
    }
}
