namespace IceExtent.Retrieval;

/// <summary>How well the samples of a window fix their centre.</summary>
internal static class CenterError
{
    private const int FewDays = 4;

    /// <summary>The standard error of one channel's centre, in K.</summary>
    /// <param name="days">The samples, day by day.</param>
    /// <param name="channel">The channel.</param>
    /// <param name="scatterKelvins">The standard deviation of all samples, in K.</param>
    /// <remarks>
    /// Cells of one day share weather, so days are the independent pieces, and neighbouring days are alike too: the standard deviation
    /// of daily centres over the root of the effective number of days, n (1 − r) / (1 + r), with r the lag-1 correlation, never below
    /// 0 and never so large that less than one day is left. Source: [Santer2000]. With fewer than four days there is no scatter of
    /// days to speak of: the scatter of samples, taken as one piece a day.
    /// </remarks>
    public static double Of(IReadOnlyList<SurfaceMoments> days, Channel channel, double scatterKelvins)
    {
        if (days.Count < FewDays)
        {
            return scatterKelvins / Math.Sqrt(days.Count);
        }

        double[] centers = [.. days.Select(day => day.MeanKelvins(channel))];
        double mean = centers.Average();
        double squares = centers.Sum(center => (center - mean) * (center - mean));
        double neighbours = 0.0;
        for (int day = 1; day < centers.Length; day++)
        {
            neighbours += (centers[day] - mean) * (centers[day - 1] - mean);
        }

        double correlation = squares > 0.0 ? Math.Max(neighbours / squares, 0.0) : 0.0;
        double effective = Math.Max(centers.Length * (1.0 - correlation) / (1.0 + correlation), 1.0);
        return Math.Sqrt(squares / (centers.Length - 1) / effective);
    }
}
