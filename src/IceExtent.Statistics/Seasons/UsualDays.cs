using IceExtent.Statistics.Trends;
using MathNet.Numerics.Statistics;

namespace IceExtent.Statistics.Seasons;

/// <summary>What a date or a length usually is: its spread over years, and its trend. Unit: days, of dates from the ice year's first day.</summary>
/// <param name="Years">How many years have a value.</param>
/// <param name="Least">The earliest or shortest.</param>
/// <param name="LowerQuartile">A quarter of the years lie below.</param>
/// <param name="Median">Half of them.</param>
/// <param name="UpperQuartile">Three quarters.</param>
/// <param name="Most">The latest or longest.</param>
/// <param name="Trend">The straight line through them.</param>
public sealed record UsualDays(int Years, double Least, double LowerQuartile, double Median, double UpperQuartile, double Most, LinearTrend Trend)
{
    /// <summary>Describes values, or gives null where there are none.</summary>
    /// <remarks>Quartiles lie on straight lines between the sorted values: definition 7 of [HyndmanFan1996].</remarks>
    /// <param name="values">The years, rising, each with its value.</param>
    /// <param name="leastYears">A trend needs so many.</param>
    public static UsualDays? Of(IReadOnlyList<(int Year, double Days)> values, int leastYears)
    {
        ArgumentNullException.ThrowIfNull(values);
        if (values.Count == 0)
        {
            return null;
        }

        double[] days = [.. values.Select(value => value.Days)];
        double At(double share) => days.QuantileCustom(share, QuantileDefinition.R7);
        return new(
            days.Length, At(0.0), At(0.25), At(0.5), At(0.75), At(1.0), LinearTrend.Fit([.. values.Select(value => value.Year)], days, leastYears));
    }
}
