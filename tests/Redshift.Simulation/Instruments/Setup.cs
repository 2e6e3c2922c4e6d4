namespace Redshift.Simulation.Instruments;

/// <summary>One spectrograph with its reduction, as found on one night.</summary>
internal sealed record Setup
{
    public required string Name { get; init; }

    public required IReadOnlyList<Arm> Arms { get; init; }

    /// <summary>Median of the signal to noise a pixel over the targets, its scatter in ln, and its limits.</summary>
    public required (double Median, double ScatterLn, double Lowest, double Highest) Snr { get; init; }

    /// <summary>Whether the reduction states errors.</summary>
    public bool HasErrors { get; init; } = true;

    /// <summary>Whether the reduction states the resolution.</summary>
    public bool StatesResolution { get; init; } = true;

    /// <summary>Whether pixels are regular in air wavelength.</summary>
    public bool Air { get; init; }

    /// <summary>Whether the Earth's air is in the way.</summary>
    public bool OnGround { get; init; } = true;

    /// <summary>Sky light relative to the median object: 0 for bright stars, above 1 for faint targets.</summary>
    public double Sky { get; init; } = 0.3;

    /// <summary>Read noise variance relative to the photon variance of the median object.</summary>
    public double ReadNoise { get; init; } = 0.1;

    /// <summary>What sky subtraction leaves, in σ at the worst two-hundredth of the pixels.</summary>
    public double SkyRemains { get; init; } = 1;

    /// <summary>Chance that the reduction masks the brightest line of the night sky, 5577 Å.</summary>
    public double MasksGreenLine { get; init; } = 0.4;

    /// <summary>Lamp light.</summary>
    public double Town { get; init; }

    /// <summary>Whether telluric absorption has been divided out, with an imperfect model.</summary>
    public bool TelluricCorrected { get; init; }

    /// <summary>Water column relative to a dry mountain.</summary>
    public double Water { get; init; } = 1;

    /// <summary>Amplitude of slow flux-calibration waves.</summary>
    public double Waves { get; init; } = 0.02;

    /// <summary>Error of the wavelength zero point, km/s (1σ).</summary>
    public double ZeroPointKmS { get; init; } = 5;

    /// <summary>Stretching or bending of the wavelength solution across an arm, km/s (1σ).</summary>
    public double BendKmS { get; init; } = 3;

    /// <summary>Cosmic-ray hits left in the data per thousand pixels.</summary>
    public double Hits { get; init; } = 0.5;

    /// <summary>Share of the pixels without a valid measurement.</summary>
    public double Masked { get; init; } = 0.005;

    /// <summary>Chance of a gap of up to a few hundred pixels.</summary>
    public double GapChance { get; init; }

    /// <summary>Share of the pixels at each end that the detector did not reach and the reduction filled with a constant.</summary>
    public double DeadEnds { get; init; }

    /// <summary>Stated errors over true ones.</summary>
    public double ErrorScale { get; init; } = 1;

    /// <summary>Whether resampling has correlated neighbouring pixels.</summary>
    public bool Resampled { get; init; }

    /// <summary>Share of the light in the wings of the instrumental profile.</summary>
    public double Wings { get; init; }

    /// <summary>Whether the reduction gives a continuum-normalised spectrum.</summary>
    public bool Normalised { get; init; }

    /// <summary>Whether the shape of the instrument's response is still in the flux.</summary>
    public bool Uncalibrated { get; init; }

    /// <summary>Unit of the flux: multiplies a spectrum whose median is 1.</summary>
    public double FluxUnit { get; init; } = 1;
}
