using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.TestKit;
using IceExtent.Worker.Configuration;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Tests;

/// <summary>Which day comes from which source.</summary>
public sealed class RunPlanTests : IDisposable
{
    private static readonly DateOnly First = new(1990, 5, 1);
    private readonly TinyRun run = new();

    public void Dispose() => run.Dispose();

    /// <summary>Origin: worked. Days 1, 3 and 6 have input, day 4 was refused: days 2 and 5 are without.</summary>
    [Fact]
    public void DaysWithoutInput_WorkedDays_CountsEachCalendarDayOnce()
    {
        Gap refused = new(First.AddDays(3), new Fault("IE2302", "file", "found", "allowed", "Remedy."));
        Gap alsoPlanned = new(First.AddDays(2), refused.Fault); // One source refused it, another has it.
        RunPlan plan = new([.. new[] { 0, 2, 5 }.Select((day, order) => new PlannedDay(order, null!, new SourceDay(First.AddDays(day), [], 0)))], [alsoPlanned, refused], 0);

        Assert.Equal(2, plan.DaysWithoutInput);
    }

    [Fact]
    public void Plan_TwoSourcesWithOneDay_TakesTheFirstOfTheRunFile()
    {
        run.WriteDay(First, _ => 0.5);
        run.WriteDay(First.AddDays(1), _ => 0.5);
        Directory.CreateDirectory(run.PathOf("better"));
        foreach (string file in Directory.EnumerateFiles(run.PathOf("days"), "19900502*"))
        {
            File.Copy(file, run.PathOf("better", Path.GetFileName(file)));
        }

        string text = File.ReadAllText(run.RunFile);
        string source = text[text.IndexOf("[[source]]", StringComparison.Ordinal)..];
        run.Write("second.toml", TinyRun.Sensor("1990-01-01", "1999-12-31"));
        run.Write("run.toml", text[..^source.Length]
            + source.Replace("days/*.bin", "better/*.bin", StringComparison.Ordinal).Replace("tiny.toml", "second.toml", StringComparison.Ordinal)
            + source);

        RunPlan plan = RunPlanner.Plan(RunFileLoader.Load(run.RunFile, ConfigFolder.BesideProgram), null, null, CancellationToken.None);

        Assert.Equal(["tiny", "second"], plan.Days.Select(day => day.Source.Settings.Sensor.Name));
        Assert.Equal(1, plan.Superseded);
        Assert.Empty(plan.Gaps);
    }
}
