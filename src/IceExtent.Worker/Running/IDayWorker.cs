using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Running;

/// <summary>Handles days that are read, one at a time, in memory of its own. Not shared between threads.</summary>
internal interface IDayWorker
{
    /// <summary>Handles one day. A bad file costs the day, not the run.</summary>
    /// <returns>The days that were finished with it, each as soon as it is: itself, others, or none yet.</returns>
    /// <exception cref="FaultException">A grid file cannot be written: that stops the run.</exception>
    IEnumerable<DayResult> Handle(PlannedDay day);
}
