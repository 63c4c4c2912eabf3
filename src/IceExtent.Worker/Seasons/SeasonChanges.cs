using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Seasons;

/// <summary>What became of the dates that an archive already had of a year that was not over.</summary>
/// <param name="Confirmed">Found before and found again on the same day.</param>
/// <param name="Moved">Found again on another day.</param>
/// <param name="Withdrawn">Found before and no longer.</param>
/// <param name="New">Found for the first time.</param>
internal readonly record struct DateChanges(int Confirmed, int Moved, int Withdrawn, int New)
{
    /// <summary>Counts one date more.</summary>
    public DateChanges With(int? before, int? now) => (before, now) switch
    {
        ({ } day, { } again) when day == again => this with { Confirmed = Confirmed + 1 },
        ({ }, { }) => this with { Moved = Moved + 1 },
        ({ }, null) => this with { Withdrawn = Withdrawn + 1 },
        (null, { }) => this with { New = New + 1 },
        _ => this,
    };
}

/// <summary>What a run made of one ice year of one method.</summary>
/// <param name="Method">The method.</param>
/// <param name="Year">The ice year.</param>
/// <param name="IsFinal">Whether later days can no longer change it.</param>
/// <param name="Cells">Cells that held ice.</param>
/// <param name="Changes">What became of the cells' dates that the archive had of the year while it was running; null where it had none.</param>
/// <param name="Unread">Why days could not be read that count as missing.</param>
internal sealed record SeasonYearReport(
    string Method, int Year, bool IsFinal, int Cells, IReadOnlyDictionary<SeasonEvent, DateChanges>? Changes, IReadOnlyList<Fault> Unread)
{
    /// <summary>Dates of regions and places that moved, were withdrawn or are new, in words.</summary>
    public IReadOnlyList<string> Named { get; init; } = [];

    /// <summary>The same for the run record.</summary>
    public SeasonRecord ToRecord() => new(
        Method,
        Year,
        IsFinal ? "final" : "provisional",
        Cells,
        Unread.Count,
        (Changes ?? new Dictionary<SeasonEvent, DateChanges>()).ToDictionary(
            change => SeasonEvents.NameOf(change.Key),
            change => new DateChangeCounts(change.Value.Confirmed, change.Value.Moved, change.Value.Withdrawn, change.Value.New)),
        Named);
}
