using System.Globalization;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>What <see cref="CoastMinimumBuild"/> made.</summary>
/// <param name="MinimumFraction">One fraction a cell.</param>
/// <param name="DaysByMonth">The days of each month that went in, January first.</param>
/// <param name="Faults">Grid files that could not be used; each cost its day.</param>
internal sealed record CoastMinimumResult(float[] MinimumFraction, IReadOnlyList<int> DaysByMonth, IReadOnlyList<Fault> Faults);

/// <summary>Makes coastal minima from a year of an archive's grids.</summary>
internal sealed class CoastMinimumBuild(RunSettings settings)
{
    private readonly ArchiveLayout layout = new(settings.Output);

    /// <summary>Reads the year, day after day, and takes the smallest monthly mean.</summary>
    /// <exception cref="FaultException">IE2207: no grids. IE2208: too few days in a month.</exception>
    public CoastMinimumResult Make(string method, int year, CancellationToken cancellation)
    {
        List<ReadOnlyMemory<float>> means = [];
        List<int> days = [];
        List<Fault> faults = [];
        int leastDays = settings.Coast.LeastDaysPerMonth;
        for (int month = 1; month <= 12; month++)
        {
            MonthlyMean mean = MeanOf(method, year, month, faults, cancellation);
            days.Add(mean.Days);
            means.Add(mean.Of(leastDays));
        }

        Check(method, year, days, faults.Count);
        return new(CoastMinimum.Build(means, new(settings.Grid, settings.Ocean), settings.Coast.Minimum), days, faults);
    }

    private MonthlyMean MeanOf(string method, int year, int month, List<Fault> faults, CancellationToken cancellation)
    {
        MonthlyMean mean = new(settings.Grid.CellCount);
        for (DateOnly day = new(year, month, 1); day.Month == month; day = day.AddDays(1))
        {
            cancellation.ThrowIfCancellationRequested();
            string path = layout.GridFile(method, settings.Grid.Hemisphere, day);
            try
            {
                if (File.Exists(path))
                {
                    mean.Add(ConcentrationGridFile.Read(path, settings.Grid));
                }
            }
            catch (FaultException unreadable)
            {
                faults.Add(unreadable.Fault);
            }
        }

        return mean;
    }

    private void Check(string method, int year, List<int> days, int faultCount)
    {
        string folder = Path.GetDirectoryName(layout.GridFile(method, settings.Grid.Hemisphere, new(year, 1, 1)))!;
        if (days.Sum() == 0)
        {
            throw new FaultException(new(
                "IE2207",
                folder,
                faultCount == 0 ? "no grid file" : FormattableString.Invariant($"{faultCount} grid files, none of them usable"),
                "the grids of a year",
                "Run that year with write_grids = true, or name another year."));
        }

        string[] poor = [.. days
            .Select((count, index) => (Count: count, Month: index + 1))
            .Where(month => month.Count < settings.Coast.LeastDaysPerMonth)
            .Select(month => string.Create(CultureInfo.InvariantCulture, $"{year:D4}-{month.Month:D2} with {Counted(month.Count)}"))];
        if (poor.Length > 0)
        {
            throw new FaultException(new(
                "IE2208",
                folder,
                string.Join(", ", poor),
                FormattableString.Invariant($"{settings.Coast.LeastDaysPerMonth} days or more in every month"),
                "Run the missing days, name another year, or lower coast.least_days_per_month."));
        }
    }

    private static string Counted(int days) => days == 1 ? "1 day" : FormattableString.Invariant($"{days} days");
}
