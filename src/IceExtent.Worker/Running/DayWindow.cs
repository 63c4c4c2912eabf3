using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>A day that a run writes.</summary>
/// <param name="Order">Its place among those days, from 0.</param>
/// <param name="Date">The day.</param>
/// <param name="Step">Its place among the days that are read, or null where it has no usable input.</param>
/// <param name="First">The first of the days that are read and may give to it, itself included.</param>
/// <param name="Last">The last of them; at least <paramref name="First"/>.</param>
internal sealed record OutputDay(int Order, DateOnly Date, int? Step, int First, int Last);

/// <summary>Keeps retrieved days until every day that may be filled from them is finished. Shared by all workers.</summary>
/// <remarks>
/// A day can be finished once every day of its window was read; whoever takes it next finishes it. Planes come from a pool and go
/// back when the last day that needs them is done, so their number is that of the days in hand and not that of the run.
/// Retrieved planes are never written again while they are here: finishing works on a copy.
/// </remarks>
internal sealed class DayWindow
{
    private readonly Lock gate = new();
    private readonly Func<RetrievedDay> make;
    private readonly RetrievedDay?[] retrieved;
    private readonly Fault?[] faults;
    private readonly int[] daysToServe; // One a day that is read: days that still need it.
    private readonly int[] daysToWaitFor; // One a day that is written: days of its window not read yet.
    private readonly List<int>[] servedBy; // One a day that is read: the days that need it.
    private readonly Queue<int> ready = new();
    private readonly Stack<RetrievedDay> free = new();

    /// <summary>Lays the windows out.</summary>
    /// <param name="plan">The days.</param>
    /// <param name="rules">How far a window reaches.</param>
    /// <param name="make">Makes room for one day more.</param>
    public DayWindow(RunPlan plan, DayFillingRules rules, Func<RetrievedDay> make)
    {
        this.make = make;
        Steps = plan.Reads;
        DateOnly[] read = [.. Steps.Select(step => step.Date)];
        Outputs = [.. plan.Days.Select(day => day.Date).Concat(plan.DaysToFill).Order().Select((date, order) =>
        {
            int step = Array.BinarySearch(read, date);
            return new OutputDay(
                order, date, step >= 0 ? step : null, FirstAtOrAfter(read, date.AddDays(-rules.DaysBefore)), FirstAtOrAfter(read, date.AddDays(rules.DaysAfter + 1)) - 1);
        })];
        (retrieved, faults, daysToServe) = (new RetrievedDay?[Steps.Count], new Fault?[Steps.Count], new int[Steps.Count]);
        servedBy = [.. Steps.Select(_ => new List<int>())];
        daysToWaitFor = [.. Outputs.Select(day => day.Last - day.First + 1)];
        foreach (OutputDay day in Outputs)
        {
            for (int step = day.First; step <= day.Last; step++)
            {
                servedBy[step].Add(day.Order);
                daysToServe[step]++;
            }
        }
    }

    /// <summary>The days that are read, in date order, numbered from 0.</summary>
    public IReadOnlyList<PlannedDay> Steps { get; }

    /// <summary>The days that are written, in date order.</summary>
    public IReadOnlyList<OutputDay> Outputs { get; }

    /// <summary>How many days' room was made: the most that were held at one time.</summary>
    public int RoomsMade { get; private set; }

    /// <summary>Room for one day; the caller gives it to <see cref="Complete"/>.</summary>
    public RetrievedDay Rent()
    {
        lock (gate)
        {
            if (free.TryPop(out RetrievedDay? room))
            {
                return room;
            }

            RoomsMade++;
        }

        return make(); // Megabytes: not under the lock.
    }

    /// <summary>Takes a day that was read.</summary>
    /// <param name="step">Which.</param>
    /// <param name="day">What was retrieved, or null where it could not be read.</param>
    /// <param name="fault">Why it could not be read.</param>
    public void Complete(int step, RetrievedDay? day, Fault? fault)
    {
        lock (gate)
        {
            (retrieved[step], faults[step]) = (day, fault);
            FreeIfUnneeded(step);
            foreach (int output in servedBy[step])
            {
                if (--daysToWaitFor[output] == 0)
                {
                    ready.Enqueue(output);
                }
            }
        }
    }

    /// <summary>Takes a day that can be finished; the caller must finish it and call <see cref="Release"/>.</summary>
    public bool TryTakeReady(out int output)
    {
        lock (gate)
        {
            return ready.TryDequeue(out output);
        }
    }

    /// <summary>What was retrieved of a day that is read, or null. Only for days of a window that was taken and not released.</summary>
    public RetrievedDay? At(int step)
    {
        lock (gate)
        {
            return retrieved[step];
        }
    }

    /// <summary>Why a day could not be read, or null.</summary>
    public Fault? FaultAt(int step)
    {
        lock (gate)
        {
            return faults[step];
        }
    }

    /// <summary>Why some of the days that are read could not be, in their order.</summary>
    public IEnumerable<Fault> FaultsOf(IEnumerable<PlannedDay> days)
    {
        HashSet<DateOnly> dates = [.. days.Select(day => day.Date)];
        return Steps.Where(step => dates.Contains(step.Date)).Select(step => FaultAt(step.Order)).OfType<Fault>();
    }

    /// <summary>Says that a day is finished and needs its window no more.</summary>
    public void Release(int output)
    {
        OutputDay day = Outputs[output];
        lock (gate)
        {
            for (int step = day.First; step <= day.Last; step++)
            {
                daysToServe[step]--;
                FreeIfUnneeded(step);
            }
        }
    }

    private void FreeIfUnneeded(int step)
    {
        if (daysToServe[step] == 0 && retrieved[step] is { } room)
        {
            free.Push(room);
            retrieved[step] = null;
        }
    }

    private static int FirstAtOrAfter(DateOnly[] days, DateOnly day)
    {
        int at = Array.BinarySearch(days, day);
        return at < 0 ? ~at : at;
    }
}
