using IceExtent.Statistics.Scoring;
using MathNet.Numerics;

namespace IceExtent.Worker.Running;

/// <summary>One method in one season against the truth of a scene.</summary>
/// <param name="Method">The method.</param>
/// <param name="Season">January to March, and so on.</param>
/// <param name="Classes">Cells by what they truly hold, in the order of <see cref="TruthClass"/>.</param>
/// <param name="Days">The number of days.</param>
/// <param name="ExtentErrorFraction">Mean over days of (retrieved − true extent) / true extent.</param>
/// <param name="ExtentRootMeanSquareFraction">Root mean square of the same.</param>
/// <param name="ExtentShare95">Share of days whose 95 % limits of extent hold the true extent.</param>
/// <param name="ExtentStandardErrorFraction">Mean over days of the standard error of extent / true extent.</param>
/// <param name="EdgeErrorKilometers">Mean distance between the edges.</param>
internal sealed record SeasonScore(
    string Method,
    string Season,
    IReadOnlyList<CellScore> Classes,
    int Days,
    double ExtentErrorFraction,
    double ExtentRootMeanSquareFraction,
    double ExtentShare95,
    double ExtentStandardErrorFraction,
    double EdgeErrorKilometers);

/// <summary>How the error of one method's extent drifts over the scored period.</summary>
/// <param name="Method">The method.</param>
/// <param name="ErrorSquareKilometersPerDecade">Least-squares slope of retrieved less true extent.</param>
/// <param name="TrueExtentSquareKilometers">The mean true extent.</param>
internal sealed record ErrorTrend(string Method, double ErrorSquareKilometersPerDecade, double TrueExtentSquareKilometers);

/// <summary>Sums scored days up.</summary>
internal static class ScoreSummary
{
    private const double SquareMetersPerSquareKilometer = 1e6;
    private const double DaysPerDecade = 3652.5;
    private const int LeastDaysOfATrend = 730;

    private static readonly string[] SeasonNames = ["JFM", "AMJ", "JAS", "OND"];

    /// <summary>By method and season; seasons without a day are left out.</summary>
    public static IReadOnlyList<SeasonScore> Seasons(IReadOnlyList<string> methods, IReadOnlyList<ScoredDay> scored) =>
        [.. methods.SelectMany((_, method) => SeasonNames.Select((_, season) => Of(methods, scored, method, season))).Where(score => score.Days > 0)];

    /// <summary>By method; nothing for a period of under two years, whose seasons would be taken for a drift.</summary>
    public static IReadOnlyList<ErrorTrend> Trends(IReadOnlyList<string> methods, IReadOnlyList<ScoredDay> scored)
    {
        if (scored.Count < 3 || scored[^1].Date.DayNumber - scored[0].Date.DayNumber < LeastDaysOfATrend)
        {
            return [];
        }

        double[] decades = [.. scored.Select(day => day.Date.DayNumber / DaysPerDecade)];
        return [.. methods.Select((name, method) => new ErrorTrend(
            name,
            Fit.Line(decades, [.. scored.Select(day => Error(day.Methods[method].Score) / SquareMetersPerSquareKilometer)]).B,
            scored.Average(day => day.Methods[method].Score.TrueExtentSquareMeters) / SquareMetersPerSquareKilometer))];
    }

    private static double Error(DayScore day) => day.ExtentSquareMeters - day.TrueExtentSquareMeters;

    private static SeasonScore Of(IReadOnlyList<string> methods, IReadOnlyList<ScoredDay> scored, int method, int season)
    {
        (DayScore Score, double ExtentError)[] days = [.. scored.Where(day => (day.Date.Month - 1) / 3 == season).Select(day => day.Methods[method])];
        double[] errors = [.. days.Select(day => Error(day.Score) / day.Score.TrueExtentSquareMeters)];
        double[] edges = [.. days.Select(day => day.Score.EdgeErrorMeters / 1_000.0).Where(double.IsFinite)];
        int held = days.Count(day => Math.Abs(Error(day.Score)) <= CellScore.Limit95 * day.ExtentError);
        return new(
            methods[method],
            SeasonNames[season],
            [.. Enum.GetValues<TruthClass>().Select(truth => days.Aggregate(default(CellScore), (sum, day) => sum + day.Score.Of(truth)))],
            days.Length,
            errors.DefaultIfEmpty(double.NaN).Average(),
            Math.Sqrt(errors.DefaultIfEmpty(double.NaN).Average(error => error * error)),
            days.Length == 0 ? double.NaN : (double)held / days.Length,
            days.Select(day => day.ExtentError / day.Score.TrueExtentSquareMeters).DefaultIfEmpty(double.NaN).Average(),
            edges.DefaultIfEmpty(double.NaN).Average());
    }
}
