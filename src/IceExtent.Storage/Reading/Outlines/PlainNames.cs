using System.Text.RegularExpressions;
using IceExtent.Statistics;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>What names of regions and places may look like: they become values of columns and parts of file names.</summary>
internal static partial class PlainNames
{
    private const string Allowed = "1 to 60 letters (a to z), digits, '-', '_' and '.', starting with a letter or digit";

    /// <summary>The fault of a name, or null.</summary>
    public static Fault? FaultOf(string name, string where) => name switch
    {
        TotalsRegion.WholeHemisphere => new(
            "IE1503", where, $"the name {name}, which stands for every ocean cell of the grid", "any other name", "Choose another name."),
        _ when PlainName.IsMatch(name) => null,
        _ => new("IE1503", where, $"the name \"{name}\"", Allowed, "Change the name; what people read goes into title."),
    };

    [GeneratedRegex(@"\A[A-Za-z0-9][A-Za-z0-9._-]{0,59}\z", RegexOptions.CultureInvariant)]
    private static partial Regex PlainName { get; }
}
