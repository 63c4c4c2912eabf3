using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>What became of one planned day.</summary>
/// <param name="Day">The day.</param>
/// <param name="Fault">Why it became a gap, or null.</param>
/// <param name="OutOfRange">Brightness temperatures made missing.</param>
/// <param name="Methods">One entry a method of the run, in its order; empty for a gap.</param>
internal sealed record DayResult(PlannedDay Day, Fault? Fault, int OutOfRange, IReadOnlyList<MethodResult> Methods)
{
    /// <summary>The day's pure surfaces, or null where the run takes no samples.</summary>
    public TunedDay? Tuned { get; init; }
}

/// <summary>What one method made of one day.</summary>
/// <param name="Method">The method.</param>
/// <param name="Counts">What happened to the cells.</param>
/// <param name="Filled">Cells filled from their neighbours.</param>
/// <param name="PolarGapFilled">Cells filled in the polar gap, 0 where the day's rim was too empty; null where the run fills no gap.</param>
/// <param name="Rows">One a region.</param>
/// <param name="Emptied">Whether screens, masks and coast correction left no cell that counts as ice, though there were such cells before them.</param>
internal sealed record MethodResult(string Method, RetrievalCounts Counts, int Filled, int? PolarGapFilled, IReadOnlyList<DailyRow> Rows, bool Emptied = false);
