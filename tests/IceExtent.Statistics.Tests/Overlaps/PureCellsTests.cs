using CsCheck;
using IceExtent.Grids;
using IceExtent.Statistics.Overlaps;

namespace IceExtent.Statistics.Tests.Overlaps;

/// <summary>Which cells two sensors are compared over.</summary>
public sealed class PureCellsTests
{
    private const int Side = 9;
    private static readonly Grid Grid = SmallGrid.EqualArea(Side, Side);
    private static readonly PureCellRules OneCell = new(25_000.0, 25_000.0, 0.05, 0.95, 0.15);

    /// <summary>
    /// Origin: worked. Columns 0 to 3 are ice, 4 is half, 5 to 8 water. A cell is judged by the others of its 3 x 3: closed ice are
    /// columns 0 to 2, open water 6 to 8. At the rim 5 of 8 others are known, in the corners 3 of 8, less than half.
    /// </summary>
    [Fact]
    public void Find_StraightEdge_LeavesTheCellsNearIt()
    {
        float[] fraction = Plane((_, column) => column < 4 ? 1f : column == 4 ? 0.5f : 0f);

        ComparedSurface[] found = Find(OneCell, NoLand(), fraction, fraction);

        Assert.Equal([ComparedSurface.None, ComparedSurface.ClosedIce, ComparedSurface.ClosedIce], [found[0], found[1], found[Side]]);
        Assert.Equal(
            [ComparedSurface.ClosedIce, ComparedSurface.ClosedIce, ComparedSurface.ClosedIce, ComparedSurface.None, ComparedSurface.None, ComparedSurface.None, ComparedSurface.OpenWater, ComparedSurface.OpenWater, ComparedSurface.OpenWater],
            found[(4 * Side)..(5 * Side)]);
    }

    /// <summary>Origin: worked. Any land in the 3 x 3 round a cell takes it out: the nine cells round the middle one.</summary>
    [Fact]
    public void Find_LandInTheMiddle_TakesOutWhatIsNear()
    {
        float[] land = Plane((row, column) => row == 4 && column == 4 ? 0.004f : 0f);
        float[] water = new float[Grid.CellCount];

        ComparedSurface[] found = Find(OneCell, new LandShare(land), water, water);

        Assert.All(Enumerable.Range(0, 81).Where(cell => cell / Side is >= 3 and <= 5 && cell % Side is >= 3 and <= 5), cell => Assert.Equal(ComparedSurface.None, found[cell]));
        Assert.Equal(ComparedSurface.OpenWater, found[(2 * Side) + 4]);
    }

    /// <summary>Origin: worked. One cell at the ice limit in the 5 x 5 ends open water, though the mean of the 24 others is below 1 %.</summary>
    [Fact]
    public void Find_OneIceCellNear_IsNoOpenWater()
    {
        float[] water = new float[Grid.CellCount];
        float[] withIce = Plane((row, column) => row == 4 && column == 6 ? 0.15f : 0f);

        ComparedSurface[] found = Find(OneCell with { EdgeDistanceMeters = 50_000.0 }, NoLand(), water, withIce);

        Assert.Equal(ComparedSurface.None, found[(4 * Side) + 4]);
        Assert.Equal(ComparedSurface.OpenWater, found[(4 * Side) + 3]);
    }

    [Fact]
    public void Find_CellThatOneSensorMissed_IsNone()
    {
        float[] water = new float[Grid.CellCount];
        float[] missed = Plane((row, column) => row == 4 && column == 4 ? float.NaN : 0f);

        ComparedSurface[] found = Find(OneCell, NoLand(), missed, water);

        Assert.Equal(ComparedSurface.None, found[(4 * Side) + 4]);
        Assert.Equal(ComparedSurface.OpenWater, found[(4 * Side) + 5]);
    }

    /// <summary>What a cell itself holds decides nothing about it, so its noise cannot pick it; and the sensors' order does not matter.</summary>
    [Fact]
    public void Find_OwnValue_DoesNotDecide() =>
        Gen.Select(Gen.Float[0f, 1f].Array[81], Gen.Float[0f, 1f].Array[81], Gen.Int[0, 80], Gen.Float[0f, 1f]).Sample((first, second, cell, other) =>
        {
            float[] one = Array.ConvertAll(first, value => value < 0.5f ? 0f : 1f - (value / 100f));
            float[] two = Array.ConvertAll(second, value => value < 0.5f ? 0f : 1f - (value / 100f));
            ComparedSurface before = Find(OneCell, NoLand(), one, two)[cell];
            ComparedSurface swapped = Find(OneCell, NoLand(), two, one)[cell];
            one[cell] = other;
            return before == Find(OneCell, NoLand(), one, two)[cell] && before == swapped;
        });

    [Fact]
    public void PureCells_LandOfAnotherGrid_IsRefused() =>
        Assert.Throws<ArgumentException>(() => new PureCells(Grid, new LandShare(new float[4]), OneCell));

    private static ComparedSurface[] Find(PureCellRules rules, LandShare land, float[] first, float[] second)
    {
        ComparedSurface[] found = new ComparedSurface[Grid.CellCount];
        new PureCells(Grid, land, rules).Find(first, second, found);
        return found;
    }

    private static LandShare NoLand() => new(new float[Grid.CellCount]);

    private static float[] Plane(Func<int, int, float> value) =>
        [.. Enumerable.Range(0, Grid.CellCount).Select(cell => value(cell / Side, cell % Side))];
}
