using System.Numerics;
using IceExtent.Grids;

namespace IceExtent.Retrieval;

/// <summary>The Bootstrap method with fixed ice lines.</summary>
/// <remarks>
/// Two planes: polarisation mode (37V, 37H) for closed ice in the north, frequency mode (37V, 19V) elsewhere and
/// everywhere in the south. A cell is in polarisation mode when its 37H is above the ice line less 5 K.
/// Source: [Comiso1986], [Comiso1995]; the 5 K are read in print for the regression, and from memory for the choice.
/// Departure: lines go through pure surfaces of the sensor's file, not through the printed regressions.
/// </remarks>
public sealed class Bootstrap : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "bootstrap";

    /// <summary>How far below the ice line a cell may lie and still be in polarisation mode. Unit: K.</summary>
    public const double ClosedIceMarginKelvins = 5.0;

    private readonly LinearForm openForm;
    private readonly LinearForm closedForm;
    private readonly LinearKernel frequency;
    private readonly LinearKernel? polarization;
    private readonly LinearKernel? aboveLine;

    /// <summary>Tunes the method.</summary>
    /// <param name="points">The pure surfaces, in 19V, 37V and 37H.</param>
    /// <param name="hemisphere">Where it is used.</param>
    /// <exception cref="ArgumentException">The surfaces leave no solution.</exception>
    public Bootstrap(SurfacePoints points, Hemisphere hemisphere)
    {
        ArgumentNullException.ThrowIfNull(points);
        FrequencyMode = IceLine.Through(new(0.0, (Channel.V37, 1.0)), new(0.0, (Channel.V19, 1.0)), points.FirstYear, points.Multiyear);
        PolarizationMode = IceLine.Through(new(0.0, (Channel.V37, 1.0)), new(0.0, (Channel.H37, 1.0)), points.FirstYear, points.Multiyear);
        openForm = FrequencyMode.Concentration(points.OpenWater);
        closedForm = PolarizationMode.Concentration(points.OpenWater);
        frequency = new(openForm);
        Channels = [Channel.V19, Channel.V37];
        if (hemisphere == Hemisphere.North)
        {
            polarization = new(closedForm);
            aboveLine = new(PolarizationMode.AboveLine);
            Channels = [Channel.V19, Channel.V37, Channel.H37];
        }

        PureTangents = new(TangentAt(points.OpenWater), TangentAt(points.FirstYear), TangentAt(points.Multiyear));
    }

    /// <summary>The line of closed ice in (37V, 19V).</summary>
    public IceLine FrequencyMode { get; }

    /// <summary>The line of closed ice in (37V, 37H).</summary>
    public IceLine PolarizationMode { get; }

    /// <inheritdoc/>
    public string Name => MethodName;

    /// <inheritdoc/>
    public string Source => "[Comiso1986], [Comiso1995]";

    /// <inheritdoc/>
    public IReadOnlyList<Channel> Channels { get; }

    /// <inheritdoc/>
    public bool SeparatesIceTypes => false;

    /// <inheritdoc/>
    public PureTangents PureTangents { get; }

    /// <inheritdoc/>
    public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into)
    {
        ArgumentNullException.ThrowIfNull(into);
        Span<float> total = cells.Of(into.Total);
        frequency.Evaluate(observed, cells, total);
        if (polarization is not null)
        {
            // The planes of ice types are free here; they are made missing below.
            Span<float> closed = cells.Of(into.Multiyear);
            Span<float> above = cells.Of(into.FirstYear);
            polarization.Evaluate(observed, cells, closed);
            aboveLine!.Evaluate(observed, cells, above);
            Choose(above, closed, total);
        }

        cells.Of(into.Multiyear).Fill(float.NaN);
    }

    /// <inheritdoc/>
    /// <remarks>The form of the mode that the surface is in; where modes meet the concentration has a step that no derivative tells.</remarks>
    public LinearForm TangentAt(ChannelKelvins surface) =>
        polarization is not null && PolarizationMode.AboveLine.At(surface) > -ClosedIceMarginKelvins ? closedForm : openForm;

    /// <inheritdoc/>
    public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(noise);
        float open = (float)noise.VarianceOf(openForm);
        if (aboveLine is null)
        {
            variance.Fill(open);
            return;
        }

        aboveLine.Evaluate(observed, cells, variance);
        ByMode((float)noise.VarianceOf(closedForm), open, variance);
    }

    // Takes the distance above the line, gives the variance of the mode that it chooses.
    private static void ByMode(float closed, float open, Span<float> kelvinsThenVariance)
    {
        const float Margin = (float)-ClosedIceMarginKelvins;
        int cell = 0;
        for (; cell <= kelvinsThenVariance.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector.ConditionalSelect(
                Vector.GreaterThan(new Vector<float>(kelvinsThenVariance[cell..]), new Vector<float>(Margin)), new Vector<float>(closed), new Vector<float>(open))
                .CopyTo(kelvinsThenVariance[cell..]);
        }

        for (; cell < kelvinsThenVariance.Length; cell++)
        {
            kelvinsThenVariance[cell] = kelvinsThenVariance[cell] > Margin ? closed : open;
        }
    }

    private static void Choose(ReadOnlySpan<float> aboveKelvins, ReadOnlySpan<float> closed, Span<float> total)
    {
        const float Margin = (float)-ClosedIceMarginKelvins;
        int cell = 0;
        for (; cell <= total.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Vector<float> above = new(aboveKelvins[cell..]);
            Vector<float> open = new(total[cell..]);
            Vector<float> all = above + open; // NaN where any of the three channels is missing.
            Vector<float> mode = Vector.ConditionalSelect(
                Vector.GreaterThan(above, new Vector<float>(Margin)), new Vector<float>(closed[cell..]), open);
            Vector.ConditionalSelect(Vector.Equals(all, all), mode, all).CopyTo(total[cell..]);
        }

        for (; cell < total.Length; cell++)
        {
            total[cell] = float.IsNaN(aboveKelvins[cell] + total[cell]) ? float.NaN : aboveKelvins[cell] > Margin ? closed[cell] : total[cell];
        }
    }
}
