namespace IceExtent.Scenes.Fields;

/// <summary>Random numbers that depend on nothing but what they are for.</summary>
/// <remarks>
/// There is no state: a number is a hash of a key and a place, so days may be drawn in any order and on any thread.
/// The mixing steps are those of SplitMix64 [Steele2014].
/// </remarks>
internal static class Draws
{
    private const ulong Step = 0x9E37_79B9_7F4A_7C15;

    /// <summary>A key for one purpose, made from a seed or from another key.</summary>
    public static ulong Key(ulong parent, long purpose) => Mix(parent + (((ulong)purpose + 1) * Step));

    /// <summary>64 well-mixed bits.</summary>
    public static ulong Mix(ulong bits)
    {
        bits = (bits ^ (bits >> 30)) * 0xBF58_476D_1CE4_E5B9;
        bits = (bits ^ (bits >> 27)) * 0x94D0_49BB_1331_11EB;
        return bits ^ (bits >> 31);
    }

    /// <summary>A number from 0 (included) to 1 (excluded), evenly spread.</summary>
    public static double Unit(ulong key) => (Mix(key + Step) >> 11) * (1.0 / (1UL << 53));

    /// <summary>A number from the normal distribution with mean 0 and variance 1.</summary>
    public static float Normal(ulong key) => NormalTable.Pick((ushort)Mix(key + Step));
}
