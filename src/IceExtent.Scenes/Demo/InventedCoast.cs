using IceExtent.Grids;
using IceExtent.Scenes.Fields;

namespace IceExtent.Scenes.Demo;

/// <summary>Draws the coasts of the invented sea: a rough plan of land and water, broken up by a fractal field.</summary>
/// <remarks>
/// Height is a signed distance in km to the plan's shores plus the field, so that shores wander as natural ones do at
/// every scale. It is worked out on 4 × 4 points a cell; the share of them above zero is the land share of the cell.
/// </remarks>
internal static class InventedCoast
{
    private const int PointsPerCell = 4;
    private const double RuggednessKilometers = 110.0;
    private const double WarpKilometers = 150.0;
    private const float OceanBelow = 0.5f;
    private const ulong Key = 8; // Chosen by eye among a dozen: an archipelago, a strait, gulfs.

    /// <summary>The land share of every cell. The ocean is in one piece.</summary>
    public static LandShare Draw(Grid grid)
    {
        GridFrame frame = grid.Frame;
        GridFrame fine = new(
            frame.Columns * PointsPerCell, frame.Rows * PointsPerCell, frame.CellMeters / PointsPerCell, frame.LeftMeters, frame.TopMeters);
        float[] roughness = Field(fine, 1, new(230_000.0, double.PositiveInfinity, 6, 0.72));
        float[] warpX = Field(fine, 2, new(500_000.0, double.PositiveInfinity, 3, 0.5));
        float[] warpY = Field(fine, 3, new(500_000.0, double.PositiveInfinity, 3, 0.5));

        float[] share = new float[frame.Rows * frame.Columns];
        for (int row = 0; row < fine.Rows; row++)
        {
            double y = (fine.TopMeters - ((row + 0.5) * fine.CellMeters)) / 1000.0;
            for (int column = 0; column < fine.Columns; column++)
            {
                double x = (fine.LeftMeters + ((column + 0.5) * fine.CellMeters)) / 1000.0;
                int point = (row * fine.Columns) + column;
                double height = InventedPlan.Height(x + (WarpKilometers * warpX[point]), y + (WarpKilometers * warpY[point]))
                    + (RuggednessKilometers * roughness[point]);
                if (height > 0.0)
                {
                    share[(row / PointsPerCell * frame.Columns) + (column / PointsPerCell)] += 1f / (PointsPerCell * PointsPerCell);
                }
            }
        }

        CloseOff(share, frame);
        return new(share);
    }

    private static float[] Field(GridFrame fine, long purpose, FieldShape shape)
    {
        float[] plane = new float[fine.Rows * fine.Columns];
        new SmoothField(shape, Draws.Key(Key, purpose), fine).AddTo(0.0, 1.0, new(fine.Rows, fine.Columns), plane);
        return plane;
    }

    // Waters that do not reach the sea round the pole become land.
    private static void CloseOff(float[] share, GridFrame frame)
    {
        bool[] reached = new bool[share.Length];
        Stack<int> open = new();
        int start = (frame.Rows / 2 * frame.Columns) + (frame.Columns / 2);
        reached[start] = true;
        open.Push(start);
        while (open.TryPop(out int cell))
        {
            int column = cell % frame.Columns;
            Visit(column > 0, cell - 1);
            Visit(column < frame.Columns - 1, cell + 1);
            Visit(cell >= frame.Columns, cell - frame.Columns);
            Visit(cell < share.Length - frame.Columns, cell + frame.Columns);
        }

        for (int cell = 0; cell < share.Length; cell++)
        {
            share[cell] = share[cell] < OceanBelow && !reached[cell] ? 1f : share[cell];
        }

        void Visit(bool inside, int next)
        {
            if (inside && !reached[next] && share[next] < OceanBelow)
            {
                reached[next] = true;
                open.Push(next);
            }
        }
    }
}
