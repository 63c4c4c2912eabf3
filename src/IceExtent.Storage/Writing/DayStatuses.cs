using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>The names of <see cref="DayStatus"/> in tables.</summary>
internal static class DayStatuses
{
    private const string FinalName = "final";
    private const string ProvisionalName = "provisional";

    /// <summary>The name of a status.</summary>
    public static string NameOf(DayStatus status) => status == DayStatus.Final ? FinalName : ProvisionalName;

    /// <summary>The status of a name that a table holds.</summary>
    /// <exception cref="FaultException">IE3122: it is no such name.</exception>
    public static DayStatus Of(string path, string name) => name switch
    {
        FinalName => DayStatus.Final,
        ProvisionalName => DayStatus.Provisional,
        _ => throw new FaultException(new(
            "IE3122", path, $"the status {name}", $"{FinalName} or {ProvisionalName}",
            "The file is from another program: move it away and run that year anew.")),
    };
}
