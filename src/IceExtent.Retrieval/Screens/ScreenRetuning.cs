namespace IceExtent.Retrieval;

/// <summary>Draws the limits of the gradient-ratio screens from pure surfaces, so that they take away little ice and no more.</summary>
/// <remarks>
/// A limit is the gradient ratio of open water mixed with a given fraction of ice, linear in temperature. Source of the
/// rule: [Lavergne2019], from memory (medium). Which ice is our own choice: the closed-ice point whose mixture has the
/// largest ratio, which is first-year ice with usual surfaces. The ratio of any mixture of ice points lies between theirs,
/// and it falls as ice grows, so no mixture with more ice than the fraction is removed, whatever its ice; of other ice, such
/// as multiyear, up to somewhat less than the fraction is (see <c>ScreenRetuningLaws</c>).
/// </remarks>
public static class ScreenRetuning
{
    /// <summary>The limits for one sensor and hemisphere, fixed or of one day.</summary>
    /// <param name="tuning">
    /// The pure surfaces: those of the linear methods where they are known, for they are means of what was seen; else the tie points.
    /// </param>
    /// <param name="iceFraction">The largest concentration that may be removed. Unit: 1, above 0 and below 1.</param>
    /// <returns>The tuning's own limit stays where it cannot be retuned: see <see cref="Retuned"/>.</returns>
    public static WeatherScreens ScreensFor(HemisphereTuning tuning, double iceFraction)
    {
        ArgumentNullException.ThrowIfNull(tuning);
        return tuning.Surfaces is { } surfaces
            ? Retuned(tuning.Screens, surfaces.OpenWater, [surfaces.FirstYear, surfaces.Multiyear], iceFraction)
            : Retuned(tuning.Screens, Known(tuning.TiePoints.OpenWater), [Known(tuning.TiePoints.FirstYear), Known(tuning.TiePoints.Multiyear)], iceFraction);
    }

    /// <summary>Retunes both limits from an open-water point and one or more points of closed ice.</summary>
    /// <param name="screens">The limits to begin with. A screen that is not used stays unused.</param>
    /// <param name="openWater">At least 19V and 37V; 22V where it is known.</param>
    /// <param name="closedIce">The same of each kind of ice.</param>
    /// <param name="iceFraction">The largest concentration that may be removed. Unit: 1, above 0 and below 1.</param>
    /// <returns>A limit stays as it was where one of its channels is not known of every point, or open water does not stand above all ice.</returns>
    /// <exception cref="ArgumentException">There is no ice, or the fraction is not between 0 and 1.</exception>
    public static WeatherScreens Retuned(
        WeatherScreens screens, ChannelKelvins openWater, IReadOnlyList<ChannelKelvins> closedIce, double iceFraction)
    {
        ArgumentNullException.ThrowIfNull(screens);
        return new(
            Limit(Channel.V37, openWater, closedIce, iceFraction) ?? screens.Gradient3719Limit,
            screens.Gradient2219Limit is { } used ? Limit(Channel.V22, openWater, closedIce, iceFraction) ?? used : null);
    }

    /// <summary>The largest gradient ratio that a mixture with a given fraction of ice can have.</summary>
    /// <param name="upper">The channel above 19V.</param>
    /// <param name="openWater">The point of open water.</param>
    /// <param name="closedIce">The points of closed ice, one or more.</param>
    /// <param name="iceFraction">The fraction of ice. Unit: 1, above 0 and below 1.</param>
    /// <returns>Without unit; null where a channel is not known of every point, or open water does not stand above all ice.</returns>
    /// <exception cref="ArgumentException">There is no ice, or the fraction is not between 0 and 1.</exception>
    public static double? Limit(Channel upper, ChannelKelvins openWater, IReadOnlyList<ChannelKelvins> closedIce, double iceFraction)
    {
        ArgumentNullException.ThrowIfNull(openWater);
        ArgumentNullException.ThrowIfNull(closedIce);
        if (closedIce.Count == 0 || !(iceFraction is > 0.0 and < 1.0))
        {
            throw new ArgumentException("One point of closed ice and a fraction between 0 and 1 are needed.", nameof(iceFraction));
        }

        if (!Knows(openWater, upper) || !closedIce.All(ice => Knows(ice, upper)))
        {
            return null;
        }

        double water = Ratio(upper, openWater, openWater, 0.0);
        return closedIce.All(ice => Ratio(upper, openWater, ice, 1.0) < water)
            ? closedIce.Max(ice => Ratio(upper, openWater, ice, iceFraction))
            : null;
    }

    private static bool Knows(ChannelKelvins surface, Channel upper) => surface.Has(Channel.V19) && surface.Has(upper);

    private static double Ratio(Channel upper, ChannelKelvins water, ChannelKelvins ice, double iceFraction)
    {
        double high = ((1.0 - iceFraction) * water[upper]) + (iceFraction * ice[upper]);
        double low = ((1.0 - iceFraction) * water[Channel.V19]) + (iceFraction * ice[Channel.V19]);
        return (high - low) / (high + low);
    }

    private static ChannelKelvins Known(TiePoint point) =>
        new(new Dictionary<Channel, double> { [Channel.V19] = point.V19Kelvins, [Channel.V37] = point.V37Kelvins });
}
