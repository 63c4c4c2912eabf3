using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>What became of one planned day.</summary>
/// <param name="Day">The day.</param>
/// <param name="Fault">Why it became a gap, or null.</param>
/// <param name="OutOfRange">Brightness temperatures made missing.</param>
/// <param name="Methods">One entry a method of the run, in its order; empty for a gap.</param>
internal sealed record DayResult(PlannedDay Day, Fault? Fault, int OutOfRange, IReadOnlyList<MethodResult> Methods);

/// <summary>What one method made of one day.</summary>
internal sealed record MethodResult(string Method, RetrievalCounts Counts, IReadOnlyList<DailyRow> Rows);
