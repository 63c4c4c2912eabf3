using System.Globalization;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Commands;

/// <summary>Prints how melt onset and freeze-up stand to the true days.</summary>
internal static class MeltScoreReport
{
    public static void Print(IReadOnlyList<ScoredMelt> scores, bool json, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonText.Of(scores.Select(score => new
            {
                score.Name,
                score.Cells.Cells,
                score.Cells.Dated,
                score.Cells.ExactShare,
                Within3Days = score.Cells.Within(3),
                Within3DaysOfAll = score.Cells.WithinOfAll(3),
                score.Cells.BiasDays,
                score.Cells.HeldShare,
                score.Cells.MeanSpreadDays,
            })));
            return;
        }

        console.Print("Cells and ice years with ice round the true day: dates found, days off, and how often the limits hold the true day");
        console.Print("date                              cells    dated   exact  3 days  3 days of all    bias  in limits  mean ±");
        foreach ((string name, Statistics.Scoring.SeasonDateScore cells) in scores.Select(score => (score.Name, score.Cells)))
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{name,-30} {cells.Cells,8} {cells.Dated,8} {cells.ExactShare,7:P0} {cells.Within(3),7:P0} {cells.WithinOfAll(3),14:P0} {cells.BiasDays,7:F1} {cells.HeldShare,10:P0} {cells.MeanSpreadDays,7:F1}"));
        }
    }
}
