using CsCheck;
using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Screens;

/// <summary>Masks made of days.</summary>
public sealed class IceMaskMonthTests
{
    private static readonly IceMaskRules Rules = new(0.15, 3, 0.01, 0.0);

    /// <summary>
    /// Origin: worked. Ten days. Cell 0: ice of 0.15 on three. Cell 1: on two, too few. Cell 2: 0.149 on all. Cell 3: never observed.
    /// Cell 4: observed on three days, ice on all.
    /// </summary>
    [Fact]
    public void Build_TenDays_KnowsIceNoIceAndNothing()
    {
        IceMaskMonth month = new(Row(5), Rules);
        for (int day = 0; day < 10; day++)
        {
            month.Add([day < 3 ? 0.15f : 0f, day < 2 ? 1f : 0f, 0.149f, float.NaN, day < 3 ? 0.9f : float.NaN]);
        }

        Assert.Equal([IceMaskMonth.Ice, IceMaskMonth.NoIce, IceMaskMonth.NoIce, IceMaskMonth.Unknown, IceMaskMonth.Ice], month.Build());
        Assert.Equal(10, month.Days);
    }

    /// <summary>Origin: worked. Of 500 days one in a hundred is 5: cell 0 had ice on 4, cell 1 on 5.</summary>
    [Fact]
    public void Build_ManyDays_AsksForTheShare()
    {
        IceMaskMonth month = new(Row(2), Rules);
        for (int day = 0; day < 500; day++)
        {
            month.Add([day < 4 ? 0.5f : 0f, day < 5 ? 0.5f : 0f]);
        }

        Assert.Equal([IceMaskMonth.NoIce, IceMaskMonth.Ice], month.Build());
    }

    /// <summary>Origin: worked. Ice in cell 3 of a row of 25 km cells; a margin of 60 km takes in two cells to each side, and land stays unknown.</summary>
    [Fact]
    public void Build_Margin_GrowsIceButNotIntoTheUnknown()
    {
        IceMaskMonth month = new(Row(8), Rules with { LeastDays = 1, MarginMeters = 60_000.0 });
        month.Add([0f, 0f, 0f, 1f, float.NaN, 0f, 0f, 0f]);

        Assert.Equal([0, 1, 1, 1, 255, 1, 0, 0], month.Build().Select(value => (int)value));
    }

    /// <summary>The grown mask is every observed cell whose centre is within the margin of a cell with ice, by trying all pairs.</summary>
    [Fact]
    public void Build_AnyIce_GrowsByTheDistance() =>
        Gen.Select(Gen.Int[1, 9], Gen.Int[1, 9], Gen.Double[0, 90_000], Gen.Double[0, 1].Array[81], Gen.Double[0.05, 0.9]).Sample((rows, columns, margin, draws, share) =>
        {
            Grid grid = new("any", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(columns, rows, 25_000.0, 0.0, 0.0));
            float[] fraction = [.. draws.Take(rows * columns).Select(draw => draw < 0.05 ? float.NaN : draw < share ? 1f : 0f)];
            IceMaskMonth month = new(grid, Rules with { LeastDays = 1, MarginMeters = margin });
            month.Add(fraction);
            byte[] mask = month.Build();
            return Enumerable.Range(0, fraction.Length).All(cell => mask[cell] == (float.IsNaN(fraction[cell])
                ? IceMaskMonth.Unknown
                : Enumerable.Range(0, fraction.Length).Any(other => fraction[other] == 1f && Distance(grid, cell, other) <= margin) ? IceMaskMonth.Ice : IceMaskMonth.NoIce));
        });

    [Fact]
    public void Add_OtherSize_IsRefused() => Assert.Throws<ArgumentException>(() => new IceMaskMonth(Row(2), Rules).Add([0f]));

    // Distance in cells first: both sides of the comparison must round alike.
    private static double Distance(Grid grid, int one, int other)
    {
        int down = (one / grid.Columns) - (other / grid.Columns);
        int right = (one % grid.Columns) - (other % grid.Columns);
        return 25_000.0 * Math.Sqrt((down * down) + (right * right));
    }

    private static Grid Row(int cells) =>
        new("row", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(cells, 1, 25_000.0, 0.0, 0.0));
}
