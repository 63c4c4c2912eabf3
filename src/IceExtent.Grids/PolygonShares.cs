using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;

namespace IceExtent.Grids;

/// <summary>How much of every cell a set of polygons covers.</summary>
/// <remarks>
/// Exact, not sampled: every edge adds the signed area between itself and the right edge of its row, cut at the
/// borders of the cells, and the sum along a row is the share. The work grows with the number of borders that the
/// edges cross, so that cells wholly inside or outside cost one addition. Checked against the intersection of each
/// cell with the polygons (see <c>PolygonSharesTests</c>).
/// </remarks>
public static class PolygonShares
{
    /// <summary>Shares nearer than this to 0 or 1 are taken for it: they are rounding, not area.</summary>
    private const double Rounding = 1e-9;

    /// <summary>Computes the share of every cell.</summary>
    /// <param name="frame">The grid on the map plane.</param>
    /// <param name="polygons">
    /// A valid polygon or set of polygons on the map plane, in m, such as <see cref="MapPlanePolygons.Project"/> gives;
    /// no two of them overlap. Points and lines in it cover nothing.
    /// </param>
    /// <returns>One share a cell, row-major, row 0 at the top. Range: 0 to 1. None missing.</returns>
    public static double[] Compute(GridFrame frame, Geometry polygons)
    {
        ArgumentNullException.ThrowIfNull(frame);
        ArgumentNullException.ThrowIfNull(polygons);
        Accumulator accumulator = new(frame);
        foreach (Geometry part in PolygonExtracter.GetPolygons(polygons))
        {
            Add(accumulator, (Polygon)part);
        }

        return accumulator.Shares();
    }

    private static void Add(Accumulator accumulator, Polygon polygon)
    {
        if (polygon.IsEmpty)
        {
            return;
        }

        Add(accumulator, polygon.Shell, hole: false);
        foreach (LinearRing hole in polygon.Holes)
        {
            Add(accumulator, hole, hole: true);
        }
    }

    // The sign of an edge says on which side of it the inside lies; it is turned for holes and for rings that run the other way.
    private static void Add(Accumulator accumulator, LinearRing ring, bool hole)
    {
        double sign = ring.IsCCW != hole ? 1.0 : -1.0;
        CoordinateSequence points = ring.CoordinateSequence;
        for (int point = 1; point < points.Count; point++)
        {
            accumulator.AddEdge(
                points.GetX(point - 1), points.GetY(point - 1), points.GetX(point), points.GetY(point), sign);
        }
    }

    private sealed class Accumulator(GridFrame frame)
    {
        private readonly double[] change = new double[frame.Rows * frame.Columns];

        public void AddEdge(double startX, double startY, double endX, double endY, double sign)
        {
            // In units of cells: columns to the right from the left edge, rows down from the top edge.
            double startColumn = (startX - frame.LeftMeters) / frame.CellMeters;
            double endColumn = (endX - frame.LeftMeters) / frame.CellMeters;
            double startRow = (frame.TopMeters - startY) / frame.CellMeters;
            double endRow = (frame.TopMeters - endY) / frame.CellMeters;
            if (startRow > endRow)
            {
                (startColumn, endColumn) = (endColumn, startColumn);
                (startRow, endRow) = (endRow, startRow);
                sign = -sign;
            }

            double from = Math.Max(startRow, 0.0);
            double to = Math.Min(endRow, frame.Rows);
            if (from >= to)
            {
                return; // Level, or wholly above or below the grid.
            }

            double slope = (endColumn - startColumn) / (endRow - startRow);
            double top = from;
            double topColumn = startColumn + ((top - startRow) * slope);
            for (int row = (int)from; top < to; row++)
            {
                double bottom = Math.Min(row + 1, to);
                double bottomColumn = bottom == endRow ? endColumn : startColumn + ((bottom - startRow) * slope);
                AddPiece(row, topColumn, bottomColumn, sign * (bottom - top));
                (top, topColumn) = (bottom, bottomColumn);
            }
        }

        /// <summary>The sum along each row of what the edges added.</summary>
        public double[] Shares()
        {
            for (int row = 0; row < frame.Rows; row++)
            {
                double share = 0.0;
                foreach (ref double cell in change.AsSpan(row * frame.Columns, frame.Columns))
                {
                    share += cell;
                    cell = share < Rounding ? 0.0 : share > 1.0 - Rounding ? 1.0 : share;
                }
            }

            return change;
        }

        // A piece of an edge inside one row; height is signed, in rows.
        private void AddPiece(int row, double startColumn, double endColumn, double height)
        {
            Span<double> cells = change.AsSpan(row * frame.Columns, frame.Columns);
            (double left, double right) = startColumn < endColumn ? (startColumn, endColumn) : (endColumn, startColumn);
            if (left >= frame.Columns)
            {
                return; // Covers nothing to its left.
            }

            if (right <= 0.0)
            {
                cells[0] += height; // Covers the whole row.
                return;
            }

            double perColumn = right > left ? height / (right - left) : 0.0;
            double start = Math.Max(left, 0.0);
            cells[0] += (start - left) * perColumn; // What lies left of the grid covers the row up to that edge.
            for (int column = (int)start; column < frame.Columns; column++)
            {
                double end = Math.Min(column + 1.0, right);
                double part = right > left ? (end - start) * perColumn : height;
                AddWithinCell(cells, column, (0.5 * (start + end)) - column, part);
                if (end >= right)
                {
                    break;
                }

                start = end;
            }
        }

        // The cell is covered to the right of the edge's middle, the cells after it wholly.
        private static void AddWithinCell(Span<double> cells, int column, double middle, double height)
        {
            cells[column] += height * (1.0 - middle);
            if (column + 1 < cells.Length)
            {
                cells[column + 1] += height * middle;
            }
        }
    }
}
