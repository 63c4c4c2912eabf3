using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Retrieval;

/// <summary>Two projections, one that scatters least over open water and one over closed ice, blended by concentration.</summary>
/// <remarks>
/// The weight of the first falls from 1 to 0 between two concentrations that it finds itself. Source: [Tonboe2016], [Lavergne2019]; the
/// two concentrations are in config, from memory (high). With the samples of the day's window the projections are those of
/// <see cref="LeastScatterAxis"/>. Without, they are the fixed pair of [Tonboe2016]: Bootstrap in frequency mode over water and Bristol
/// over ice, with the same blend.
/// </remarks>
public sealed class SelfTuning : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "self-tuning";

    private const int PieceCells = 512; // Small enough for the stack.

    private readonly LinearKernel overWater;
    private readonly LinearKernel overIce;
    private readonly float blendFrom;
    private readonly float inverseBlend;

    private SelfTuning(LinearForm overWater, LinearForm overIce, ProjectionBlend blend)
    {
        (OverWater, OverIce) = (overWater, overIce);
        (this.overWater, this.overIce) = (new(overWater), new(overIce));
        (this.blendFrom, inverseBlend) = ((float)blend.From, (float)(1.0 / (blend.To - blend.From)));
    }

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
    /// <param name="blend">Where the fixed pair changes, if there are no samples.</param>
    /// <exception cref="ArgumentException">The surfaces leave no solution.</exception>
    public static SelfTuning From(SurfacePoints surfaces, PureSamples? samples, ProjectionBlend blend)
    {
        ArgumentNullException.ThrowIfNull(surfaces);
        ArgumentNullException.ThrowIfNull(blend);
        if (samples is not null
            && Projection(samples.OpenWater, samples) is { } water
            && Projection(samples.ClosedIce, samples) is { } ice)
        {
            return new(water, ice, samples.Blend);
        }

        IceLine frequency = IceLine.Through(new(0.0, (Channel.V37, 1.0)), new(0.0, (Channel.V19, 1.0)), surfaces.FirstYear, surfaces.Multiyear);
        return new(frequency.Concentration(surfaces.OpenWater), new Bristol(surfaces).Line.Concentration(surfaces.OpenWater), blend);
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

    /// <inheritdoc/>
    public PureTangents PureTangents => new(OverWater, OverIce, OverIce);

    /// <inheritdoc/>
    public LinearForm TangentAt(ChannelKelvins surface)
    {
        (double open, double closed) = (OverWater.At(surface), OverIce.At(surface));
        double share = ShareOverIce(open);
        double slope = share is > 0.0 and < 1.0 ? inverseBlend : 0.0;
        LinearForm form = OverWater.Times(1.0 - share + (slope * (closed - open))).Plus(share, OverIce);
        return form.Plus(1.0, new LinearForm(open + (share * (closed - open)) - form.At(surface)));
    }

    /// <inheritdoc/>
    public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(noise);
        Span<float> closed = stackalloc float[PieceCells];
        NoiseOfForms forms = new(
            (float)noise.VarianceOf(OverWater), (float)noise.CovarianceOf(OverWater, OverIce), (float)noise.VarianceOf(OverIce));
        for (int start = 0; start < cells.Length; start += PieceCells)
        {
            CellRange piece = new(cells.Start + start, Math.Min(PieceCells, cells.Length - start));
            Span<float> open = variance.Slice(start, piece.Length);
            overWater.Evaluate(observed, piece, open);
            overIce.Evaluate(observed, piece, closed[..piece.Length]);
            ToVariance(closed, forms, open);
        }
    }

    // Takes concentrations over water, gives variances.
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    private void ToVariance(ReadOnlySpan<float> closed, NoiseOfForms forms, Span<float> openThenVariance)
    {
        for (int cell = 0; cell < openThenVariance.Length; cell++)
        {
            float open = openThenVariance[cell];
            float share = Math.Clamp((open - blendFrom) * inverseBlend, 0f, 1f);
            float slope = share > 0f && share < 1f ? inverseBlend : 0f;
            float weight = 1f - share + (slope * (closed[cell] - open));
            openThenVariance[cell] = (weight * weight * forms.Open) + (2f * weight * share * forms.Both) + (share * share * forms.Closed);
        }
    }

    private readonly record struct NoiseOfForms(float Open, float Both, float Closed);

    /// <summary>The share of the closed-ice projection at a concentration found by the other: the plain twin of the kernel.</summary>
    public double ShareOverIce(double overWaterFraction) => Math.Clamp((overWaterFraction - blendFrom) * inverseBlend, 0.0, 1.0);

    private static LinearForm? Projection(SurfaceMoments surface, PureSamples samples) =>
        LeastScatterAxis.Find(surface, samples.OpenWater.Center, samples.ClosedIce.Center, samples.IceDirection);

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
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
