using IceExtent.Retrieval;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading;

/// <summary>A set of files of one sensor from which days of brightness temperatures can be read.</summary>
/// <remarks>
/// The one interface behind which a file format hides. Another reader (another library, another format) is a
/// class that implements it and a line in <see cref="BrightnessSources"/>. Safe to use from several threads.
/// </remarks>
public interface IBrightnessSource
{
    /// <summary>Lists the days that the files hold, without reading any plane.</summary>
    /// <returns>The days in date order, and a fault for each file that cannot be listed. Two files for one day are both listed.</returns>
    SourceInventory List(CancellationToken cancellation);

    /// <summary>Reads one day.</summary>
    /// <param name="day">A day that <see cref="List"/> gave.</param>
    /// <param name="into">Receives every channel it holds, in K, NaN where missing, row 0 at the top; nothing is range-checked.</param>
    /// <exception cref="FaultException">The day cannot be read; <paramref name="into"/> then holds nothing of use.</exception>
    void Read(SourceDay day, BrightnessPlanes into);
}

/// <summary>One day in one source.</summary>
/// <param name="Date">The day, UTC.</param>
/// <param name="Files">Absolute paths of the files that hold it: one, or one a channel in the order of the source's channels.</param>
/// <param name="Step">The index of the day on the file's time axis; 0 where it has none.</param>
public sealed record SourceDay(DateOnly Date, IReadOnlyList<string> Files, int Step);

/// <summary>What a source holds.</summary>
/// <param name="Days">In date order, then in the order of their files' names.</param>
/// <param name="Faults">One for each file that cannot be listed.</param>
public sealed record SourceInventory(IReadOnlyList<SourceDay> Days, IReadOnlyList<Fault> Faults);
