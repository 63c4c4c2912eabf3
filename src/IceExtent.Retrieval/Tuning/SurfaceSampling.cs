using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>Takes the samples of open water and of closed ice out of one day's brightness temperatures.</summary>
/// <remarks>
/// Closed ice: NASA Team with the sensor's own tie points at or above a limit, inside the edge and away from land. Open water: a belt
/// outside the edge, away from land, without ice. Source: [Lavergne2019], whose belt lies outside a climatology of the edge: here it
/// lies outside the day's own edge. Outliers: <see cref="OutlierTrim"/>. Holds planes: not shared between threads.
/// </remarks>
public sealed class SurfaceSampling
{
    private readonly SampleRules rules;
    private readonly DayRetrieval nasaTeam;
    private readonly double stepMeters;
    private readonly ConcentrationPlanes planes;
    private readonly ChamferDistance distance;
    private readonly int[] fromLand;
    private readonly int[] fromIce;
    private readonly int[] fromWater;
    private readonly bool[] members;
    private readonly List<int> water = [];
    private readonly List<int> ice = [];
    private readonly OutlierTrim waterTrim;
    private readonly OutlierTrim iceTrim;

    /// <summary>Prepares the sampling of one sensor.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="ocean">Whether each cell counts as ocean.</param>
    /// <param name="nasaTeam">The retrieval by NASA Team with the sensor's own tie points and screens.</param>
    /// <param name="tuning">The sensor's own pure surfaces: outliers of ice are told by their distance from the line between them.</param>
    /// <param name="channels">The channels that days have.</param>
    /// <param name="rules">What a sample is.</param>
    public SurfaceSampling(
        Grid grid, ReadOnlySpan<bool> ocean, DayRetrieval nasaTeam, HemisphereTuning tuning, IReadOnlyList<Channel> channels, SampleRules rules)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(nasaTeam);
        ArgumentNullException.ThrowIfNull(tuning);
        ArgumentNullException.ThrowIfNull(rules);
        (this.nasaTeam, this.rules) = (nasaTeam, rules);
        stepMeters = grid.Frame.CellMeters / ChamferDistance.StepsPerCell;
        planes = new(grid.CellCount);
        distance = new(grid);
        (fromLand, fromIce, fromWater) = (new int[grid.CellCount], new int[grid.CellCount], new int[grid.CellCount]);
        members = new bool[grid.CellCount];
        for (int cell = 0; cell < members.Length; cell++)
        {
            members[cell] = !ocean[cell];
        }

        distance.Measure(members, fromLand);
        waterTrim = new(channels.Select(channel => new LinearForm(0.0, (channel, 1.0))), rules.OutlierLimit);
        iceTrim = new(AboveIceLines(tuning, channels), rules.OutlierLimit);
    }

    /// <summary>Takes one day's samples.</summary>
    /// <param name="observed">Brightness temperatures after the range check and the coast correction, in K; only read.</param>
    /// <param name="rangeConditions">What the range check marked.</param>
    public DaySamples Take(BrightnessPlanes observed, ReadOnlySpan<CellConditions> rangeConditions)
    {
        ArgumentNullException.ThrowIfNull(observed);
        nasaTeam.Retrieve(observed, rangeConditions, planes);
        MeasureEdges();
        Choose(observed);
        return new(Of(observed, water, waterTrim), Of(observed, ice, iceTrim));
    }

    private static SurfaceMoments Of(BrightnessPlanes observed, List<int> cells, OutlierTrim trim)
    {
        Span<int> samples = CollectionsMarshal.AsSpan(cells);
        return SurfaceMoments.Of(observed, samples[..trim.Apply(observed, samples)]);
    }

    // First-year and multiyear ice differ by far more than either scatters, so a plain median would drop the rarer one.
    private static IEnumerable<LinearForm> AboveIceLines(HemisphereTuning tuning, IReadOnlyList<Channel> channels)
    {
        (ChannelKelvins firstYear, ChannelKelvins multiyear) = (IceSurfaces.FirstYear(tuning), IceSurfaces.Multiyear(tuning));
        LinearForm abscissa = new(0.0, (Channel.V37, 1.0));
        return channels
            .Where(channel => channel != Channel.V37 && firstYear.Has(channel) && multiyear.Has(channel))
            .Select(channel => IceLine.Through(abscissa, new(0.0, (channel, 1.0)), firstYear, multiyear).AboveLine);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void MeasureEdges()
    {
        Span<float> total = planes.Total;
        float limit = (float)rules.IceFraction;
        for (int cell = 0; cell < members.Length; cell++)
        {
            members[cell] = total[cell] >= limit;
        }

        distance.Measure(members, fromIce);
        for (int cell = 0; cell < members.Length; cell++)
        {
            members[cell] = total[cell] < limit; // Neither land nor an empty cell is water.
        }

        distance.Measure(members, fromWater);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void Choose(BrightnessPlanes observed)
    {
        water.Clear();
        ice.Clear();
        ChannelSet channels = new(observed, [.. observed.Channels], new(0, observed.CellCount));
        (int coast, int edge) = (Steps(rules.CoastMeters), Steps(rules.EdgeMeters));
        (int from, int to) = (Steps(rules.WaterFromMeters), Steps(rules.WaterToMeters));
        Span<float> total = planes.Total;
        for (int cell = 0; cell < total.Length; cell++)
        {
            bool closed = total[cell] >= rules.ClosedIceFraction && fromWater[cell] >= edge;
            bool open = total[cell] < rules.IceFraction && fromIce[cell] >= from && fromIce[cell] <= to;
            if ((closed || open) && fromLand[cell] >= coast && channels.AllPresentAt(cell))
            {
                (closed ? ice : water).Add(cell);
            }
        }
    }

    private int Steps(double meters) => (int)Math.Ceiling(meters / stepMeters);
}
