using CsCheck;
using IceExtent.Statistics.Seasons;
using Xunit;

namespace IceExtent.Statistics.Tests.Seasons.Melt;

/// <summary>What must hold for every series.</summary>
public sealed class MeltLaws
{
    private const int Days = 420;
    private const int DayZero = 20;
    private const int From = 90; // Between these two anything may come; outside it is winter.
    private const int Until = 150;

    private static readonly SeriesDays Lie = new(DayZero, 0, Days - 1);

    // The jump, the level and the range: the gradient ratio is no difference, so that a constant would change it.
    private static readonly MeltIndicatorRules Differences = new(
        new(1.0, 3.0), new(0.0, 1.0), new(1.0, 5.0), new(1.0, 2.0), 5, 6.0, 1.0, 5, 3, 31, 10, 1, 2);

    private static readonly MeltRules Rules = new(
        MeltCell.Calendar, 0.5, 3, new(4.0, -10.0, 10, 5, 7.5, 2, 1.0, 1), Differences);

    private static readonly Gen<Cell> Cells = Gen.Select(Gen.Int[0, 1_000_000], Gen.Double[0.0, 0.3], (seed, missing) => new Cell(seed, missing));

    [Fact]
    public void Dates_SeriesShifted_ShiftAlike() => Gen.Select(Cells, Gen.Int[1, 25]).Sample((cell, days) =>
    {
        (SeasonDate onset, MeltDates dates) = cell.Find(0, 0f);
        (SeasonDate later, MeltDates laterDates) = cell.Find(days, 0f);
        return Alike(onset, later, days) && Alike(dates.EarlyMelt, laterDates.EarlyMelt, days) && Alike(dates.ContinuousMelt, laterDates.ContinuousMelt, days);
    });

    [Fact]
    public void Dates_ConstantAddedToAllTemperatures_StayTheSame() => Gen.Select(Cells, Gen.Int[-16, 16]).Sample((cell, kelvins) =>
        cell.Find(0, kelvins) == cell.Find(0, 0f)); // Whole numbers, so that nothing is rounded.

    [Fact]
    public void Dates_Limits_HoldTheDay() => Cells.Sample(cell =>
    {
        (SeasonDate onset, MeltDates dates) = cell.Find(0, 0f);
        return Array.TrueForAll(
            [onset, dates.EarlyMelt, dates.ContinuousMelt, dates.EarlyFreeze, dates.ContinuousFreeze],
            date => date.Day is not { } day || (date.Earliest <= day && day <= date.Latest))
            && (dates.EarlyMelt.Day is not { } early || dates.ContinuousMelt.Day is not { } melt || early <= melt);
    });

    /// <summary>The workspace of other cells leaves no trace.</summary>
    [Fact]
    public void Dates_WorkspaceUsedBefore_StayTheSame() => Gen.Select(Cells, Cells).Sample((cell, before) =>
    {
        MeltWorkspace room = new(Days + 100);
        before.Find(7, 0f, room);
        return cell.Find(0, 0f, room) == cell.Find(0, 0f);
    });

    /// <summary>Any windows, in any order, over the ends of any record: there is an answer, and nothing is read outside the series.</summary>
    [Fact]
    public void Dates_AnyWindowsAndRecord_GiveAnAnswer() => Gen.Select(Cells, Gen.Int[-80, 480].Array[10]).Sample((cell, ends) =>
    {
        MeltWindows windows = new(Window(0), Window(2), Window(4), Window(6));
        (SeasonDate onset, MeltDates dates) = cell.Find(0, 0f, windows: windows, lie: new(DayZero, Math.Min(ends[8], ends[9]), Math.Max(ends[8], ends[9])));
        return Enum.IsDefined(onset.State) && Enum.IsDefined(dates.ContinuousMelt.State) && Enum.IsDefined(dates.ContinuousFreeze.State);

        SeasonWindow Window(int at) => new(Math.Min(ends[at], ends[at + 1]), Math.Max(ends[at], ends[at + 1]));
    });

    /// <summary>Against the plain way.</summary>
    [Fact]
    public void SlidingSpread_AnySeriesAndWidth_IsMaximumLessMinimum() => Gen.Select(Gen.Float[-50f, 50f].Array[80, 120], Gen.Int[1, 32], Gen.Int[0, 20]).Sample((values, width, from) =>
    {
        MeltWorkspace room = new(values.Length);
        Array.Fill(room.Usable, float.NaN);
        values.CopyTo(room.Usable, 0);
        Array.Fill(room.Usable, float.NaN, 30, 25);
        SlidingSpread.Fill(room, from, 70, width);
        for (int at = from; at < 70; at++)
        {
            float[] there = [.. room.Usable.AsSpan(at, width).ToArray().Where(value => !float.IsNaN(value))];
            float expected = there.Length == 0 ? float.NegativeInfinity : there.Max() - there.Min();
            if (room.Count[at] != there.Length || room.Range[at] != expected)
            {
                return false;
            }
        }

        return true;
    });

    private static bool Alike(SeasonDate date, SeasonDate later, int days) =>
        date.State == later.State && (date.Day + days) == later.Day && (date.Earliest + days) == later.Earliest && (date.Latest + days) == later.Latest;

    // Winter with a wild stretch in it; whole tenths of a kelvin in powers of two, so that shifts add no rounding.
    private sealed class Cell(int seed, double missing)
    {
        public (SeasonDate Onset, MeltDates Dates) Find(int shift, float kelvins, MeltWorkspace? room = null, MeltWindows? windows = null, SeriesDays? lie = null)
        {
            Random random = new(seed);
            float[] range = new float[Days], v19 = new float[Days], v37 = new float[Days], ice = new float[Days];
            for (int day = 0; day < Days; day++)
            {
                (range[day], v19[day], v37[day], ice[day]) = (12f, 240f + kelvins, 230f + kelvins, 0.9f);
            }

            float drift = 0f;
            for (int day = From; day < Until; day++)
            {
                drift += random.Next(-4, 5);
                int at = DayZero + day + shift;
                (range[at], v19[at], v37[at]) = (12f - random.Next(0, 30), 240f + kelvins + drift, 230f + kelvins + drift + random.Next(-8, 20));
                ice[at] = random.NextDouble() < missing ? float.NaN : random.Next(30, 100) / 100f;
            }

            MeltSeries series = new(range, v19, v37, ice);
            room ??= new(Days);
            return (
                HorizontalRangeMelt.Onset(series, lie ?? Lie, windows ?? MeltCell.Windows, Rules, room),
                IndicatorMelt.Dates(series, lie ?? Lie, windows ?? MeltCell.Windows, Rules, room));
        }
    }
}
