using System.Numerics;

namespace IceExtent.Retrieval;

/// <summary>Two projections, one that scatters least over open water and one over closed ice, blended by concentration.</summary>
/// <remarks>
/// The weight of the first falls from 1 to 0 between two concentrations that it finds itself. Source: [Tonboe2016], [Lavergne2019]; the
/// two concentrations are from memory (high). With the samples of the day's window the projections are those of
/// <see cref="LeastScatterAxis"/>. Without, they are the fixed pair of [Tonboe2016]: Bootstrap in frequency mode over water and Bristol
/// over ice, with the same blend.
/// </remarks>
public sealed class SelfTuning : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "self-tuning";

    private readonly LinearKernel overWater;
    private readonly LinearKernel overIce;
    private readonly float blendFrom;
    private readonly float inverseBlend;

    private SelfTuning(LinearForm overWater, LinearForm overIce, double blendFrom, double blendTo)
    {
        (OverWater, OverIce) = (overWater, overIce);
        (this.overWater, this.overIce) = (new(overWater), new(overIce));
        (this.blendFrom, inverseBlend) = ((float)blendFrom, (float)(1.0 / (blendTo - blendFrom)));
    }

    /// <summary>The blend where the tuning has no samples: the values of [Lavergne2019], as in config/defaults.toml.</summary>
    public static (double From, double To) FixedBlend { get; } = (0.7, 0.9);

    /// <summary>The projection used up to the lower end of the blend.</summary>
    public LinearForm OverWater { get; }

    /// <summary>The projection used from the upper end on.</summary>
    public LinearForm OverIce { get; }

    /// <inheritdoc/>
    public string Name => MethodName;

    /// <inheritdoc/>
    public string Source => "[Tonboe2016], [Lavergne2019]";

    /// <inheritdoc/>
    public IReadOnlyList<Channel> Channels { get; } = [.. LeastScatterAxis.Space];

    /// <inheritdoc/>
    public bool SeparatesIceTypes => false;

    /// <summary>Tunes the method.</summary>
    /// <param name="surfaces">The pure surfaces of the day, or the sensor's own.</param>
    /// <param name="samples">The samples behind them, or null.</param>
    /// <exception cref="ArgumentException">The surfaces leave no solution.</exception>
    public static SelfTuning From(SurfacePoints surfaces, PureSamples? samples)
    {
        ArgumentNullException.ThrowIfNull(surfaces);
        if (samples is not null
            && Projection(samples.OpenWater, samples) is { } water
            && Projection(samples.ClosedIce, samples) is { } ice)
        {
            return new(water, ice, samples.BlendFrom, samples.BlendTo);
        }

        IceLine frequency = IceLine.Through(new(0.0, (Channel.V37, 1.0)), new(0.0, (Channel.V19, 1.0)), surfaces.FirstYear, surfaces.Multiyear);
        return new(frequency.Concentration(surfaces.OpenWater), new Bristol(surfaces).Line.Concentration(surfaces.OpenWater), FixedBlend.From, FixedBlend.To);
    }

    /// <inheritdoc/>
    public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into)
    {
        ArgumentNullException.ThrowIfNull(into);
        Span<float> total = cells.Of(into.Total);
        Span<float> closed = cells.Of(into.Multiyear); // Free here; made missing below.
        overWater.Evaluate(observed, cells, total);
        overIce.Evaluate(observed, cells, closed);
        Blend(closed, total);
        closed.Fill(float.NaN);
    }

    /// <summary>The share of the closed-ice projection at a concentration found by the other: the plain twin of the kernel.</summary>
    public double ShareOverIce(double overWaterFraction) => Math.Clamp((overWaterFraction - blendFrom) * inverseBlend, 0.0, 1.0);

    private static LinearForm? Projection(SurfaceMoments surface, PureSamples samples) =>
        LeastScatterAxis.Find(surface, samples.OpenWater.Center, samples.ClosedIce.Center, samples.IceDirection);

    private void Blend(ReadOnlySpan<float> closed, Span<float> total)
    {
        int cell = 0;
        for (; cell <= total.Length - Vector<float>.Count; cell += Vector<float>.Count)
        {
            Of(new Vector<float>(total[cell..]), new Vector<float>(closed[cell..])).CopyTo(total[cell..]);
        }

        for (; cell < total.Length; cell++)
        {
            total[cell] = Of(new Vector<float>(total[cell]), new Vector<float>(closed[cell]))[0];
        }
    }

    private Vector<float> Of(Vector<float> open, Vector<float> closed)
    {
        Vector<float> share = (open - new Vector<float>(blendFrom)) * inverseBlend;
        share = Vector.Min(Vector.Max(share, Vector<float>.Zero), Vector<float>.One);
        return open + (share * (closed - open)); // NaN in either stays.
    }
}
