using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.Observation;

/// <summary>Pieces of single passes that never reached the ground: oblong stripes across the grid.</summary>
internal sealed class LostPasses
{
    private const double DefaultWidthMeters = 700_000.0; // Where the swath is not given.

    private readonly CoverageParameters parameters;
    private readonly Grid grid;
    private readonly ulong key;

    public LostPasses(CoverageParameters parameters, Grid grid, ulong key) =>
        (this.parameters, this.grid, this.key) = (parameters, grid, key);

    /// <summary>Marks the cells of a day that lie in a lost piece.</summary>
    public void Mark(DateOnly day, Span<bool> lost)
    {
        ulong dayKey = Draws.Key(key, day.DayNumber);
        if (Draws.Unit(dayKey) >= parameters.LostPassDayShare)
        {
            return;
        }

        GridFrame frame = grid.Frame;
        double middleX = frame.LeftMeters + (frame.Columns * frame.CellMeters * (0.2 + (0.6 * Draws.Unit(Draws.Key(dayKey, 1)))));
        double middleY = frame.TopMeters - (frame.Rows * frame.CellMeters * (0.2 + (0.6 * Draws.Unit(Draws.Key(dayKey, 2)))));
        double angle = Math.PI * Draws.Unit(Draws.Key(dayKey, 3));
        (double sine, double cosine) = Math.SinCos(angle);
        double halfLength = parameters.LostPassKilometers * 500.0;
        double halfWidth = (parameters.SwathKilometers > 0.0 ? parameters.SwathKilometers * 1000.0 : DefaultWidthMeters)
            * 0.5 * (0.15 + (0.25 * Draws.Unit(Draws.Key(dayKey, 4)))); // Neighbouring passes see the rest.
        for (int row = 0; row < frame.Rows; row++)
        {
            double y = grid.RowCenterMeters(row) - middleY;
            for (int column = 0; column < frame.Columns; column++)
            {
                double x = grid.ColumnCenterMeters(column) - middleX;
                if (Math.Abs((x * cosine) + (y * sine)) <= halfLength && Math.Abs((y * cosine) - (x * sine)) <= halfWidth)
                {
                    lost[(row * frame.Columns) + column] = true;
                }
            }
        }
    }
}
