using System.Text;

namespace Redshift.Fits.Tests;

/// <summary>Damages files at random, mostly where damage tells: in the values of header cards.</summary>
internal static class Mutation
{
    private static readonly string[] Values =
    [
        "0", "-1", "1", "2", "7", "8", "16", "-32", "64", "999", "1000", "2147483647", "2147483648", "4294967296", "9223372036854775807",
        "9223372036854775808", "-9223372036854775808", "1E308", "1D999", "1.5", "T", "F", "''", "'P'", "'1PE(9)'", "'1QD'", "'999999999D'",
        "'2147483647X'", "'0A'", "'3A1'", "'M'", "'E15.7'", "'I99'", "'GZIP_1'", "'GZIP_2'", "'RICE_1'", "'PLIO_1'", "'HCOMPRESS_1'", "'(1,2)'",
        "'SUBTRACTIVE_DITHER_2'", "'&'", "'open", "(1,2)", "(,)", "()", "/", "=",
    ];

    public static byte[] Apply(byte[] sound, Random random)
    {
        var bytes = (byte[])sound.Clone();
        for (var count = 1 + random.Next(4); count > 0; count--) bytes = ApplyOne(bytes, random);
        return bytes;
    }

    private static byte[] ApplyOne(byte[] bytes, Random random)
    {
        if (bytes.Length < 160) return bytes;
        switch (random.Next(10))
        {
            case 0:
                bytes[random.Next(bytes.Length)] = (byte)random.Next(256);
                return bytes;
            case 1:
                bytes[random.Next(bytes.Length)] ^= (byte)(1 << random.Next(8));
                return bytes;
            case 2:
                return bytes[..random.Next(bytes.Length)];
            case 3:
                return [.. bytes, .. bytes[random.Next(bytes.Length)..]];
            case 4:
                SwapRecords(bytes, random);
                return bytes;
            case 5:
                bytes[Record(bytes, random) + random.Next(80)] = (byte)(' ' + random.Next(95));
                return bytes;
            default:
                SetValue(bytes, Record(bytes, random), Values[random.Next(Values.Length)]);
                return bytes;
        }
    }

    private static int Record(byte[] bytes, Random random) => random.Next(bytes.Length / 80) * 80;

    private static void SwapRecords(byte[] bytes, Random random)
    {
        var (a, b) = (Record(bytes, random), Record(bytes, random));
        for (var i = 0; i < 80; i++) (bytes[a + i], bytes[b + i]) = (bytes[b + i], bytes[a + i]);
    }

    private static void SetValue(byte[] bytes, int record, string value) =>
        Encoding.ASCII.GetBytes(value.PadRight(70)).CopyTo(bytes, record + 10);
}
