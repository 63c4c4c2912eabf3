namespace IceExtent.Retrieval;

/// <summary>The line of closed ice in a plane of two linear axes: y = slope·x + intercept.</summary>
/// <param name="X">The abscissa.</param>
/// <param name="Y">The ordinate.</param>
/// <param name="Slope">Without unit.</param>
/// <param name="InterceptKelvins">In K.</param>
/// <remarks>Source: [Comiso1986]; the same construction in turned axes is [Smith1996].</remarks>
public sealed record IceLine(LinearForm X, LinearForm Y, double Slope, double InterceptKelvins)
{
    /// <summary>The line through two pure ice surfaces.</summary>
    /// <exception cref="ArgumentException">Both surfaces have the same abscissa.</exception>
    public static IceLine Through(LinearForm x, LinearForm y, ChannelKelvins firstYear, ChannelKelvins multiyear)
    {
        ArgumentNullException.ThrowIfNull(x);
        ArgumentNullException.ThrowIfNull(y);
        double run = x.At(firstYear) - x.At(multiyear);
        if (Math.Abs(run) < SmallestRunKelvins)
        {
            throw new ArgumentException("Both ice surfaces have the same abscissa: no line goes through them.", nameof(firstYear));
        }

        double slope = (y.At(firstYear) - y.At(multiyear)) / run;
        return new(x, y, slope, y.At(firstYear) - (slope * x.At(firstYear)));
    }

    private const double SmallestRunKelvins = 1e-6;

    /// <summary>How far a cell lies above the line, in K: 0 on closed ice.</summary>
    public LinearForm AboveLine => Y.Plus(-Slope, X).Plus(1.0, new LinearForm(-InterceptKelvins));

    /// <summary>
    /// The concentration |OB|/|OI|, where I is where the ray from open water O through the cell B meets the line:
    /// [(yB − yO) − s·(xB − xO)] / [s·xO + c − yO], which is linear in the temperatures.
    /// </summary>
    /// <param name="openWater">The open-water point.</param>
    /// <exception cref="ArgumentException">Open water lies on the line.</exception>
    public LinearForm Concentration(ChannelKelvins openWater)
    {
        double waterBelow = AboveLine.At(openWater);
        return Math.Abs(waterBelow) < SmallestRunKelvins
            ? throw new ArgumentException("Open water lies on the line of closed ice: concentrations have no solution.", nameof(openWater))
            : AboveLine.Times(-1.0 / waterBelow).Plus(1.0, new LinearForm(1.0));
    }
}
