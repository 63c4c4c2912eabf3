using CsCheck;

namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>What holds of the filled gap whatever the rim says and wherever it is empty.</summary>
public sealed class PolarGapFillingLaws
{
    private const int Side = 14;
    private const double Radius = 4.3;
    private static readonly Gen<double[]> Rims = Gen.Select(Gen.Double[0, 1].Array[Side * Side], Gen.Int[0, 9].Array[Side * Side], Gen.Int[0, 4])
        .Select((values, draws, holes) => values.Zip(draws, (value, draw) => draw < holes ? double.NaN : value).ToArray());

    /// <summary>The equations themselves, apart from how they are solved: every gap cell is the mean of its open sides.</summary>
    [Fact]
    public void Fill_AnyRim_SolvesTheStencil() => Rims.Sample(values =>
    {
        FillingDay day = Day(values);
        float[] before = day.Totals;
        if (day.FillGap(0.2) == 0)
        {
            return true;
        }

        for (int cell = 0; cell < before.Length; cell++)
        {
            if (day.Mask.Conditions[cell] != CellConditions.PolarGap)
            {
                continue;
            }

            double difference = 0.0;
            foreach (int near in new[] { cell - Side, cell - 1, cell + 1, cell + Side })
            {
                difference += float.IsNaN(day.Planes.Total[near]) ? 0.0 : day.Planes.Total[near] - day.Planes.Total[cell];
            }

            if (Math.Abs(difference) > 1e-6) // Single precision of eight numbers up to 1.
            {
                return false;
            }
        }

        return true;
    });

    /// <summary>The maximum principle; and observed cells keep every bit.</summary>
    [Fact]
    public void Fill_AnyRim_StaysWithinIt() => Rims.Sample(values =>
    {
        FillingDay day = Day(values);
        float[] before = day.Totals;
        bool filled = day.FillGap(0.2) > 0;
        PolarGapSystem system = new(day.Grid, day.Mask);
        float[] rim = [.. system.Rim.ToArray().Select(cell => before[cell]).Where(value => !float.IsNaN(value))];
        return Enumerable.Range(0, before.Length).All(cell =>
            day.Mask.Conditions[cell] != CellConditions.PolarGap || !filled
                ? before[cell].Equals(day.Planes.Total[cell])
                : day.Planes.Total[cell] >= rim.Min() && day.Planes.Total[cell] <= rim.Max()
                    && day.Planes.Multiyear[cell] >= 0f && day.Planes.FirstYear[cell] >= 0f);
    });

    /// <summary>A rim that is its own mirror image gives a field that is.</summary>
    [Fact]
    public void Fill_SymmetricRim_GivesASymmetricField() => Rims.Sample(values =>
    {
        FillingDay day = new(Side, Side, (row, column) => values[(row * Side) + Math.Min(column, Side - 1 - column)], Radius);
        return day.FillGap(0.2) == 0 || Enumerable.Range(0, Side * Side).All(cell =>
        {
            float here = day.Planes.Total[cell];
            float there = day.Planes.Total[cell + Side - 1 - (2 * (cell % Side))];
            return float.IsNaN(here) ? float.IsNaN(there) : Math.Abs(here - there) <= 1e-6f;
        });
    });

    /// <summary>Working memory that has seen another day gives the same bytes as fresh memory.</summary>
    [Fact]
    public void Fill_UsedMemory_GivesTheSameBytes() => Gen.Select(Rims, Rims).Sample((first, second) =>
    {
        FillingDay fresh = Day(second);
        fresh.FillGap(0.2);
        FillingDay used = Day(first);
        PolarGapFilling filling = new(new PolarGapSystem(used.Grid, used.Mask), 0.2);
        filling.Fill(used.Planes);
        used.Observe((row, column) => second[(row * Side) + column]);
        filling.Fill(used.Planes);
        return fresh.Totals.AsSpan().SequenceEqual(used.Totals) && fresh.Planes.StandardError.SequenceEqual(used.Planes.StandardError);
    });

    private static FillingDay Day(double[] values) => new(Side, Side, (row, column) => values[(row * Side) + column], Radius);
}
