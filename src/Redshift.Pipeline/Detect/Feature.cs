namespace Redshift.Pipeline.Detect;

/// <summary>Where a feature may come from, as far as its place and width tell.</summary>
internal enum FeatureOrigin
{
    /// <summary>Nothing speaks against the object.</summary>
    Object,

    /// <summary>At a line of the night sky.</summary>
    Sky,

    /// <summary>In a band of the Earth's atmosphere.</summary>
    Telluric,

    /// <summary>Narrower than the spectrograph can make a line.</summary>
    CosmicRay,
}

/// <summary>A bump or dip that noise does not explain.</summary>
/// <param name="LnWavelength">ln of the vacuum wavelength in Å, frame of the file.</param>
/// <param name="SigmaLn">σ in ln λ of the filter that sees it best.</param>
/// <param name="SignalToNoise">Amplitude over its error; negative in absorption.</param>
/// <param name="Origin">Where it may come from.</param>
/// <param name="OriginName">Name of the sky line or atmospheric band, else empty.</param>
internal readonly record struct Feature(double LnWavelength, double SigmaLn, double SignalToNoise, FeatureOrigin Origin, string OriginName);
