using IceExtent.Statistics.Seasons;

namespace IceExtent.Statistics.Scoring;

/// <summary>How the dates of cells stand to those of the truth. Counts of cells and ice years; rates of them. Unit of days: day.</summary>
public sealed class SeasonDateScore
{
    private readonly List<int> errors = [];
    private double spreads;
    private int held;
    private int limited;
    private int sameState;
    private int cells;

    /// <summary>All cells taken.</summary>
    public int Cells => cells;

    /// <summary>Cells whose date is found in both.</summary>
    public int Dated => errors.Count;

    /// <summary>Share of them with the true day.</summary>
    public double ExactShare => Within(0);

    /// <summary>Mean error: found minus true.</summary>
    public double BiasDays => errors.Count == 0 ? double.NaN : errors.Average();

    /// <summary>Share of cells with a true date and limits, found or hidden, whose limits hold the true day.</summary>
    public double HeldShare => limited == 0 ? double.NaN : (double)held / limited;

    /// <summary>Mean half width of those limits.</summary>
    public double MeanSpreadDays => limited == 0 ? double.NaN : spreads / limited;

    /// <summary>Share of cells with ice in either that agree whether there is a date.</summary>
    public double SameStateShare => cells == 0 ? double.NaN : (double)sameState / cells;

    /// <summary>Share of the dated cells that err by no more than so many days.</summary>
    public double Within(int days) => errors.Count == 0 ? double.NaN : (double)errors.Count(error => Math.Abs(error) <= days) / errors.Count;

    /// <summary>The same as a share of all cells taken: those without a date err.</summary>
    public double WithinOfAll(int days) => cells == 0 ? double.NaN : (double)errors.Count(error => Math.Abs(error) <= days) / cells;

    /// <summary>Takes one cell and year.</summary>
    /// <param name="truth">Its true date.</param>
    /// <param name="found">What was found.</param>
    public void Add(SeasonDate truth, SeasonDate found)
    {
        cells++;
        sameState += truth.State == found.State || (truth.Day is not null && found.State == SeasonDateState.HiddenByGap) ? 1 : 0;
        if (truth.Day is not { } day)
        {
            return;
        }

        if (found.Day is { } other)
        {
            errors.Add(other - day);
        }

        if (found.Earliest is { } earliest && found.Latest is { } latest)
        {
            limited++;
            spreads += 0.5 * (latest - earliest);
            held += earliest <= day && day <= latest ? 1 : 0;
        }
    }
}
