namespace IceExtent.Retrieval;

/// <summary>What the standard error of a cell of one method is made of: pure surfaces that vary, and instrument noise.</summary>
/// <remarks>
/// The scatter of the sensor's file holds noise. What noise the method has over its own pure surfaces is taken out of it, never
/// below 0, and each cell gets the noise of its own temperatures instead. Immutable and safe to use from several threads.
/// </remarks>
public sealed class ErrorBudget
{
    private readonly IConcentrationMethod method;
    private readonly ChannelNoise noise;
    private readonly bool hasNoise;
    private readonly double waterNoiseVariance;

    /// <summary>Parts the scatter of one method.</summary>
    /// <param name="method">The tuned method.</param>
    /// <param name="scatter">The scatter over the pure surfaces, noise included.</param>
    /// <param name="noise">The noise of the channels.</param>
    /// <param name="offsets">
    /// The standard errors of offsets that were taken off the channels, or null: on top of the scatter, which does not hold them.
    /// </param>
    public ErrorBudget(IConcentrationMethod method, RetrievalScatter scatter, ChannelNoise noise, ChannelNoise? offsets = null)
    {
        ArgumentNullException.ThrowIfNull(method);
        ArgumentNullException.ThrowIfNull(scatter);
        ArgumentNullException.ThrowIfNull(noise);
        this.method = method;
        this.noise = offsets is null ? noise : noise.With(offsets);
        hasNoise = method.Channels.Any(channel => this.noise[channel] > 0.0);
        bool scatterHasNoise = method.Channels.Any(channel => noise[channel] > 0.0);

        // Two kinds of ice have one scatter but not the same noise: the smaller leaves more, which is the safe side.
        PureTangents pure = method.PureTangents;
        waterNoiseVariance = this.noise.VarianceOf(pure.OpenWater);
        double iceVariance = Math.Min(noise.VarianceOf(pure.FirstYear), noise.VarianceOf(pure.Multiyear));
        SurfaceScatter = scatterHasNoise
            ? new(Rest(scatter.OpenWaterFraction, noise.VarianceOf(pure.OpenWater)), Rest(scatter.ClosedIceFraction, iceVariance))
            {
                LooseIceFraction = Rest(scatter.LooseIceFraction, iceVariance),
                Blend = scatter.Blend,
            }
            : scatter;
    }

    /// <summary>The scatter over the pure surfaces without noise.</summary>
    public RetrievalScatter SurfaceScatter { get; }

    /// <summary>Writes the standard errors of a run of cells.</summary>
    /// <param name="observed">Holds every channel of the method, in K.</param>
    /// <param name="cells">The run.</param>
    /// <param name="totalFraction">The run's clipped concentrations; NaN is missing.</param>
    /// <param name="standardErrorFraction">Receives the run's standard errors, NaN where the concentration is.</param>
    public void Apply(BrightnessPlanes observed, CellRange cells, ReadOnlySpan<float> totalFraction, Span<float> standardErrorFraction)
    {
        if (!hasNoise)
        {
            CellScatter.Apply(totalFraction, SurfaceScatter, standardErrorFraction);
            return;
        }

        method.WriteNoiseVariance(observed, cells, noise, standardErrorFraction);
        CellScatter.Apply(totalFraction, SurfaceScatter, noiseVariance: standardErrorFraction, waterNoiseVariance, standardErrorFraction);
    }

    private static double Rest(double scatterFraction, double noiseVariance) =>
        Math.Sqrt(Math.Max(0.0, (scatterFraction * scatterFraction) - noiseVariance));
}
