using Redshift.Pipeline.Report;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class ColumnVocabularyTests
{
    [AstropyFact]
    public void Ucds_and_units_are_of_the_controlled_vocabularies()
    {
        // astropy carries the IVOA's list of UCD1+ words and the VOUnits grammar.
        const string script = """
            import sys, warnings
            from astropy.io.votable import ucd
            import astropy.units
            warnings.simplefilter('ignore')  # VOUnits would rather have 0.1nm than Angstrom; observers would not
            for line in sys.argv[1:]:
                word, unit = line.split('|')
                if not ucd.check_ucd(word, check_controlled_vocabulary=True): print('no UCD:', word)
                astropy.units.Unit(unit, format='vounit')
            """;
        var guides = ColumnGuide.Of("c", CatalogueColumns.All).Concat(ColumnGuide.Of("l", LineColumns.All))
            .Concat(ColumnGuide.Of("r", RejectColumns.All));

        Assert.Equal("", ExternalTool.RunPython(script, [.. guides.Select(guide => $"{guide.Ucd}|{guide.Unit}")]));
    }
}
