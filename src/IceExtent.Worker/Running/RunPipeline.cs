using System.Threading.Channels;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Hands planned days to workers and gives their results back in date order.</summary>
/// <remarks>
/// Memory: one set of planes a worker, and at most <see cref="DaysAheadPerWorker"/> small results a worker that wait for
/// an earlier day. It does not grow with the number of days. The order and content of results do not depend on the
/// number of workers. Reading, retrieving and writing overlap because workers are at different days.
/// </remarks>
internal static class RunPipeline
{
    private const int DaysAheadPerWorker = 8;

    /// <summary>Runs every planned day.</summary>
    /// <param name="days">In order.</param>
    /// <param name="workers">How many days are handled at a time, 1 or more.</param>
    /// <param name="makeWorker">Makes a worker's own memory; called once a worker.</param>
    /// <param name="receive">Gets every result, in order, on one thread at a time.</param>
    /// <param name="cancellation">Stops after the days in hand; nothing is half-written.</param>
    /// <exception cref="OperationCanceledException">It was stopped.</exception>
    /// <exception cref="FaultException">An output cannot be written.</exception>
    public static async Task RunAsync(
        IReadOnlyList<PlannedDay> days,
        int workers,
        Func<DayWorker> makeWorker,
        Action<DayResult> receive,
        CancellationToken cancellation)
    {
        using CancellationTokenSource stop = CancellationTokenSource.CreateLinkedTokenSource(cancellation);
        using SemaphoreSlim ahead = new(workers * DaysAheadPerWorker);
        Channel<PlannedDay> todo = Channel.CreateBounded<PlannedDay>(new BoundedChannelOptions(workers) { SingleWriter = true });
        Channel<DayResult> done = Channel.CreateBounded<DayResult>(new BoundedChannelOptions(workers * DaysAheadPerWorker) { SingleReader = true });

#pragma warning disable CA2025 // FirstFailureOf waits for every task, failed or not, before anything is disposed.
        Task[] handling = [.. Enumerable.Range(0, workers).Select(_ => Task.Run(() => WorkAsync(makeWorker(), todo.Reader, done.Writer, stop.Token), CancellationToken.None))];
        Task[] all =
        [
            Guarded(FeedAsync(days, todo.Writer, ahead, stop.Token)),
            Guarded(CloseAfterAsync(handling, done.Writer)),
            Guarded(CollectAsync(done.Reader, ahead, receive, stop.Token)),
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
        DayWorker worker, ChannelReader<PlannedDay> todo, ChannelWriter<DayResult> done, CancellationToken stop)
    {
        await foreach (PlannedDay day in todo.ReadAllAsync(stop))
        {
            await done.WriteAsync(worker.Handle(day), stop);
        }
    }

    private static async Task CloseAfterAsync(Task[] handling, ChannelWriter<DayResult> done)
    {
        await Task.WhenAll(handling);
        done.Complete();
    }

    private static async Task CollectAsync(
        ChannelReader<DayResult> done, SemaphoreSlim ahead, Action<DayResult> receive, CancellationToken stop)
    {
        Dictionary<int, DayResult> waiting = [];
        int next = 0;
        await foreach (DayResult result in done.ReadAllAsync(stop))
        {
            waiting.Add(result.Day.Order, result);
            while (waiting.Remove(next, out DayResult? inOrder))
            {
                receive(inOrder);
                ahead.Release();
                next++;
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
