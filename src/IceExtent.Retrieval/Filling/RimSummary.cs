namespace IceExtent.Retrieval;

/// <summary>What the observed cells of a polar gap's rim have in common on one day. Unit: 1.</summary>
/// <param name="Lowest">The least concentration.</param>
/// <param name="Highest">The greatest concentration.</param>
/// <param name="StandardError">The root of the mean standard error squared and the variance among the concentrations.</param>
/// <param name="HasIceTypes">Whether the method tells ice types apart.</param>
internal readonly record struct RimSummary(double Lowest, double Highest, double StandardError, bool HasIceTypes)
{
    /// <summary>Looks at the rim of a day of which at least one cell was observed.</summary>
    public static RimSummary Of(ConcentrationPlanes planes, ReadOnlySpan<int> rim)
    {
        double lowest = 1.0, highest = 0.0, totals = 0.0, squares = 0.0, errors = 0.0;
        int count = 0;
        bool types = true;
        foreach (int cell in rim)
        {
            if (!planes.IsSeenInPlace(cell))
            {
                continue;
            }

            double total = planes.Total[cell];
            lowest = Math.Min(lowest, total);
            highest = Math.Max(highest, total);
            totals += total;
            squares += total * total;
            errors += planes.StandardError[cell];
            types &= !float.IsNaN(planes.Multiyear[cell]);
            count++;
        }

        double mean = totals / count;
        double variance = Math.Max(0.0, (squares / count) - (mean * mean));
        double error = errors / count;
        return new(lowest, highest, Math.Sqrt((error * error) + variance), types);
    }
}
