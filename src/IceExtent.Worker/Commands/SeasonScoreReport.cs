using System.Globalization;
using IceExtent.Statistics.Scoring;
using IceExtent.Statistics.Seasons;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Commands;

/// <summary>Prints how season dates stand to the true ones.</summary>
internal static class SeasonScoreReport
{
    public static void Print(IReadOnlyList<ScoredSeasons> scores, bool json, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonText.Of(scores.Select(score => new
            {
                score.Method,
                Cells = score.Cells.ToDictionary(
                    pair => SeasonEvents.NameOf(pair.Key),
                    pair => new { pair.Value.Dated, pair.Value.ExactShare, Within3Days = pair.Value.Within(3), pair.Value.BiasDays, pair.Value.HeldShare, pair.Value.MeanSpreadDays, pair.Value.SameStateShare }),
                Regions = score.Regions.Select(error => new { error.Region, error.Year, error.Date, error.Days }),
            })));
            return;
        }

        console.Print("Cells and ice years: dates found less true dates, how often the limits hold the true day, and how often both agree that there is a date");
        console.Print("method         date         dated   exact  3 days    bias  in limits  mean ±  same state");
        foreach ((ScoredSeasons score, SeasonEvent which, SeasonDateScore cells) in scores.SelectMany(score => score.Cells.Select(pair => (score, pair.Key, pair.Value))))
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{score.Method,-14} {SeasonEvents.NameOf(which),-9} {cells.Dated,8} {cells.ExactShare,7:P0} {cells.Within(3),7:P0} {cells.BiasDays,7:F1} {cells.HeldShare,10:P0} {cells.MeanSpreadDays,7:F1} {cells.SameStateShare,11:P0}"));
        }

        console.Print(string.Empty);
        console.Print("Regions' medians, and when their ice area falls and rises: regions and ice years, within two days, largest error");
        foreach (IGrouping<(string Method, string Date), int> errors in scores
            .SelectMany(score => score.Regions.Select(error => (score.Method, error.Date, error.Days)))
            .GroupBy(error => (error.Method, error.Date), error => error.Days))
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{errors.Key.Method,-14} {errors.Key.Date,-9} {errors.Count(),8} {(double)errors.Count(days => Math.Abs(days) <= 2) / errors.Count(),7:P0} {errors.Max(Math.Abs),7}"));
        }
    }
}
