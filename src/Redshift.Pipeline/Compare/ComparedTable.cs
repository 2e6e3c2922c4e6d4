using System.Globalization;
using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Compare;

/// <summary>A catalogue of ours, or a table of known redshifts from anywhere.</summary>
public sealed class ComparedTable : IDisposable
{
    private const int LongestText = 200;

    private readonly TableFile _file;
    private readonly int _source;
    private readonly int _row;
    private readonly int _target;
    private readonly int _ra;
    private readonly int _dec;
    private readonly int _z;
    private readonly int _velocity;
    private readonly int _resolution;
    private readonly int _kind;
    private readonly int _verdict;

    private ComparedTable(TableFile file)
    {
        _file = file;
        _source = Find("source");
        _row = Find("row");
        _target = Find("target", "name", "object");
        _ra = Find("ra_deg", "ra", "raj2000");
        _dec = Find("dec_deg", "dec", "decj2000", "dej2000");
        _z = Find("z", "redshift");
        _velocity = Find("velocity_km_s");
        _resolution = Find("resolution");
        _kind = Find("kind");
        _verdict = Find("verdict");
    }

    /// <summary>The file.</summary>
    public string Path => _file.Path;

    /// <summary>The ways in which its rows can be told apart.</summary>
    public IEnumerable<Pairing> Pairings
    {
        get
        {
            if (_source >= 0)
                yield return Pairing.Source;
            if (_target >= 0)
                yield return Pairing.Target;
            if (_ra >= 0 && _dec >= 0)
                yield return Pairing.Position;
        }
    }

    /// <summary>Opens a table, or the catalogue of an output folder.</summary>
    /// <param name="path">A CSV file, a FITS file, or the output folder of a run.</param>
    /// <exception cref="TableFileException">It is no table, or has no redshifts.</exception>
    public static ComparedTable Open(string path)
    {
        var table = new ComparedTable(TableFile.Open(Directory.Exists(path) ? System.IO.Path.Combine(path, "catalogue.csv") : path));
        if (table._z >= 0 || table._velocity >= 0)
            return table;
        table.Dispose();
        throw new TableFileException(table.Path, "", Shortened($"the columns {string.Join(", ", table._file.Names)}"), "a column z or redshift, or velocity_km_s");
    }

    /// <summary>The rows, once.</summary>
    /// <exception cref="TableFileException">A value is not what its column should hold.</exception>
    public IEnumerable<ComparedRow> Rows() => _file.Rows().Select(row => Read(row.Place, row.Cells));

    /// <inheritdoc/>
    public void Dispose() => _file.Dispose();

    private ComparedRow Read(string place, IReadOnlyList<string> cells)
    {
        string Text(int column) => column < 0 ? "" : HarmlessText.ForTable(cells[column]);
        double? Number(int column) => column < 0 ? null : ReadNumber(place, _file.Names[column], cells[column]);
        double? Angle(int column, Func<string, AngleUnit, double?> read) => column < 0 ? null : ReadAngle(place, _file.Names[column], cells[column], read);
        return new()
        {
            Source = Text(_source),
            Row = _row < 0 ? 0 : ReadWhole(place, _file.Names[_row], cells[_row]),
            Target = Text(_target),
            RaDeg = Angle(_ra, SkyAngle.RightAscension),
            DecDeg = Angle(_dec, SkyAngle.Declination),
            Z = Redshift(place, _z >= 0 ? Number(_z) : Number(_velocity) / Velocity.SpeedOfLightKmS),
            Resolution = Number(_resolution) is > 0 and var resolution ? resolution : null,
            Kind = Text(_kind),
            Verdict = Text(_verdict),
        };
    }

    private double? ReadNumber(string place, string column, string text)
    {
        if (text.Length == 0)
            return null;
        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value)
            ? value
            : throw Wrong(place, column, text, "a number, or nothing");
    }

    private int ReadWhole(string place, string column, string text)
    {
        if (text.Length == 0)
            return 0;
        return int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var value)
            ? value
            : throw Wrong(place, column, text, "a whole number from 0, or nothing");
    }

    private double? ReadAngle(string place, string column, string text, Func<string, AngleUnit, double?> read)
    {
        if (text.Length == 0)
            return null;
        return read(text, AngleUnit.Degree) ?? throw Wrong(place, column, text, "an angle in degrees, or sexagesimal such as 12:29:06.7 or +02:03:08");
    }

    private double? Redshift(string place, double? z) => z is <= -1
        ? throw Wrong(place, "z", z.Value.ToString("R", CultureInfo.InvariantCulture), "a redshift greater than -1")
        : z;

    private TableFileException Wrong(string place, string column, string found, string expected) =>
        new(Path, $"{place}, column {column}", $"'{found}'", expected);

    private static string Shortened(string text) => text.Length <= LongestText ? text : text[..LongestText] + "...";

    private int Find(params ReadOnlySpan<string> names)
    {
        foreach (var name in names)
        {
            for (var i = 0; i < _file.Names.Count; i++)
            {
                if (string.Equals(_file.Names[i], name, StringComparison.OrdinalIgnoreCase))
                    return i;
            }
        }

        return -1;
    }
}
