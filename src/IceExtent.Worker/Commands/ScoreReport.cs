using System.Globalization;
using IceExtent.Statistics.Scoring;
using IceExtent.Worker.Running;

namespace IceExtent.Worker.Commands;

/// <summary>Prints scores: one table of cells and one of extents.</summary>
internal static class ScoreReport
{
    private static readonly string[] ClassNames = ["open water", "below limit", "marginal", "pack", "melting"];

    public static void Print(IReadOnlyList<SeasonScore> scores, IReadOnlyList<ErrorTrend> trends, bool json, CommandConsole console)
    {
        if (json)
        {
            console.Print(JsonText.Of(new { Trends = trends, Seasons = scores.Select(score => new
            {
                score.Method,
                score.Season,
                score.Days,
                score.ExtentErrorFraction,
                score.ExtentRootMeanSquareFraction,
                score.ExtentShare95,
                score.ExtentStandardErrorFraction,
                score.EdgeErrorKilometers,
                Classes = score.Classes.Select((cells, index) => new
                {
                    Truth = ClassNames[index],
                    cells.Cells,
                    Bias = Finite(cells.Bias),
                    Spread = Finite(cells.Spread),
                    Within68 = Finite(cells.Share68),
                    Within95 = Finite(cells.Share95),
                }),
            }) }));
            return;
        }

        console.Print("Cells: retrieved less true concentration, and how often the limits hold the truth");
        console.Print("method         season truth            cells    bias  spread  in 68 %  in 95 %");
        foreach (SeasonScore score in scores)
        {
            foreach ((CellScore cells, int index) in score.Classes.Select((cells, index) => (cells, index)).Where(pair => pair.cells.Cells > 1))
            {
                console.Print(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{score.Method,-14} {score.Season,-6} {ClassNames[index],-11} {cells.Cells,10} {cells.Bias,7:P1} {cells.Spread,7:P1} {cells.Share68,8:P0} {cells.Share95,8:P0}"));
            }
        }

        console.Print(string.Empty);
        console.Print("Extent of the observed cells: mean and root mean square error, mean standard error, days whose 95 % limits hold the truth, edge error");
        console.Print("method         season  days    mean     rms      se  in 95 %  edge km");
        foreach (SeasonScore score in scores)
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{score.Method,-14} {score.Season,-6} {score.Days,5} {score.ExtentErrorFraction,7:P1} {score.ExtentRootMeanSquareFraction,7:P1} {score.ExtentStandardErrorFraction,7:P1} {score.ExtentShare95,8:P0} {score.EdgeErrorKilometers,8:F1}"));
        }

        PrintTrends(trends, console);
    }

    private static void PrintTrends(IReadOnlyList<ErrorTrend> trends, CommandConsole console)
    {
        if (trends.Count == 0)
        {
            return;
        }

        console.Print(string.Empty);
        console.Print("Drift of the error of extent over the period, km² per decade, and its share of the mean true extent");
        foreach (ErrorTrend trend in trends)
        {
            console.Print(string.Create(
                CultureInfo.InvariantCulture,
                $"{trend.Method,-14} {trend.ErrorSquareKilometersPerDecade,12:F0} {trend.ErrorSquareKilometersPerDecade / trend.TrueExtentSquareKilometers,9:P2}"));
        }
    }

    private static double? Finite(double value) => double.IsFinite(value) ? value : null;
}
