namespace IceExtent.Retrieval;

/// <summary>One day's pure surfaces.</summary>
/// <param name="Tuning">What methods are tuned with.</param>
/// <param name="State">Where the tie points come from.</param>
/// <param name="Estimates">Every tie point in use, with its standard error.</param>
public sealed record TunedDay(HemisphereTuning Tuning, TiePointState State, IReadOnlyList<TiePointEstimate> Estimates);

/// <summary>Moves a sensor's tie points to where the samples of a window of days lie.</summary>
/// <remarks>
/// Open water moves to the centre of its samples. Each ice surface moves to the nearest point on the ice line through the centre of
/// closed ice, so that mixtures of ice types stay at full concentration and types stay near their old share. Source: [Tonboe2016],
/// [Lavergne2019]; how first-year and multiyear points follow the line is our own.
/// </remarks>
public static class MovingTiePoints
{
    private static readonly Channel[] RatioSpace = [Channel.V19, Channel.H19, Channel.V37];

    /// <summary>Tunes one day.</summary>
    /// <param name="own">The sensor's own surfaces.</param>
    /// <param name="window">The samples of every day of the window that was observed, in date order.</param>
    /// <param name="rules">How tie points follow.</param>
    public static TunedDay Tune(HemisphereTuning own, IReadOnlyList<DaySamples> window, TuningRules rules)
    {
        ArgumentNullException.ThrowIfNull(own);
        ArgumentNullException.ThrowIfNull(window);
        ArgumentNullException.ThrowIfNull(rules);
        SurfaceMoments[] waterDays = [.. window.Select(day => day.OpenWater).Where(day => day.Count > 0)];
        SurfaceMoments[] iceDays = [.. window.Select(day => day.ClosedIce).Where(day => day.Count > 0)];
        SurfaceMoments? water = rules.Suffice(waterDays) ? SurfaceMoments.Merge(waterDays) : null;
        SurfaceMoments? ice = rules.Suffice(iceDays) ? SurfaceMoments.Merge(iceDays) : null;
        HemisphereTuning tuning = own with
        {
            TiePoints = Moved(own.TiePoints, water, ice, rules),
            Surfaces = own.Surfaces is { } surfaces ? Moved(surfaces, water, ice, rules) : null,
            Polarization89 = own.Polarization89 is { } points ? Moved(points, water, ice) : null,
            Samples = water is null || ice is null ? null : Samples(own, water, ice, rules),
        };
        TiePointState state = (water, ice) switch
        {
            (null, null) => TiePointState.TooFewSamples,
            (_, null) => TiePointState.MovingWater,
            (null, _) => TiePointState.MovingIce,
            _ => TiePointState.Moving,
        };
        return state == TiePointState.TooFewSamples || IsSolvable(tuning)
            ? new(tuning, state, [.. Estimates(tuning, (waterDays, water), (iceDays, ice))])
            : new(own, TiePointState.NoSolution, [.. Estimates(own, (waterDays, null), (iceDays, null))]);
    }

    // Whether every method that the sensor is tuned for has a solution: samples of one and the same surface leave none.
    private static bool IsSolvable(HemisphereTuning tuning)
    {
        try
        {
            foreach (string name in ConcentrationMethods.Names)
            {
                _ = ConcentrationMethods.TryCreate(name, tuning, Grids.Hemisphere.North);
            }

            return true;
        }
        catch (ArgumentException)
        {
            return false;
        }
    }

    private static TiePoints Moved(TiePoints own, SurfaceMoments? water, SurfaceMoments? ice, TuningRules rules)
    {
        ChannelKelvins first = Surface(own.FirstYear);
        ChannelKelvins multi = Surface(own.Multiyear);
        if (ice is not null)
        {
            (first, multi) = OntoLine(first, multi, ice, RatioSpace, rules);
        }

        return new(water is null ? own.OpenWater : Point(water.Center), Point(first), Point(multi));
    }

    private static SurfacePoints Moved(SurfacePoints own, SurfaceMoments? water, SurfaceMoments? ice, TuningRules rules)
    {
        bool held = (water ?? ice) is { } any && LeastScatterAxis.Space.All(any.Channels.Contains);
        if (!held)
        {
            return own;
        }

        (ChannelKelvins first, ChannelKelvins multi) = ice is null
            ? (own.FirstYear, own.Multiyear)
            : OntoLine(own.FirstYear, own.Multiyear, ice, LeastScatterAxis.Space, rules);
        return new(water is null ? own.OpenWater : water.Center, first, multi);
    }

    private static PolarizationPoints Moved(PolarizationPoints own, SurfaceMoments? water, SurfaceMoments? ice)
    {
        return new(Difference(water) ?? own.WaterKelvins, Difference(ice) ?? own.IceKelvins);

        static double? Difference(SurfaceMoments? samples) =>
            samples is not null && samples.Channels.Contains(Channel.V89) && samples.Channels.Contains(Channel.H89)
                ? samples.MeanKelvins(Channel.V89) - samples.MeanKelvins(Channel.H89)
                : null;
    }

    private static PureSamples? Samples(HemisphereTuning own, SurfaceMoments water, SurfaceMoments ice, TuningRules rules) =>
        own.Surfaces is { } surfaces && LeastScatterAxis.Space.All(ice.Channels.Contains)
            ? new(water, ice, IceDirection.Of(ice, LeastScatterAxis.Space, Apart(surfaces.FirstYear, surfaces.Multiyear, LeastScatterAxis.Space), rules.LeastElongation), rules.Blend)
            : null;

    private static (ChannelKelvins FirstYear, ChannelKelvins Multiyear) OntoLine(
        ChannelKelvins firstYear, ChannelKelvins multiyear, SurfaceMoments ice, IReadOnlyList<Channel> space, TuningRules rules)
    {
        double[] direction = IceDirection.Of(ice, space, Apart(firstYear, multiyear, space), rules.LeastElongation);
        return (Nearest(firstYear), Nearest(multiyear));

        ChannelKelvins Nearest(ChannelKelvins surface)
        {
            double along = space.Select((channel, axis) => direction[axis] * (surface[channel] - ice.MeanKelvins(channel))).Sum();
            return new(space.Select((channel, axis) => (channel, ice.MeanKelvins(channel) + (along * direction[axis]))).ToDictionary(pair => pair.channel, pair => pair.Item2));
        }
    }

    private static double[] Apart(ChannelKelvins firstYear, ChannelKelvins multiyear, IReadOnlyList<Channel> space) =>
        [.. space.Select(channel => firstYear[channel] - multiyear[channel])];

    private static ChannelKelvins Surface(TiePoint point) => new(new Dictionary<Channel, double>
    {
        [Channel.V19] = point.V19Kelvins,
        [Channel.H19] = point.H19Kelvins,
        [Channel.V37] = point.V37Kelvins,
    });

    private static TiePoint Point(ChannelKelvins surface) => new(surface[Channel.V19], surface[Channel.H19], surface[Channel.V37]);

    private static IEnumerable<TiePointEstimate> Estimates(
        HemisphereTuning tuning, (SurfaceMoments[] Days, SurfaceMoments? Used) water, (SurfaceMoments[] Days, SurfaceMoments? Used) ice)
    {
        IEnumerable<TiePointEstimate> all = Of(PureSurface.OpenWater, IceSurfaces.OpenWater(tuning), water.Days, water.Used);
        if (ice.Used is { } center)
        {
            all = all.Concat(Of(PureSurface.ClosedIce, center.Center, ice.Days, center));
        }

        return all
            .Concat(Of(PureSurface.FirstYear, IceSurfaces.FirstYear(tuning), ice.Days, ice.Used))
            .Concat(Of(PureSurface.Multiyear, IceSurfaces.Multiyear(tuning), ice.Days, ice.Used));
    }

    private static IEnumerable<TiePointEstimate> Of(PureSurface surface, ChannelKelvins points, SurfaceMoments[] days, SurfaceMoments? used)
    {
        long samples = days.Sum(day => day.Count);
        foreach (Channel channel in ChannelNames.All.Where(points.Has))
        {
            bool moved = used is not null && used.Channels.Contains(channel);
            double? scatter = moved ? Math.Sqrt(used!.Covariance(channel, channel)) : null;
            yield return new(surface, channel, points[channel], scatter is { } spread ? CenterError.Of(days, channel, spread) : null, scatter, samples, days.Length);
        }
    }
}
