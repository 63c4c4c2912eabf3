using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;
using IceExtent.Scenes.World;

namespace IceExtent.Scenes.Tests.World;

public sealed class WeatherTests
{
    private static readonly SceneParameters North = Shipped.Scene("north");

    private static CellPlanes On(DateOnly day, int births = 5)
    {
        Grid grid = TestWorld.North;
        CellPlanes cells = new(grid.CellCount);
        FieldScratch scratch = new(grid.Rows, grid.Columns);
        (float[], float[]) room = (new float[cells.Length], new float[cells.Length]);
        IceCover ice = new(North.Ice, new SeasonClock(North.Season, 1), grid, TestWorld.NoLand(grid), 2);
        double time = day.DayNumber + 0.5;
        ice.Fill(time, scratch, room, cells);
        WeatherParameters weather = North.Weather with { Storms = North.Weather.Storms with { BirthsPerDay = births } };
        new Weather(weather, North.Surfaces, grid, 3)
            .Fill(time, ice.Clock.Summerness(time), scratch, room, new StormPlanes(grid.CellCount), cells);
        return cells;
    }

    private static IEnumerable<CellPlanes> AYear() => Enumerable.Range(0, 24).Select(step => On(new DateOnly(2003, 1, 3).AddDays(15 * step)));

    [Fact]
    public void Fill_AnyDay_StaysWhereTheEmissionModelHolds()
    {
        foreach (CellPlanes cells in AYear())
        {
            for (int cell = 0; cell < TestWorld.North.CellCount; cell++)
            {
                Assert.InRange(cells.SeaKelvins[cell], (float)North.Weather.FreezingKelvins, (float)North.Weather.WarmestSeaKelvins);
                Assert.InRange(cells.IceKelvins[cell], 250f, 273.15f);
                Assert.InRange(cells.Wind[cell], 0f, 32f);
                Assert.InRange(cells.Vapor[cell], 0.2f, 40f);
                Assert.InRange(cells.Cloud[cell], 0f, 1.2f);
                Assert.InRange(cells.Wetness[cell], 0f, 1f);
                Assert.InRange(cells.PondShare[cell], 0f, (float)North.Surfaces.HighestPondShare);
            }
        }
    }

    // Water next to ice is at its freezing point, whatever the day.
    [Fact]
    public void Fill_InsideTheEdge_SeaIsFreezing()
    {
        foreach (CellPlanes cells in AYear())
        {
            for (int cell = 0; cell < TestWorld.North.CellCount; cell++)
            {
                if (cells.DepthDegrees[cell] > 0f)
                {
                    Assert.Equal((float)North.Weather.FreezingKelvins, cells.SeaKelvins[cell]);
                }
            }
        }
    }

    [Fact]
    public void Fill_WinterAndSummer_DryAndMeltingAtThePole()
    {
        int pole = TestWorld.North.CellAt(new GeoPosition(89.9, 0))!.Value;
        CellPlanes winter = On(new(2003, 2, 1)), summer = On(new(2003, 7, 25));

        Assert.Equal(0f, winter.Wetness[pole]);
        Assert.Equal(0f, winter.PondShare[pole]);
        Assert.True(winter.Vapor[pole] < 4f, $"{winter.Vapor[pole]} mm in winter.");
        Assert.True(summer.Vapor[pole] > winter.Vapor[pole]);
        Assert.True(summer.IceKelvins[pole] > winter.IceKelvins[pole] + 5f);
        Assert.True(summer.Wetness.Average() > 0.5f);
    }

    [Fact]
    public void Fill_Storms_BringWindVaporAndCloud()
    {
        CellPlanes calm = On(new(2003, 1, 20), births: 0), stormy = On(new(2003, 1, 20), births: 20);
        double Gain(Func<CellPlanes, float[]> plane) => plane(stormy).Zip(plane(calm), (with, without) => with - without).Max();

        Assert.True(Gain(cells => cells.Wind) > 3.0);
        Assert.True(Gain(cells => cells.Vapor) > 0.5);
        Assert.True(Gain(cells => cells.Cloud) > 0.1);
        Assert.True(Gain(cells => cells.LandKelvins) > 2.0);
    }

    // Usual polar means, common practice without a source: 5 to 11 m/s of wind and 3 to 25 mm of vapor over open water.
    [Fact]
    public void Fill_AYear_HasUsualMeansOverOpenWater()
    {
        List<float> wind = [], vapor = [];
        foreach (CellPlanes cells in AYear())
        {
            foreach (int cell in Enumerable.Range(0, TestWorld.North.CellCount).Where(cell => cells.DepthDegrees[cell] < -1f))
            {
                wind.Add(cells.Wind[cell]);
                vapor.Add(cells.Vapor[cell]);
            }
        }

        Assert.InRange(wind.Average(), 5f, 11f);
        Assert.InRange(vapor.Average(), 3f, 25f);
    }
}
