using System.Numerics;
using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;
using static System.Numerics.Vector;

namespace IceExtent.Scenes.World;

/// <summary>The melt season of every cell where one is imposed: when its ice turns wet, and when it is dry again.</summary>
/// <remarks>
/// Both days follow from latitude and a smooth field that is drawn anew for each year. The weather still moves the wetness,
/// but never over one half: the first and the last wet day are those of the season.
/// </remarks>
internal sealed class MeltSeason
{
    private const float MeltingKelvins = 273.15f;
    private const double YearApart = 1_000.0; // Days on the field's own scale; its features live for one, so years have nothing in common.

    private readonly MeltSeasonParameters parameters;
    private readonly SmoothField onsets;
    private readonly SmoothField freezes;
    private readonly float[] beyondSixty;
    private readonly float wetKelvins;

    public MeltSeason(MeltSeasonParameters parameters, double freezingKelvins, double airShareInIce, Grid grid, ulong key)
    {
        this.parameters = parameters;
        FieldShape shape = new(parameters.NodeKilometers * 1_000.0, LifeDays: 1.0, Octaves: 2, Roughness: 0.5);
        onsets = new(shape, Draws.Key(key, 1), grid.Frame);
        freezes = new(shape, Draws.Key(key, 2), grid.Frame);
        wetKelvins = (float)(freezingKelvins + (airShareInIce * (MeltingKelvins - freezingKelvins)));
        beyondSixty = new float[PlaneMath.PaddedLength(grid.CellCount)];
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            beyondSixty[cell] = (float)(Math.Abs(grid.LatitudesDegrees[cell]) - 60.0);
        }
    }

    /// <summary>Writes when the ice turns wet and dry in the season that begins in a calendar year.</summary>
    /// <param name="year">The year.</param>
    /// <param name="scratch">Room of the grid.</param>
    /// <param name="onset">Receives days after noon of 1 January of that year. Shape: padded.</param>
    /// <param name="freeze">The same.</param>
    public void FillTurns(int year, FieldScratch scratch, float[] onset, float[] freeze)
    {
        int freezeDay = parameters.FreezeDayOfYear > parameters.OnsetDayOfYear
            ? parameters.FreezeDayOfYear
            : parameters.FreezeDayOfYear + (DateTime.IsLeapYear(year) ? 366 : 365);
        FillTurn(onsets, year, parameters.OnsetDayOfYear - 1, parameters.OnsetDaysPerDegree, scratch, onset);
        FillTurn(freezes, year, freezeDay - 1, parameters.FreezeDaysPerDegree, scratch, freeze);
    }

    /// <summary>Puts the season over what the weather makes of the ice's surface.</summary>
    /// <param name="time">In days, on the scale of <see cref="DateOnly.DayNumber"/>.</param>
    /// <param name="scratch">Room of the grid.</param>
    /// <param name="room">Two padded planes; overwritten.</param>
    /// <param name="cells">Wetness, ponds and the temperature of ice are changed.</param>
    public void Impose(double time, FieldScratch scratch, (float[] Onset, float[] Freeze) room, CellPlanes cells)
    {
        int year = DateOnly.FromDayNumber((int)time).Year;
        if (parameters.FreezeDayOfYear < parameters.OnsetDayOfYear && DateOnly.FromDayNumber((int)time).DayOfYear < MiddleOfWinter)
        {
            year--;
        }

        FillTurns(year, scratch, room.Onset, room.Freeze);
        Vector<float> now = new((float)(time - NoonOfNewYear(year))), perDay = new((float)(1.0 / parameters.TurnDays)), half = new(0.5f);
        Vector<float> early = new((float)parameters.EarlyMeltShare), refreeze = new((float)parameters.RefreezeShare);
        for (int cell = 0; cell < cells.Length; cell += Vector<float>.Count)
        {
            Vector<float> wet = PlaneMath.SmoothStep(((now - new Vector<float>(room.Onset, cell)) * perDay) + half)
                * PlaneMath.SmoothStep(((new Vector<float>(room.Freeze, cell) - now) * perDay) + half);
            Vector<float> mild = new(cells.Wetness, cell);

            // Outside the season 0 to the early share, inside one less the refreeze share to 1.
            Vector<float> inside = Vector<float>.One - (refreeze * (Vector<float>.One - mild));
            Vector<float> outside = early * mild;
            Vector<float> wetness = outside + (wet * (inside - outside));
            wetness.CopyTo(cells.Wetness, cell);
            (new Vector<float>(cells.PondShare, cell) * wet).CopyTo(cells.PondShare, cell);
            Vector<float> ice = new(cells.IceKelvins, cell);
            (ice + (wetness * Max(new Vector<float>(wetKelvins) - ice, Vector<float>.Zero))).CopyTo(cells.IceKelvins, cell);
        }
    }

    /// <summary>The first whole day whose noon is not before a turn.</summary>
    public static int DayNumberOf(int year, float turn) => new DateOnly(year, 1, 1).DayNumber + (int)Math.Ceiling(turn);

    // Half-way between the freeze and the next onset, where the season runs over the end of the year.
    private int MiddleOfWinter => (parameters.OnsetDayOfYear + parameters.FreezeDayOfYear) / 2;

    private static double NoonOfNewYear(int year) => new DateOnly(year, 1, 1).DayNumber + 0.5;

    private void FillTurn(SmoothField field, int year, double dayAtSixty, double daysPerDegree, FieldScratch scratch, float[] turn)
    {
        Vector<float> base60 = new((float)dayAtSixty);
        for (int cell = 0; cell < turn.Length; cell += Vector<float>.Count)
        {
            (base60 + (new Vector<float>(beyondSixty, cell) * (float)daysPerDegree)).CopyTo(turn, cell);
        }

        field.AddTo(year * YearApart, parameters.SpreadDays, scratch, turn);
    }
}
