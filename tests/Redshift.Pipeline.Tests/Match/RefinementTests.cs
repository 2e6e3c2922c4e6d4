using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Results;
using Xunit;
using static Redshift.Pipeline.Tests.Normalize.SyntheticSpectrum;

namespace Redshift.Pipeline.Tests.Match;

public class RefinementTests
{
    private const double LnShift = 0.25;
    private const double Sigma = 0.3;

    private static readonly FitModel Model = new()
    {
        Kind = ObjectKind.Galaxy,
        Name = "lines",
        Groups = [.. GalaxyLines.All.Where(g => g.Name is "Balmer" or "[O III]" or "[N II]")],
    };

    [Fact]
    public void Climbing_ends_at_the_planted_redshift_with_honest_errors()
    {
        double[] pulls = [.. Enumerable.Range(1, 80).Select(seed => Climb((ulong)seed, Cells.Step * (seed % 7 - 3) / 4)).Select(r => (r.LnShift - LnShift) / r.Sigma)];
        // The standard error of the mean is 0.11 and of the width 0.08; strong lines' model error makes the stated σ a little too wide.
        Assert.InRange(pulls.Average(), -0.34, 0.34);
        Assert.InRange(Math.Sqrt(pulls.Average(p => p * p)), 0.72, 1.24);
        Assert.All(pulls, p => Assert.InRange(p, -4, 4));
    }

    [Fact]
    public void The_start_does_not_matter()
    {
        var (left, right) = (Climb(1, -0.9 * Cells.Step), Climb(1, 0.9 * Cells.Step));
        Assert.Equal(left.LnShift, right.LnShift, 0.1 * left.Sigma);
        Assert.Equal(left.Sigma, right.Sigma, 0.1 * left.Sigma);
        Assert.Equal(left.LnEvidence, right.LnEvidence, 0.05);
    }

    [Theory]
    [InlineData(-1000)]
    [InlineData(1000)]
    public void Broad_lines_are_climbed_from_afar(double offsetKmS)
    {
        var broad = new EmissionGroup { Name = "broad", Lines = [new(6564.608, 1), new(4862.683, 0.4)], Mean = 0, Spread = 200, Absent = 0.1, Broad = true };
        var run = Spectra.Run(LnWavelengths(6000, 8700), x => 1 + Line(x, 6564.608 * Math.Exp(LnShift), 4710) + 0.54 * Line(x, 4862.683 * Math.Exp(LnShift), 4710), 0.1, 3);
        var fit = new ModelFit(FitPixels.Build([run], ModelError.Uniform, Cells.Step));
        var top = Refinement.Climb(fit, Model with { Groups = [broad], BroadKmS = 2000 }, LnShift + offsetKmS / 299792.458, 0.5 * Cells.Step);
        Assert.Equal(LnShift, top.LnShift, 4 * top.Sigma);
        Assert.InRange(top.Sigma * 299792.458, 5, 60);
    }

    [Fact]
    public void The_top_is_no_lower_than_its_surroundings()
    {
        var fit = Fit(2);
        var top = Refinement.Climb(fit, Model, LnShift, 0.5 * Cells.Step);
        Assert.All(Enumerable.Range(-8, 17), i => Assert.InRange(fit.LnEvidence(Model, top.LnShift + 0.5 * i * top.Sigma), double.NegativeInfinity, top.LnEvidence + 0.02));
        // One σ from the top of a parabola the ln evidence is half a unit lower.
        Assert.Equal(top.LnEvidence - 0.5, 0.5 * (fit.LnEvidence(Model, top.LnShift + top.Sigma) + fit.LnEvidence(Model, top.LnShift - top.Sigma)), 0.15);
    }

    [Fact]
    public void Softening_widens_the_error_as_it_lowers_the_evidence()
    {
        var soft = new Refined(Model, LnShift, 1e-4, 40).Soften(4);
        Assert.Equal((2e-4, 10), (soft.Sigma, soft.LnEvidence));
        Assert.Equal(10 + Math.Log(2e-4 * Math.Sqrt(2 * Math.PI)), soft.LnVolume, 1e-12);
    }

    private static Refined Climb(ulong seed, double offset) => Refinement.Climb(Fit(seed), Model, LnShift + offset, 0.5 * Cells.Step);

    private static ModelFit Fit(ulong seed)
    {
        var run = Spectra.Run(LnWavelengths(6000, 8700), Flux, Sigma, seed);
        return new(FitPixels.Build([run], ModelError.Uniform, Cells.Step));
    }

    /// <summary>Lines of 90 km/s behind an instrument of 70 km/s.</summary>
    private static double Flux(double ln)
    {
        const double FwhmKmS = 2.3548 * 114;
        double At(double restA) => Line(ln, restA * Math.Exp(LnShift), FwhmKmS);
        return 1 + 1.5 * At(6564.608) + 0.75 * At(4862.683) + 1.2 * At(5008.24) + 0.4 * At(4960.295) + 0.5 * At(6585.27) + 0.16 * At(6549.86);
    }
}
