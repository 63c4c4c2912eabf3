using IceExtent.Retrieval;

namespace IceExtent.Worker.Running;

/// <summary>What all methods say of one day before anything is filled: kept while other days may be filled from it, then used again for another day.</summary>
internal sealed class RetrievedDay
{
    /// <summary>Makes room.</summary>
    /// <param name="cellCount">The number of cells of the grid.</param>
    /// <param name="methods">The number of methods of the run.</param>
    public RetrievedDay(int cellCount, int methods)
    {
        Planes = [.. Enumerable.Range(0, methods).Select(_ => new ConcentrationPlanes(cellCount))];
        Counts = new RetrievalCounts[methods];
    }

    /// <summary>One set a method, in the run's order. Written by the worker that retrieves the day, then only read.</summary>
    public IReadOnlyList<ConcentrationPlanes> Planes { get; }

    /// <summary>What happened to the cells, one entry a method.</summary>
    public RetrievalCounts[] Counts { get; }

    /// <summary>What retrieved the planes, one entry a method: methods, screens and scatter as tuned for the day.</summary>
    public IReadOnlyList<DayRetrieval> Retrievals { get; set; } = [];

    /// <summary>The day's pure surfaces, or null where the run takes no samples.</summary>
    public TunedDay? Tuned { get; set; }

    /// <summary>Brightness temperatures made missing.</summary>
    public int OutOfRange { get; set; }
}
