namespace IceExtent.Retrieval;

/// <summary>The projection from three channels to concentration that scatters least over samples of one surface.</summary>
/// <remarks>
/// C = v·(T − T_water) / v·(T_ice − T_water), with v at right angles to the ice line. Source: [Lavergne2019]. Departure: the one free
/// angle is not scanned: the least variance v'Sv / (v·d)² has the closed solution v ~ B (B'SB)⁻¹ B'd, where B spans the plane across
/// the ice line; no scanned angle does better (see <c>SelfTuningLaws</c>).
/// </remarks>
public static class LeastScatterAxis
{
    /// <summary>The channels of the space, in the order of every vector here.</summary>
    public static IReadOnlyList<Channel> Space { get; } = [Channel.V19, Channel.V37, Channel.H37];

    // Keeps samples without any scatter solvable: far below every radiometer's noise. Unit: K².
    private const double LeastVariance = 1e-4;

    // Water this near the ice line leaves nothing to tell the two apart by. Unit: K.
    private const double LeastContrastKelvins = 1.0;

    /// <summary>Finds the projection.</summary>
    /// <param name="surface">The samples over which the scatter shall be least.</param>
    /// <param name="waterKelvins">The centre of open water, in K.</param>
    /// <param name="iceKelvins">The centre of closed ice, in K.</param>
    /// <param name="iceDirection">The unit vector of the ice line.</param>
    /// <returns>The concentration as a linear form, or null where water lies on the ice line.</returns>
    public static LinearForm? Find(
        SurfaceMoments surface, ChannelKelvins waterKelvins, ChannelKelvins iceKelvins, IReadOnlyList<double> iceDirection)
    {
        ArgumentNullException.ThrowIfNull(surface);
        ArgumentNullException.ThrowIfNull(waterKelvins);
        ArgumentNullException.ThrowIfNull(iceKelvins);
        ArgumentNullException.ThrowIfNull(iceDirection);
        double[] contrast = [.. Space.Select(channel => iceKelvins[channel] - waterKelvins[channel])];
        (double[] first, double[] second) = Across(iceDirection);
        (double alongFirst, double alongSecond) = (Dot(first, contrast), Dot(second, contrast));
        if (Math.Sqrt((alongFirst * alongFirst) + (alongSecond * alongSecond)) < LeastContrastKelvins)
        {
            return null;
        }

        double varianceFirst = Spread(surface, first, first) + LeastVariance;
        double varianceSecond = Spread(surface, second, second) + LeastVariance;
        double covariance = Spread(surface, first, second);

        // The inverse of a two by two matrix times the contrast; its determinant only scales the axis.
        double weightFirst = (varianceSecond * alongFirst) - (covariance * alongSecond);
        double weightSecond = (varianceFirst * alongSecond) - (covariance * alongFirst);
        double scale = 1.0 / ((weightFirst * alongFirst) + (weightSecond * alongSecond));
        LinearForm form = new(
            0.0,
            [.. Space.Select((channel, index) => (channel, scale * ((weightFirst * first[index]) + (weightSecond * second[index]))))]);
        return form.Plus(-form.At(waterKelvins), new LinearForm(1.0));
    }

    /// <summary>Two unit vectors at right angles to a direction and to each other.</summary>
    private static (double[] First, double[] Second) Across(IReadOnlyList<double> direction)
    {
        // The unit axis that the direction leans on least gives the steadiest cross product.
        int least = 0;
        for (int axis = 1; axis < 3; axis++)
        {
            least = Math.Abs(direction[axis]) < Math.Abs(direction[least]) ? axis : least;
        }

        double[] helper = [least == 0 ? 1.0 : 0.0, least == 1 ? 1.0 : 0.0, least == 2 ? 1.0 : 0.0];
        double[] first = Cross(direction, helper);
        double length = Math.Sqrt(Dot(first, first));
        first = Array.ConvertAll(first, value => value / length);
        return (first, Cross(direction, first));
    }

    private static double[] Cross(IReadOnlyList<double> a, double[] b) =>
        [(a[1] * b[2]) - (a[2] * b[1]), (a[2] * b[0]) - (a[0] * b[2]), (a[0] * b[1]) - (a[1] * b[0])];

    private static double Dot(double[] a, double[] b) => (a[0] * b[0]) + (a[1] * b[1]) + (a[2] * b[2]);

    private static double Spread(SurfaceMoments surface, double[] a, double[] b)
    {
        double sum = 0.0;
        for (int row = 0; row < 3; row++)
        {
            for (int column = 0; column < 3; column++)
            {
                sum += a[row] * b[column] * surface.Covariance(Space[row], Space[column]);
            }
        }

        return sum;
    }
}
