using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Running;

/// <summary>A day that two sources or more could give.</summary>
/// <param name="Date">The day.</param>
/// <param name="Inputs">The sources that have it, in the order of the run file, each with its input.</param>
internal sealed record OverlapDay(DateOnly Date, IReadOnlyList<(OpenedSource Source, SourceDay Input)> Inputs)
{
    /// <summary>All such days of a plan in date order, whichever source rules them.</summary>
    public static IReadOnlyList<OverlapDay> Of(RunPlan plan) =>
    [
        .. plan.Offers
            .SelectMany(offer => offer.Days, (offer, day) => (offer.Source, Input: day))
            .GroupBy(one => one.Input.Date)
            .Where(day => day.Count() > 1)
            .OrderBy(day => day.Key)
            .Select(day => new OverlapDay(day.Key, [.. day])),
    ];
}
