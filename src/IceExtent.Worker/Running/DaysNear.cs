using IceExtent.Retrieval;

namespace IceExtent.Worker.Running;

/// <summary>Which days a run needs beside those that it was asked for, because empty cells are filled over days.</summary>
internal static class DaysNear
{
    /// <summary>Days without usable input that have input on either side within the limits.</summary>
    /// <param name="withInput">Every day that has usable input, wanted or not.</param>
    /// <param name="rules">The limits.</param>
    /// <returns>In date order, wanted or not.</returns>
    public static IEnumerable<DateOnly> ToFill(IEnumerable<DateOnly> withInput, DayFillingRules rules)
    {
        DateOnly? last = null;
        foreach (DateOnly day in withInput.Order())
        {
            for (DateOnly empty = last?.AddDays(1) ?? day; empty < day; empty = empty.AddDays(1))
            {
                if (empty.DayNumber - last!.Value.DayNumber <= rules.DaysBefore && day.DayNumber - empty.DayNumber <= rules.DaysAfter)
                {
                    yield return empty;
                }
            }

            last = day;
        }
    }

    /// <summary>Whether any of some days can be filled from a day.</summary>
    /// <param name="outputs">The days that are written, in date order.</param>
    /// <param name="day">The day that may give.</param>
    /// <param name="rules">The limits.</param>
    public static bool Needed(DateOnly[] outputs, DateOnly day, DayFillingRules rules)
    {
        int at = Array.BinarySearch(outputs, day.AddDays(-rules.DaysAfter));
        int first = at < 0 ? ~at : at;
        return first < outputs.Length && outputs[first] <= day.AddDays(rules.DaysBefore);
    }
}
