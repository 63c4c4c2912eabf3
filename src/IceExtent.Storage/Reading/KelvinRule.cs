namespace IceExtent.Storage.Reading;

/// <summary>An encoding made ready for many cells: numbers of one or two bytes get a table.</summary>
internal sealed class KelvinRule
{
    /// <summary>Makes an encoding ready; costs 65,536 steps for numbers of two bytes.</summary>
    public KelvinRule(KelvinEncoding encoding)
    {
        Encoding = encoding;
        Table = StoredNumbers.BytesOf(encoding.Number) switch
        {
            1 => Fill(encoding, byte.MaxValue + 1, pattern => (sbyte)pattern),
            2 => Fill(encoding, ushort.MaxValue + 1, pattern => (short)pattern),
            _ => [],
        };
    }

    /// <summary>What the numbers mean.</summary>
    public KelvinEncoding Encoding { get; }

    /// <summary>The kelvins of every bit pattern, or empty for longer numbers.</summary>
    public float[] Table { get; }

    private static float[] Fill(KelvinEncoding encoding, int patterns, Func<int, int> signed)
    {
        bool hasSign = encoding.Number is StoredNumber.SignedOneByte or StoredNumber.SignedTwoBytes;
        float[] table = new float[patterns];
        for (int pattern = 0; pattern < patterns; pattern++)
        {
            table[pattern] = encoding.ToKelvins(hasSign ? signed(pattern) : pattern);
        }

        return table;
    }
}
