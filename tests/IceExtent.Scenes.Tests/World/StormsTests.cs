using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;
using IceExtent.Scenes.World;

namespace IceExtent.Scenes.Tests.World;

public sealed class StormsTests
{
    // One storm at a time in the second half of a day: yesterday's have died by noon.
    private static readonly StormParameters One = Shipped.Scene("north").Weather.Storms with
    {
        BirthsPerDay = 1,
        LongestLifeDays = 0.5,
        OuterLatitudeDegrees = 70,
        InnerLatitudeDegrees = 70,
        WindMetersPerSecond = 10,
        RadiusKilometers = 400,
        TravelKilometersPerDay = 1_000,
    };

    private static StormPlanes At(StormParameters parameters, Grid grid, double time)
    {
        StormPlanes planes = new(grid.CellCount);
        new Storms(parameters, grid, 5).Fill(time, 1.0, new(grid.Rows, grid.Columns), planes);
        return planes;
    }

    [Fact]
    public void Fill_ManyMoments_StaysWithinTheStrengthGiven()
    {
        double strongest = 0;
        for (int step = 0; step < 400; step++)
        {
            StormPlanes planes = At(One, TestWorld.North, 730_000 + step + 0.5 + (0.00124 * step));
            Assert.All(planes.Wind, wind => Assert.InRange(wind, 0f, 10f));
            Assert.All(planes.Cloud, cloud => Assert.InRange(cloud, 0f, 1.6f * (float)One.CloudMillimeters));
            Assert.All(planes.VaporLog, vapor => Assert.InRange(vapor, 0f, (float)One.VaporLogGain));
            strongest = Math.Max(strongest, planes.Wind.Max());
        }

        Assert.InRange(strongest, 6.0, 10.0);
    }

    [Fact]
    public void Fill_NoBirths_IsCalm() =>
        Assert.All(At(One with { BirthsPerDay = 0 }, TestWorld.North, 730_000).Wind, wind => Assert.Equal(0f, wind));

    // East is anticlockwise on a northern map and clockwise on a southern one.
    [Theory]
    [InlineData(Hemisphere.North, 1)]
    [InlineData(Hemisphere.South, -1)]
    public void Fill_LaterMoment_HasMovedEast(Hemisphere hemisphere, int turn)
    {
        Grid grid = TestWorld.GridOf(hemisphere, cells: 70, cellMeters: 100_000);
        int seen = 0;
        for (int day = 0; day < 60; day++)
        {
            for (double time = 730_000.5 + day; time < 730_000.95 + day; time += 0.1)
            {
                if (Middle(At(One, grid, time), grid) is { } first && Middle(At(One, grid, time + 0.05), grid) is { } second
                    && Math.Abs(first.XMeters - second.XMeters) + Math.Abs(first.YMeters - second.YMeters) < 300_000)
                {
                    double cross = (first.XMeters * second.YMeters) - (first.YMeters * second.XMeters);
                    Assert.True(Math.Sign(cross) == turn, $"Moved the wrong way at {time}.");
                    seen++;
                }
            }
        }

        Assert.True(seen > 20, $"Only {seen} moves were seen.");
    }

    // The middle of the wind, which lies round the storm's own, or null where there is hardly any.
    private static MapPosition? Middle(StormPlanes planes, Grid grid)
    {
        double sum = 0, x = 0, y = 0;
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            MapPosition at = grid.CenterOf(cell);
            sum += planes.Wind[cell];
            x += planes.Wind[cell] * at.XMeters;
            y += planes.Wind[cell] * at.YMeters;
        }

        return planes.Wind.Max() > 1.0 ? new(x / sum, y / sum) : null;
    }
}
