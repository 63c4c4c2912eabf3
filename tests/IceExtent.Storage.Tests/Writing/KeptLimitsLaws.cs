using CsCheck;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>Whoever compares the file's values with a limit counts the cells that the program counted.</summary>
public sealed class KeptLimitsLaws
{
    private static readonly double[] Limits = [0.15, 0.80];

    [Fact]
    public void Apply_ValuesNearALimit_StayOnTheirSide() =>
        Gen.Select(Gen.Double[-2e-4, 2e-4], Gen.Int[0, 1]).Array[1, 80].Sample(near =>
        {
            float[] values = Array.ConvertAll(near, pair => (float)(Limits[pair.Item2] + pair.Item1));
            short[] stored = new short[values.Length];
            PlanePacker.Pack(values, Packing.Fraction.Range, stored.AsSpan());
            KeptLimits.Apply(values, Limits, Packing.Fraction.Range, stored);
            return values.Select((value, cell) => Array.TrueForAll(
                Limits, limit => (value >= (float)limit) == (Math.Round(stored[cell] * Packing.Fraction.Scale, 4) >= limit))).All(kept => kept);
        });

    /// <summary>Origin: worked. 0.14996 rounds to 1,500 steps and is put back to 1,499; 0.15 stays; missing stays.</summary>
    [Fact]
    public void Apply_WorkedCells_MovesOnlyWhatCrossed()
    {
        float[] values = [0.14996f, 0.15f, 0.1499f, 0.79999f, 0.5f, float.NaN];
        short[] stored = new short[6];
        PlanePacker.Pack(values, Packing.Fraction.Range, stored.AsSpan());

        KeptLimits.Apply(values, Limits, Packing.Fraction.Range, stored);

        Assert.Equal([1_499, 1_500, 1_499, 7_999, 5_000, Packing.Fill], stored);
    }
}
