using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.Tests.Kit;

namespace IceExtent.Scenes.Tests;

public sealed class SceneObservationTests
{
    private static readonly SceneParameters North = Shipped.Scene("north");
    private static readonly DateOnly Day = new(2001, 4, 20);

    private static byte[] Bytes(BrightnessPlanes planes) =>
        [.. planes.Channels.SelectMany(channel => System.Runtime.InteropServices.MemoryMarshal.AsBytes(planes.Kelvins(channel)).ToArray())];

    [Fact]
    public void Observe_AnyOrderOfDays_GivesTheSameBytes()
    {
        Scene scene = TestWorld.Make(Shipped.Scene("demo"));
        SceneWorkspace workspace = scene.CreateWorkspace();
        BrightnessPlanes planes = new(scene.Grid.CellCount, scene.Channels);
        DateOnly[] days = [.. Enumerable.Range(0, 25).Select(index => Day.AddDays(17 * index))];
        byte[] Made(DateOnly day)
        {
            scene.Observe(day, workspace, planes);
            return Bytes(planes);
        }

        byte[][] forward = [.. days.Select(Made)];
        byte[][] backward = [.. days.Reverse().Select(Made).Reverse()];
        byte[][] fresh = [.. days.Select(day => Bytes(TestWorld.Make(Shipped.Scene("demo")).Observed(day)))];

        Assert.Equal(forward, backward);
        Assert.Equal(forward, fresh);
    }

    [Fact]
    public void Observe_EightThreads_GiveTheSameBytes()
    {
        Scene scene = TestWorld.Make(Shipped.Scene("demo"));
        DateOnly[] days = [.. Enumerable.Range(0, 64).Select(index => Day.AddDays(5 * index))];

        byte[][] alone = [.. days.Select(day => Bytes(scene.Observed(day)))];
        byte[][] together = new byte[days.Length][];
        Parallel.For(0, days.Length, new() { MaxDegreeOfParallelism = 8 }, index => together[index] = Bytes(scene.Observed(days[index])));

        Assert.Equal(alone, together);
    }

    [Fact]
    public void Observe_OtherSeed_IsAnotherDay() =>
        Assert.NotEqual(Bytes(TestWorld.Make(North, 1).Observed(Day)), Bytes(TestWorld.Make(North, 2).Observed(Day)));

    // Law: what is there does not depend on who looks.
    [Fact]
    public void Truth_OtherSensor_IsTheSame()
    {
        Sensor other = TestWorld.Sensor with
        {
            Name = "other",
            FirstDay = new(1999, 1, 1),
            North = TestWorld.Sensor.North with { TiePoints = TestWorld.TiePoints with { OpenWater = new(180, 105, 201) } },
        };

        Assert.Equal(
            TestWorld.Make(North).TruthOf(Day).Concentration, TestWorld.Make(North, sensor: other).TruthOf(Day).Concentration);
    }

    // Law: the noise is normal with the given deviation. 2,304 cells on 20 days: the standard error of a deviation is
    // 1 / sqrt(2 · 46,080) = 0.33 %; five of them are allowed.
    [Fact]
    public void Observe_Noise_HasTheGivenDeviation()
    {
        SceneParameters clean = North.Clean();
        SceneParameters noisy = clean with { Instrument = clean.Instrument with { NoiseKelvins = North.Instrument.NoiseKelvins } };
        Scene quiet = TestWorld.Make(clean), loud = TestWorld.Make(noisy);
        foreach (Channel channel in quiet.Channels)
        {
            double[] noise = [.. Enumerable.Range(0, 20).SelectMany(index => Difference(loud, quiet, Day.AddDays(index), channel))];
            double deviation = Math.Sqrt(noise.Average(value => value * value));

            Assert.Equal(North.Instrument.NoiseKelvins[channel], deviation, 0.0165 * North.Instrument.NoiseKelvins[channel]);
            Assert.Equal(0.0, noise.Average(), 5 * deviation / Math.Sqrt(noise.Length));
        }
    }

    // Origin: worked. An offset of 0.5 K and a drift of 2 K a decade from 1990-01-01 on: on 2000-01-01, 3,652 days
    // later, 0.5 + 2 × 3652 / 3652.5 = 2.4997 K in the one channel and nothing in the others.
    [Fact]
    public void Observe_OffsetAndDrift_AddUp()
    {
        SceneParameters clean = North.Clean();
        SceneParameters drifting = clean with
        {
            Instrument = clean.Instrument with
            {
                OffsetKelvins = new Dictionary<Channel, double> { [Channel.V19] = 0.5 },
                DriftKelvinsPerDecade = new Dictionary<Channel, double> { [Channel.V19] = 2.0 },
            },
        };
        Scene right = TestWorld.Make(clean), wrong = TestWorld.Make(drifting);

        Assert.All(Difference(wrong, right, new(2000, 1, 1), Channel.V19), kelvins => Assert.Equal(2.4997, kelvins, 1e-3));
        Assert.All(Difference(wrong, right, new(2000, 1, 1), Channel.V37), kelvins => Assert.Equal(0.0, kelvins));
    }

    [Fact]
    public void Observe_Footprint_SmoothsAndKeepsTheMean()
    {
        Grid fine = TestWorld.GridOf(Hemisphere.North, cells: 90, cellMeters: 25_000);
        SceneParameters clean = North.Clean();
        SceneParameters smeared = clean with
        {
            Instrument = clean.Instrument with { FootprintKilometers = North.Instrument.FootprintKilometers },
        };
        float[] sharp = TestWorld.Make(clean, grid: fine).Observed(Day).Kelvins(Channel.H19).ToArray();
        float[] soft = TestWorld.Make(smeared, grid: fine).Observed(Day).Kelvins(Channel.H19).ToArray();

        Assert.Equal(sharp.Average(), soft.Average(), 0.1);
        Assert.True(Roughness(soft, 90) < 0.6 * Roughness(sharp, 90));
    }

    /// <summary>Two radiometers over one sea: the same truth, noise of their own.</summary>
    [Fact]
    public void Observe_AnotherRadiometer_SeesTheSameSeaWithOtherNoise()
    {
        DateOnly day = new(2001, 3, 1);
        Scene first = TestWorld.Make(North);
        Scene second = new(North, TestWorld.North, TestWorld.NoLand(TestWorld.North), TestWorld.Sensor, 1, radiometer: 2);
        float[] one = first.Observed(day).Kelvins(Channel.V19).ToArray();
        float[] other = second.Observed(day).Kelvins(Channel.V19).ToArray();
        double[] apart = [.. one.Zip(other, (left, right) => (double)right - left).Where(double.IsFinite)];

        Assert.Equal(first.TruthOf(day).Concentration, second.TruthOf(day).Concentration);

        // Origin: worked. Two draws of 0.45 K of noise differ by 0.45·√2 = 0.636 K; 2,304 cells tell that to 2 %.
        Assert.InRange(Math.Sqrt(apart.Average(difference => difference * difference)), 0.636 * 0.93, 0.636 * 1.07);
    }

    [Theory]
    [InlineData("north")]
    [InlineData("south")]
    [InlineData("demo")]
    public void Observe_AnyDay_StaysInTheBelievedRange(string name)
    {
        Scene scene = TestWorld.Make(Shipped.Scene(name), grid: name == "south" ? TestWorld.South : TestWorld.North);
        for (DateOnly day = new(2001, 1, 4); day.Year == 2001; day = day.AddDays(31))
        {
            BrightnessPlanes planes = scene.Observed(day);
            foreach (Channel channel in planes.Channels)
            {
                foreach (float kelvins in planes.Kelvins(channel))
                {
                    Assert.True(float.IsNaN(kelvins) || kelvins is > 85f and < 290f, $"{day:O} {channel}: {kelvins} K.");
                }
            }
        }
    }

    // Weather must make ice where there is none, or the screens would have nothing to do; and the screens must take most
    // of it away. Common practice, no source. The plain mixing of one ratio stands in for a retrieval here.
    [Fact]
    public void Observe_OpenWater_HasSpuriousIceThatScreensRemove()
    {
        Scene scene = TestWorld.Make(North);
        int spurious = 0, left = 0, water = 0;
        for (int index = 0; index < 20; index++)
        {
            DateOnly day = new DateOnly(2001, 1, 1).AddDays(18 * index);
            float[] ice = scene.TruthOf(day).Concentration;
            BrightnessPlanes planes = scene.Observed(day);
            for (int cell = 0; cell < ice.Length; cell++)
            {
                double v19 = planes.Kelvins(Channel.V19)[cell], h19 = planes.Kelvins(Channel.H19)[cell];
                double v37 = planes.Kelvins(Channel.V37)[cell], v22 = planes.Kelvins(Channel.V22)[cell];
                if (ice[cell] == 0f && Math.Abs(scene.Grid.LatitudesDegrees[cell]) < 66 && !double.IsNaN(v19))
                {
                    water++;
                    bool seemsIce = (v19 - h19) / (v19 + h19) < 0.20; // The tie points give 0.236 for water, 0.032 for ice.
                    bool screened = (v37 - v19) / (v37 + v19) > 0.05 || (v22 - v19) / (v22 + v19) > 0.045;
                    spurious += seemsIce ? 1 : 0;
                    left += seemsIce && !screened ? 1 : 0;
                }
            }
        }

        Assert.True(water > 3_000, $"Only {water} cells of open water.");
        Assert.InRange(spurious, 0.05 * water, 0.6 * water);
        Assert.InRange(left, 0, 0.35 * spurious);
    }

    [Fact]
    public void Observe_ChannelsThatCannotBeMadeOrAreNotHeld_AreLeftAlone()
    {
        Scene scene = TestWorld.Make(North.Clean());
        BrightnessPlanes planes = new(scene.Grid.CellCount, [Channel.V19, Channel.V89]);
        scene.Observe(Day, scene.CreateWorkspace(), planes);

        Assert.DoesNotContain(planes.Kelvins(Channel.V19).ToArray(), float.IsNaN);
        Assert.All(planes.Kelvins(Channel.V89).ToArray(), kelvins => Assert.True(float.IsNaN(kelvins)));
    }

    [Fact]
    public void Constructor_ValueOutOfRange_IsRefusedWithItsKey()
    {
        SceneParameters wrong = North with { Ice = North.Ice with { WinterLeadShare = 15 } };

        ArgumentException fault = Assert.Throws<ArgumentException>(() => TestWorld.Make(wrong));
        Assert.Contains("ice.winter_lead_share: found 15; allowed: 0 to 1", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Constructor_LandOfAnotherGrid_IsRefused() =>
        Assert.Throws<ArgumentException>(
            () => new Scene(North, TestWorld.North, TestWorld.NoLand(TestWorld.South), TestWorld.Sensor, 1));

    private static double[] Difference(Scene first, Scene second, DateOnly day, Channel channel)
    {
        float[] one = first.Observed(day).Kelvins(channel).ToArray(), two = second.Observed(day).Kelvins(channel).ToArray();
        return [.. one.Zip(two, (a, b) => (double)a - b)];
    }

    private static double Roughness(float[] plane, int columns) =>
        Enumerable.Range(0, plane.Length - 1).Where(cell => (cell + 1) % columns != 0)
            .Average(cell => Math.Pow(plane[cell + 1] - plane[cell], 2));
}
