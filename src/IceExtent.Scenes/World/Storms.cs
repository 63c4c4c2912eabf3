using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;

namespace IceExtent.Scenes.World;

/// <summary>What travelling storms bring to every cell at one time.</summary>
internal sealed class StormPlanes(int cellCount)
{
    /// <summary>Added wind, in m/s.</summary>
    public float[] Wind { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    /// <summary>Added to the logarithm of vapor.</summary>
    public float[] VaporLog { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    /// <summary>Added cloud liquid, in mm.</summary>
    public float[] Cloud { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    /// <summary>Added air temperature, in K.</summary>
    public float[] Warming { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    /// <summary>The same on the nodes of a coarse lattice: wind, vapor, cloud, warming one after another.</summary>
    public float[] Nodes { get; set; } = [];
}

/// <summary>Travelling storms: a ring of wind, a warm moist sector towards the equator, and a comma of cloud.</summary>
/// <remarks>
/// Each day of the calendar has its own births, so the storms of any day can be found without those before it. They are
/// painted on a coarse lattice and stretched smoothly over the grid.
/// </remarks>
internal sealed class Storms
{
    private const double NodeMeters = 100_000.0;
    private const double Reach = 3.0;           // In radii; beyond it a storm does nothing.
    private const double NearestPoleMeters = 150_000.0;
    private const double PolewardShare = 0.25;

    private readonly StormParameters parameters;
    private readonly Grid grid;
    private readonly ulong key;

    public Storms(StormParameters parameters, Grid grid, ulong key) =>
        (this.parameters, this.grid, this.key) = (parameters, grid, key);

    /// <summary>Writes what the storms bring.</summary>
    /// <param name="time">In days, on the scale of <see cref="DateOnly.DayNumber"/>.</param>
    /// <param name="vigor">How strong all storms are, 0 to 1.</param>
    /// <param name="scratch">Room of the same grid.</param>
    /// <param name="into">Receives the planes.</param>
    public void Fill(double time, double vigor, FieldScratch scratch, StormPlanes into)
    {
        GridFrame frame = grid.Frame;
        scratch.Columns.Place((frame.LeftMeters + (0.5 * frame.CellMeters)) / NodeMeters, frame.CellMeters / NodeMeters);
        scratch.Rows.Place((frame.TopMeters - (0.5 * frame.CellMeters)) / NodeMeters, -frame.CellMeters / NodeMeters);
        int count = scratch.Columns.NodeCount * scratch.Rows.NodeCount;
        if (into.Nodes.Length != 4 * count)
        {
            into.Nodes = new float[4 * count];
        }

        into.Nodes.AsSpan().Clear();
        int today = (int)Math.Floor(time);
        int oldest = today - (int)Math.Ceiling(parameters.LongestLifeDays);
        for (int day = oldest; day <= today; day++)
        {
            for (int birth = 0; birth < parameters.BirthsPerDay; birth++)
            {
                if (StormAt(Draws.Key(Draws.Key(key, day), birth), time - day) is { } storm)
                {
                    Paint(storm, vigor, scratch, into.Nodes);
                }
            }
        }

        Stretch(into.Nodes.AsSpan(0, count), scratch, into.Wind);
        Stretch(into.Nodes.AsSpan(count, count), scratch, into.VaporLog);
        Stretch(into.Nodes.AsSpan(2 * count, count), scratch, into.Cloud);
        Stretch(into.Nodes.AsSpan(3 * count, count), scratch, into.Warming);
    }

    private static void Stretch(ReadOnlySpan<float> nodes, FieldScratch scratch, Span<float> plane)
    {
        nodes.CopyTo(scratch.Lattice());
        plane.Clear();
        scratch.AddStretched(plane);
    }

    // The storm of one birth, or null where it is not alive.
    private Storm? StormAt(ulong birthKey, double sinceMidnight)
    {
        double age = sinceMidnight - Draws.Unit(Draws.Key(birthKey, 0));
        double life = parameters.LongestLifeDays * (0.5 + (0.5 * Draws.Unit(Draws.Key(birthKey, 1))));
        if (age <= 0.0 || age >= life)
        {
            return null;
        }

        double sign = grid.Hemisphere == Hemisphere.North ? 1.0 : -1.0;
        double latitude = parameters.OuterLatitudeDegrees
            + (Draws.Unit(Draws.Key(birthKey, 2)) * (parameters.InnerLatitudeDegrees - parameters.OuterLatitudeDegrees));
        MapPosition start = grid.Projection.Forward(new(sign * latitude, 360.0 * Draws.Unit(Draws.Key(birthKey, 3))));
        double distance = Math.Sqrt((start.XMeters * start.XMeters) + (start.YMeters * start.YMeters));
        double travel = parameters.TravelKilometersPerDay * 1000.0 * age;
        double nearer = Math.Max(distance - (PolewardShare * travel), NearestPoleMeters);

        // East is anticlockwise on a northern map and clockwise on a southern one.
        double angle = Math.Atan2(start.YMeters, start.XMeters) + (sign * 2.0 * travel / (distance + nearer));
        double strength = (0.4 + (0.6 * Draws.Unit(Draws.Key(birthKey, 4)))) * Math.Sin(Math.PI * age / life);
        double size = 0.7 + (0.6 * Draws.Unit(Draws.Key(birthKey, 5)));
        return new(
            nearer * Math.Cos(angle), nearer * Math.Sin(angle), parameters.RadiusKilometers * 1000.0 * size, strength,
            EastX: -sign * Math.Sin(angle), EastY: sign * Math.Cos(angle), PoleX: -Math.Cos(angle), PoleY: -Math.Sin(angle));
    }

    private void Paint(Storm storm, double vigor, FieldScratch scratch, Span<float> nodes)
    {
        int columns = scratch.Columns.NodeCount;
        int rows = scratch.Rows.NodeCount;
        int count = columns * rows;
        double reach = Reach * storm.RadiusMeters;
        (int firstColumn, int lastColumn) = Nodes(storm.X, reach, scratch.Columns);
        (int firstRow, int lastRow) = Nodes(storm.Y, reach, scratch.Rows);
        double strength = vigor * storm.Strength;
        for (int row = firstRow; row <= lastRow; row++)
        {
            double y = (((scratch.Rows.FirstNode + row) * NodeMeters) - storm.Y) / storm.RadiusMeters;
            for (int column = firstColumn; column <= lastColumn; column++)
            {
                double x = (((scratch.Columns.FirstNode + column) * NodeMeters) - storm.X) / storm.RadiusMeters;
                double east = (x * storm.EastX) + (y * storm.EastY);
                double poleward = (x * storm.PoleX) + (y * storm.PoleY);
                double square = (east * east) + (poleward * poleward);
                if (square > Reach * Reach)
                {
                    continue;
                }

                int node = (row * columns) + column;
                double warm = strength * WarmSector(east, poleward);
                nodes[node] += (float)(parameters.WindMetersPerSecond * strength * Ring(square));
                nodes[count + node] += (float)(parameters.VaporLogGain * warm);
                nodes[(2 * count) + node] += (float)(parameters.CloudMillimeters * strength * Comma(east, poleward, square));
                nodes[(3 * count) + node] += (float)(parameters.WarmingKelvins * warm);
            }
        }
    }

    private static (int First, int Last) Nodes(double middle, double reach, CubicAxis axis) => (
        (int)Math.Clamp(Math.Ceiling((middle - reach) / NodeMeters) - axis.FirstNode, 0, axis.NodeCount),
        (int)Math.Clamp(Math.Floor((middle + reach) / NodeMeters) - axis.FirstNode, -1, axis.NodeCount - 1));

    // 1 at one radius, 0 in the middle and far away.
    private static double Ring(double square) => Math.Sqrt(square) * Math.Exp(0.5 * (1.0 - square));

    private static double WarmSector(double east, double poleward)
    {
        double x = east - 0.7;
        double y = poleward + 0.7;
        return Math.Exp(-((x * x) + (y * y)));
    }

    // A spiral arm round a cloudy middle, like a comma.
    private static double Comma(double east, double poleward, double square)
    {
        double turn = Math.Atan2(poleward, east) + (1.1 * Math.Log(Math.Sqrt(square) + 0.15));
        double arm = Math.Max(0.0, Math.Cos(turn - 0.4));
        return (arm * arm * arm * arm * Math.Exp(-square / 4.0)) + (0.6 * Math.Exp(-2.0 * square));
    }

    private readonly record struct Storm(
        double X, double Y, double RadiusMeters, double Strength, double EastX, double EastY, double PoleX, double PoleY);
}
