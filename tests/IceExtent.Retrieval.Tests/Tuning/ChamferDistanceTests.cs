using CsCheck;
using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Distances over a grid. Source of the steps: [Borgefors1986], from memory.</summary>
public sealed class ChamferDistanceTests
{
    /// <summary>Origin: worked. Steps of 3 to a side and 4 to a corner: a knight's move is 3 + 4 = 7.</summary>
    [Fact]
    public void Measure_OneCell_CountsStepsBySidesAndCorners()
    {
        Grid grid = SmallGrid.Of(5, 6);
        bool[] members = new bool[30];
        members[(2 * 6) + 2] = true;

        int[] steps = Measured(grid, members);

        Assert.Equal([8, 7, 6, 7, 8, 11], steps[..6]);
        Assert.Equal([6, 3, 0, 3, 6, 9], steps[12..18]);
        Assert.Equal(4, steps[(3 * 6) + 3]);
    }

    [Fact]
    public void Measure_EmptySet_IsVeryFarEverywhere() =>
        Assert.All(Measured(SmallGrid.Of(4, 4), new bool[16]), steps => Assert.True(steps > 1_000_000));

    [Fact]
    public void Measure_PlaneOfAnotherLength_IsRefused() =>
        Assert.Throws<ArgumentException>(() => new ChamferDistance(SmallGrid.Of(4, 4)).Measure(new bool[15], new int[16]));

    /// <summary>Within 8 % of the straight line to the nearest member, found by trying all of them.</summary>
    [Fact]
    public void Measure_AnySet_IsWithinEightPercentOfTheStraightLine() =>
        Gen.Bool.Array[15 * 17].Where(set => set.Contains(true)).Sample(set =>
        {
            int[] steps = Measured(SmallGrid.Of(15, 17), set);
            return Enumerable.Range(0, set.Length).All(cell =>
            {
                double straight = Enumerable.Range(0, set.Length).Where(member => set[member])
                    .Min(member => Math.Sqrt(Math.Pow((cell / 17) - (member / 17), 2) + Math.Pow((cell % 17) - (member % 17), 2)));
                return Math.Abs((steps[cell] / (double)ChamferDistance.StepsPerCell) - straight) <= 0.08 * straight;
            });
        });

    private static int[] Measured(Grid grid, bool[] members)
    {
        int[] steps = new int[members.Length];
        new ChamferDistance(grid).Measure(members, steps);
        return steps;
    }
}
