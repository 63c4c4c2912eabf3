namespace IceExtent.Retrieval.Tests.Filling;

/// <summary>Days in a row, of a few cells each; day 0 is the one that is filled. Half of the ice is multiyear.</summary>
internal sealed class DayStack
{
    public const float CellError = 0.05f;
    private readonly SortedDictionary<int, ConcentrationPlanes> days = [];
    private readonly DayFilling filling;

    /// <summary>Days of one cell; NaN is a cell without an observation.</summary>
    public DayStack(DayFillingRules rules, params (int Offset, double Total)[] days)
        : this(rules, 1, days.ToDictionary(day => day.Offset, day => new[] { day.Total }))
    {
    }

    /// <summary>Days of several cells.</summary>
    public DayStack(DayFillingRules rules, int cells, IReadOnlyDictionary<int, double[]> totals)
    {
        filling = new(rules);
        Sources = new(cells);
        foreach ((int offset, double[] values) in totals)
        {
            days[offset] = Planes(values);
        }
    }

    public ConcentrationPlanes Today => days[0];

    public SourceDays Sources { get; }

    public ConcentrationPlanes At(int offset) => days[offset];

    public int Fill() =>
        filling.Fill(Today, [.. days.Where(day => day.Key != 0).Select(day => new NearDay(day.Key, day.Value))], Sources);

    private static ConcentrationPlanes Planes(double[] totals)
    {
        ConcentrationPlanes planes = new(totals.Length);
        for (int cell = 0; cell < totals.Length; cell++)
        {
            float total = (float)totals[cell];
            planes.Total[cell] = total;
            planes.Multiyear[cell] = total / 2f;
            planes.FirstYear[cell] = total - (total / 2f);
            planes.StandardError[cell] = float.IsNaN(total) ? float.NaN : CellError;
            planes.Conditions[cell] = float.IsNaN(total) ? CellConditions.NoObservation : CellConditions.None;
        }

        return planes;
    }
}
