using System.Threading.Channels;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Hands days to workers and gives their results back in date order.</summary>
/// <remarks>
/// Memory does not grow with the number of days: reading runs ahead of the first day without a result by what that day needs
/// and a few days a worker. It never waits for less than that, so nothing waits for ever. The order and content of results do not
/// depend on the number of workers. Reading, retrieving and writing overlap because workers are at different days.
/// </remarks>
internal static class RunPipeline
{
    private const int DaysAheadPerWorker = 8;

    /// <summary>Runs every day, each by itself.</summary>
    /// <param name="days">In order.</param>
    /// <param name="workers">How many days are handled at a time, 1 or more.</param>
    /// <param name="makeWorker">Makes a worker's own memory; called once a worker.</param>
    /// <param name="receive">Gets every result, in order, on one thread at a time.</param>
    /// <param name="cancellation">Stops after the days in hand; nothing is half-written.</param>
    /// <exception cref="OperationCanceledException">It was stopped.</exception>
    /// <exception cref="FaultException">An output cannot be written.</exception>
    public static Task RunAsync(
        IReadOnlyList<PlannedDay> days, int workers, Func<IDayWorker> makeWorker, Action<DayResult> receive, CancellationToken cancellation) =>
        RunAsync(days, received => received + (workers * DaysAheadPerWorker), workers, makeWorker, receive, cancellation);

    /// <summary>Runs every day of a window, where a result may need days before and after it.</summary>
    /// <param name="window">The days.</param>
    /// <param name="workers">As above.</param>
    /// <param name="makeWorker">As above.</param>
    /// <param name="receive">As above.</param>
    /// <param name="cancellation">As above.</param>
    /// <exception cref="OperationCanceledException">It was stopped.</exception>
    /// <exception cref="FaultException">An output cannot be written.</exception>
    public static Task RunAsync(
        DayWindow window, int workers, Func<IDayWorker> makeWorker, Action<DayResult> receive, CancellationToken cancellation)
    {
        int ahead = 2 * workers; // Planes are held meanwhile, so this is little.
        return RunAsync(
            window.Steps,
            received => received < window.Outputs.Count ? window.Outputs[received].Last + 1 + ahead : window.Steps.Count + ahead,
            workers,
            makeWorker,
            receive,
            cancellation);
    }

    // Of the days, allowedAfter says how many may have begun once some results were received; it never falls.
    private static async Task RunAsync(
        IReadOnlyList<PlannedDay> days,
        Func<int, int> allowedAfter,
        int workers,
        Func<IDayWorker> makeWorker,
        Action<DayResult> receive,
        CancellationToken cancellation)
    {
        using CancellationTokenSource stop = CancellationTokenSource.CreateLinkedTokenSource(cancellation);
        using SemaphoreSlim ahead = new(allowedAfter(0));
        Channel<PlannedDay> todo = Channel.CreateBounded<PlannedDay>(new BoundedChannelOptions(workers) { SingleWriter = true });
        Channel<DayResult> done = Channel.CreateBounded<DayResult>(new BoundedChannelOptions(workers * DaysAheadPerWorker) { SingleReader = true });

#pragma warning disable CA2025 // FirstFailureOf waits for every task, failed or not, before anything is disposed.
        Task[] handling = [.. Enumerable.Range(0, workers).Select(_ => Task.Run(() => WorkAsync(makeWorker(), todo.Reader, done.Writer, stop.Token), CancellationToken.None))];
        Task[] all =
        [
            Guarded(FeedAsync(days, todo.Writer, ahead, stop.Token)),
            Guarded(CloseAfterAsync(handling, done.Writer)),
            Guarded(CollectAsync(done.Reader, ahead, allowedAfter, receive, stop.Token)),
            .. handling.Select(Guarded),
        ];
#pragma warning restore CA2025
        await FirstFailureOf(all);
        cancellation.ThrowIfCancellationRequested();

        async Task Guarded(Task task)
        {
            try
            {
                await task;
            }
            catch
            {
                await stop.CancelAsync(); // One failure ends the others, so nothing waits for ever.
                throw;
            }
        }
    }

    private static async Task FeedAsync(
        IReadOnlyList<PlannedDay> days, ChannelWriter<PlannedDay> todo, SemaphoreSlim ahead, CancellationToken stop)
    {
        foreach (PlannedDay day in days)
        {
            await ahead.WaitAsync(stop);
            await todo.WriteAsync(day, stop);
        }

        todo.Complete();
    }

    private static async Task WorkAsync(
        IDayWorker worker, ChannelReader<PlannedDay> todo, ChannelWriter<DayResult> done, CancellationToken stop)
    {
        await foreach (PlannedDay day in todo.ReadAllAsync(stop))
        {
            foreach (DayResult result in worker.Handle(day))
            {
                await done.WriteAsync(result, stop);
            }
        }
    }

    private static async Task CloseAfterAsync(Task[] handling, ChannelWriter<DayResult> done)
    {
        await Task.WhenAll(handling);
        done.Complete();
    }

    private static async Task CollectAsync(
        ChannelReader<DayResult> done, SemaphoreSlim ahead, Func<int, int> allowedAfter, Action<DayResult> receive, CancellationToken stop)
    {
        Dictionary<int, DayResult> waiting = [];
        int next = 0;
        await foreach (DayResult result in done.ReadAllAsync(stop))
        {
            waiting.Add(result.Order, result);
            while (waiting.Remove(next, out DayResult? inOrder))
            {
                receive(inOrder);
                next++;
                if (allowedAfter(next) - allowedAfter(next - 1) is > 0 and var more)
                {
                    ahead.Release(more);
                }
            }
        }
    }

    // A real failure is told rather than the cancellations it caused.
    private static async Task FirstFailureOf(Task[] tasks)
    {
        try
        {
            await Task.WhenAll(tasks);
        }
        catch (OperationCanceledException)
        {
            Exception? cause = tasks
                .Where(task => task.IsFaulted)
                .SelectMany(task => task.Exception!.InnerExceptions)
                .FirstOrDefault(exception => exception is not OperationCanceledException);
            if (cause is not null)
            {
                System.Runtime.ExceptionServices.ExceptionDispatchInfo.Throw(cause);
            }

            throw;
        }
    }
}
