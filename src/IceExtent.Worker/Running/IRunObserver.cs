using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Running;

/// <summary>Watches a run.</summary>
internal interface IRunObserver
{
    /// <summary>The plan is made.</summary>
    void Planned(RunPlan plan);

    /// <summary>A day is done. Called in date order, on one thread at a time.</summary>
    void DayDone(DayResult result);

    /// <summary>The dates of an ice year are found.</summary>
    void SeasonDone(SeasonYearReport year);
}
