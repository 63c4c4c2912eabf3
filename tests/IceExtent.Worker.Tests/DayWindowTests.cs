using CsCheck;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Tests;

/// <summary>The pipeline of days that need each other, with workers that read and write nothing.</summary>
public sealed class DayWindowTests
{
    private static readonly DateOnly First = new(1990, 5, 1);
    private static readonly Fault Unreadable = new("IE2000", "file", "found", "allowed", "Remedy.");

    /// <summary>Origin: worked. Days 1, 2, 4 and 9 are read, 3 is made from others; two days before, one after.</summary>
    [Fact]
    public void Window_WorkedDays_ReachesAsFarAsTheLimits()
    {
        DayWindow window = WindowOf([1, 2, 4], [9], [3], new(2, 1, 0.0));

        Assert.Equal([1, 2, 4, 9], window.Steps.Select(step => step.Date.DayNumber - First.DayNumber));
        Assert.Equal([0, 1, 2, 3], window.Steps.Select(step => step.Order));
        Assert.Equal(
            [new(0, First.AddDays(1), 0, 0, 1), new(1, First.AddDays(2), 1, 0, 1), new(2, First.AddDays(3), null, 0, 2), new OutputDay(3, First.AddDays(4), 2, 1, 2)],
            window.Outputs);
    }

    [Fact]
    public void Release_LastDayThatNeedsIt_GivesTheRoomBack()
    {
        DayWindow window = WindowOf([0, 1, 2], [], [], new(1, 1, 0.0));
        RetrievedDay first = window.Rent();
        window.Complete(0, first, null);
        Assert.False(window.TryTakeReady(out _)); // Day 0 waits for day 1.
        window.Complete(1, null, Unreadable);
        Assert.True(window.TryTakeReady(out int output));
        Assert.Equal(0, output);
        Assert.Same(first, window.At(0));
        Assert.Same(Unreadable, window.FaultAt(1));
        window.Release(0);
        Assert.NotSame(first, window.Rent()); // Day 1 may still need it.
        window.Complete(2, null, Unreadable);
        Assert.True(window.TryTakeReady(out output));
        window.Release(output);

        Assert.Same(first, window.Rent());
        Assert.Null(window.At(0));
        Assert.Equal(2, window.RoomsMade);
    }

    /// <summary>
    /// Every day comes once and in order, sees exactly the readable days of its window, and no more rooms are made than a window,
    /// the days ahead and the workers take: whatever is missing, and however many workers there are.
    /// </summary>
    [Fact]
    public void Run_AnyDaysAndWorkers_FinishesEachDayWithItsWindowInBoundedMemory() =>
        Gen.Select(Gen.Int[0, 3].Array[60], Gen.Int[0, 15], Gen.Int[0, 15], Gen.Int[1, 6])
            .Where(run => run.Item2 + run.Item3 > 0 && run.Item1.Contains(1))
            .Sample(
                (kinds, before, after, workers) =>
                {
                    // 0 is no input, 1 a day, 2 a day of the margin, 3 a day that cannot be read.
                    DayFillingRules rules = new(before, after, 0.0);
                    DateOnly[] read = [.. Enumerable.Range(0, kinds.Length).Where(day => kinds[day] > 0).Select(First.AddDays)];
                    int[] missing = [.. DaysNear.ToFill(read, rules).Select(day => day.DayNumber - First.DayNumber)];
                    DayWindow window = WindowOf([.. Of(kinds, 1), .. Of(kinds, 3)], Of(kinds, 2), missing, rules);
                    List<DayResult> results = [];
                    RunPipeline.RunAsync(window, workers, () => new Reader(window, kinds), results.Add, CancellationToken.None).GetAwaiter().GetResult();

                    return results.Select(result => result.Date).SequenceEqual(window.Outputs.Select(day => day.Date))
                        && results.TrueForAll(result => result.OutOfRange == SumNear(kinds, result.Date.DayNumber - First.DayNumber, rules))
                        && window.RoomsMade <= before + after + 1 + (2 * workers);
                },
                iter: 200,
                threads: 1);

    [Fact]
    public async Task Run_OutputThatFails_EndsTheRunWithThatFailure()
    {
        DayWindow window = WindowOf([.. Enumerable.Range(0, 100)], [], [], new(5, 5, 0.0));
        int[] kinds = [.. Enumerable.Repeat(1, 100)];

        FaultException failure = await Assert.ThrowsAsync<FaultException>(() => RunPipeline.RunAsync(
            window,
            3,
            () => new Reader(window, kinds),
            result => throw new FaultException(Unreadable),
            CancellationToken.None));

        Assert.Equal("IE2000", failure.Fault.Code);
    }

    /// <summary>Origin: worked. Input on days 0, 1, 4 and 20. With 2 days either side, days 2 and 3 have both; with 1 and 2 day 3 has not.</summary>
    [Theory]
    [InlineData(2, 2, new[] { 2, 3 })]
    [InlineData(1, 2, new[] { 2 })]
    [InlineData(1, 1, new int[0])]
    [InlineData(15, 15, new[] { 2, 3, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19 })]
    [InlineData(7, 7, new[] { 2, 3 })]
    [InlineData(8, 8, new[] { 2, 3, 12 })]
    public void ToFill_WorkedDays_NeedsBothSides(int before, int after, int[] expected) =>
        Assert.Equal(
            expected,
            DaysNear.ToFill(new[] { 20, 4, 0, 1 }.Select(First.AddDays), new(before, after, 0.0)).Select(day => day.DayNumber - First.DayNumber));

    /// <summary>The longest gap of the record, 3 December 1987 to 12 January 1988, stays one at any limits.</summary>
    [Fact]
    public void ToFill_LongestGapOfTheRecord_StaysAGap() =>
        Assert.Empty(DaysNear.ToFill([new(1987, 12, 2), new(1988, 1, 13)], new(DayFillingRules.MostDays, DayFillingRules.MostDays, 0.0)));

    [Theory]
    [InlineData(7, false)]
    [InlineData(8, true)]
    [InlineData(11, true)]
    [InlineData(12, true)]
    [InlineData(13, false)]
    public void Needed_DaysRoundAnOutput_ReachAsFarAsTheLimits(int day, bool needed) =>
        Assert.Equal(needed, DaysNear.Needed([First, First.AddDays(10)], First.AddDays(day), new(2, 2, 0.0)));

    private static int[] Of(int[] kinds, int kind) => [.. Enumerable.Range(0, kinds.Length).Where(day => kinds[day] == kind)];

    private static int SumNear(int[] kinds, int day, DayFillingRules rules) =>
        Enumerable.Range(0, kinds.Length).Where(other => kinds[other] is 1 or 2 && other >= day - rules.DaysBefore && other <= day + rules.DaysAfter).Sum(other => other + 1);

    private static DayWindow WindowOf(int[] days, int[] margin, int[] missing, DayFillingRules rules) => new(
        new([.. Planned(days)], [], 0) { Margin = [.. Planned(margin)], DaysToFill = [.. missing.Order().Select(First.AddDays)] }, rules, () => new(1, 1));

    private static IEnumerable<PlannedDay> Planned(int[] days) =>
        days.Order().Select((day, order) => new PlannedDay(order, null!, new SourceDay(First.AddDays(day), [], 0)));

    // Writes the day's number into its room and adds up what it finds in a window.
    private sealed class Reader(DayWindow window, int[] kinds) : IDayWorker
    {
        public IEnumerable<DayResult> Handle(PlannedDay day)
        {
            int number = day.Date.DayNumber - First.DayNumber;
            RetrievedDay? room = kinds[number] == 3 ? null : window.Rent();
            room?.OutOfRange = number + 1;
            window.Complete(day.Order, room, room is null ? Unreadable : null);
            while (window.TryTakeReady(out int taken))
            {
                OutputDay output = window.Outputs[taken];
                int sum = Enumerable.Range(output.First, output.Last - output.First + 1).Sum(step => window.At(step)?.OutOfRange ?? 0);
                window.Release(taken);
                yield return new(output.Order, output.Date, [], Observed: true, null, sum, []);
            }
        }
    }
}
