using System.Numerics;
using IceExtent.Grids;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Parameters;
using static System.Numerics.Vector;

namespace IceExtent.Scenes.World;

/// <summary>The true ice of every cell on any day.</summary>
internal sealed class IceCover
{
    private const double KilometersToMeters = 1000.0;

    // Cracks lie where the lead field is near zero: within this many standard deviations.
    private const float CrackHalfWidth = 0.6f;

    // The mean of (1 − |n|/0.6)² over a normal n, zero outside: makes the mean share of cracks come out as given.
    private const float MeanCrack = 0.157f;

    // This share of the open water is spread in patches, the rest lies in cracks.
    private const float PatchyShare = 0.4f;

    private const double StirLifeDays = 60.0;
    private const double LeadDriftMetersPerDay = 4_000.0;
    private const double DaysPerYear = 365.25;

    private readonly IceParameters parameters;
    private readonly SmoothField yearly;
    private readonly SmoothField wander;
    private readonly SmoothField leads;
    private readonly SmoothField stirring;
    private readonly float[] standing;
    private readonly float[] coast;

    public IceCover(IceParameters parameters, SeasonClock clock, Grid grid, LandShare land, ulong key)
    {
        this.parameters = parameters;
        Clock = clock;
        GridFrame frame = grid.Frame;
        yearly = new(new(parameters.YearlyNodeKilometers * KilometersToMeters, DaysPerYear, 1, 1.0), Draws.Key(key, 1), frame);
        wander = new(
            new(parameters.WanderNodeKilometers * KilometersToMeters, parameters.WanderLifeDays, 4, 0.6), Draws.Key(key, 2), frame);
        leads = new(
            new(parameters.LeadNodeKilometers * KilometersToMeters, parameters.LeadLifeDays, 2, 0.5, LeadDriftMetersPerDay), Draws.Key(key, 3), frame);
        stirring = new(new(parameters.WanderNodeKilometers * KilometersToMeters, StirLifeDays, 4, 0.6), Draws.Key(key, 4), frame);
        standing = Standing(grid, Draws.Key(key, 5));
        coast = Coast(grid, land);
    }

    public SeasonClock Clock { get; }

    /// <summary>Writes depth inside the edge, first-year and multiyear ice of every cell.</summary>
    /// <param name="time">In days, on the scale of <see cref="DateOnly.DayNumber"/>.</param>
    /// <param name="scratch">Room of the same grid.</param>
    /// <param name="room">Two padded planes; overwritten.</param>
    /// <param name="cells">Receives the ice.</param>
    public void Fill(double time, FieldScratch scratch, (float[] First, float[] Second) room, CellPlanes cells)
    {
        double summer = Clock.Summerness(time);
        FillDepth(time, summer, scratch, cells.DepthDegrees);
        FillOldShare(time, scratch, room, cells.Multiyear);

        float[] crackField = room.First;
        crackField.AsSpan().Clear();
        leads.AddTo(time, 1.0, scratch, crackField);

        float width = (float)Between(parameters.WinterEdgeWidthDegrees, parameters.SummerEdgeWidthDegrees, summer);
        float open = (float)Between(parameters.WinterLeadShare, parameters.SummerLeadShare, summer * summer); // Leads freeze over early.
        Mix(cells, (crackField, room.Second), 1f / width, open);
    }

    private static double Between(double winter, double summer, double summerness) =>
        winter + ((summer - winter) * summerness);

    private static void Mix(CellPlanes cells, (float[] Cracks, float[] Patches) fields, float inverseWidth, float open)
    {
        Vector<float> patchy = new(open * PatchyShare / 2f); // The mean of (1 + n)² over a normal n is 2.
        Vector<float> cracked = new(open * (1f - PatchyShare) / MeanCrack);
        for (int cell = 0; cell < cells.Length; cell += Vector<float>.Count)
        {
            Vector<float> pack = PlaneMath.SmoothStep(new Vector<float>(cells.DepthDegrees, cell) * inverseWidth);
            Vector<float> crack = Max(
                Vector<float>.One - (Abs(new Vector<float>(fields.Cracks, cell)) * (1f / CrackHalfWidth)), Vector<float>.Zero);
            Vector<float> patch = Vector<float>.One + new Vector<float>(fields.Patches, cell);
            Vector<float> openWater = Min((patchy * patch * patch) + (cracked * crack * crack), Vector<float>.One);
            Vector<float> ice = pack * (Vector<float>.One - openWater);
            Vector<float> multiyear = ice * new Vector<float>(cells.Multiyear, cell);
            multiyear.CopyTo(cells.Multiyear, cell);
            (ice - multiyear).CopyTo(cells.FirstYear, cell);
        }
    }

    private void FillDepth(double time, double summer, FieldScratch scratch, float[] depth)
    {
        FillPotential(time, summer, Clock.EdgeDegrees(time), scratch, depth);
        wander.AddTo(time, parameters.WanderSpreadDegrees, scratch, depth);
    }

    // The share of the ice that is multiyear: high where the last minimum left ice.
    private void FillOldShare(double time, FieldScratch scratch, (float[] First, float[] Second) room, float[] share)
    {
        (int year, double weight) = Clock.OldIceAt(time);
        room.Second.AsSpan().Clear();
        stirring.AddTo(time, 1.0, scratch, room.Second);
        share.AsSpan().Clear();
        AddSurvivors(year, weight, scratch, room, share);
        if (weight < 1.0)
        {
            AddSurvivors(year - 1, 1.0 - weight, scratch, room, share);
        }
    }

    private void AddSurvivors(int year, double weight, FieldScratch scratch, (float[] First, float[] Second) room, float[] share)
    {
        SeasonClock.Turn minimum = Clock.Minimum(year);
        FillPotential(minimum.Time, 1.0, minimum.EdgeDegrees, scratch, room.First);
        Vector<float> factor = new((float)(weight * parameters.HighestMultiyearShare));
        float inverseWidth = (float)(1.0 / parameters.MultiyearWidthDegrees);
        float stir = (float)parameters.MultiyearStirDegrees;
        for (int cell = 0; cell < share.Length; cell += Vector<float>.Count)
        {
            Vector<float> depth = new Vector<float>(room.First, cell) + (new Vector<float>(room.Second, cell) * stir);
            (new Vector<float>(share, cell) + (factor * PlaneMath.SmoothStep(depth * inverseWidth))).CopyTo(share, cell);
        }
    }

    private void FillPotential(double time, double summer, double edgeDegrees, FieldScratch scratch, float[] depth)
    {
        float coastFactor = (float)Between(parameters.CoastWinterDegrees, parameters.CoastSummerDegrees, summer);
        Vector<float> edge = new((float)edgeDegrees);
        for (int cell = 0; cell < depth.Length; cell += Vector<float>.Count)
        {
            (new Vector<float>(standing, cell) + (new Vector<float>(coast, cell) * coastFactor) - edge).CopyTo(depth, cell);
        }

        yearly.AddTo(time, parameters.YearlySpreadDegrees, scratch, depth);
    }

    private float[] Standing(Grid grid, ulong key)
    {
        float[] plane = new float[PlaneMath.PaddedLength(grid.CellCount)];
        SmoothField bumps = new(
            new(parameters.StandingNodeKilometers * KilometersToMeters, double.PositiveInfinity, 3, 0.5), key, grid.Frame);
        bumps.AddTo(0.0, parameters.StandingSpreadDegrees, new(grid.Rows, grid.Columns), plane);

        ReadOnlySpan<double> latitudes = grid.LatitudesDegrees;
        for (int cell = 0; cell < grid.CellCount; cell++)
        {
            plane[cell] += (float)Math.Abs(latitudes[cell]);
        }

        foreach (WarmInflow inflow in parameters.WarmInflows)
        {
            MapPosition middle = grid.Projection.Forward(new(inflow.LatitudeDegrees, inflow.LongitudeDegrees));
            double reach = inflow.ReachKilometers * KilometersToMeters;
            for (int cell = 0; cell < grid.CellCount; cell++)
            {
                MapPosition at = grid.CenterOf(cell);
                double x = (at.XMeters - middle.XMeters) / reach;
                double y = (at.YMeters - middle.YMeters) / reach;
                plane[cell] -= (float)(inflow.StrengthDegrees * Math.Exp(-0.5 * ((x * x) + (y * y))));
            }
        }

        return plane;
    }

    // 0 far from land, 1 at a straight coast, up to 2 in a narrow gulf.
    private float[] Coast(Grid grid, LandShare land)
    {
        float[] plane = new float[PlaneMath.PaddedLength(grid.CellCount)];
        land.Fraction.CopyTo(plane);
        SeparableBlur blur = new(parameters.CoastReachKilometers * KilometersToMeters / grid.Frame.CellMeters);
        Span<float> inside = plane.AsSpan(0, grid.CellCount);
        blur.Smear(inside, grid.Columns, new float[grid.CellCount], inside);
        for (int cell = 0; cell < inside.Length; cell++)
        {
            inside[cell] *= 2f;
        }

        return plane;
    }
}
