namespace IceExtent.Retrieval;

/// <summary>The Bristol method: the Bootstrap construction in axes turned so that one looks along the plane of ice.</summary>
/// <remarks>
/// x = T37V + 1.045·T37H + 0.525·T19V, y = 0.9164·T19V − T37V + 0.4965·T37H. Source: [Smith1996], [Hanna2001]; the
/// axes are read in print, the construction with the pure surfaces of the sensor's file is from memory (high).
/// </remarks>
public sealed class Bristol : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "bristol";

    private readonly LinearForm form;
    private readonly LinearKernel concentration;

    /// <summary>Tunes the method.</summary>
    /// <param name="points">The pure surfaces, in 19V, 37V and 37H.</param>
    /// <exception cref="ArgumentException">The surfaces leave no solution.</exception>
    public Bristol(SurfacePoints points)
    {
        ArgumentNullException.ThrowIfNull(points);
        Line = IceLine.Through(Abscissa, Ordinate, points.FirstYear, points.Multiyear);
        form = Line.Concentration(points.OpenWater);
        concentration = new(form);
    }

    /// <summary>The axis along the plane of ice, in K.</summary>
    public static LinearForm Abscissa { get; } = new(0.0, (Channel.V37, 1.0), (Channel.H37, 1.045), (Channel.V19, 0.525));

    /// <summary>The axis across it, in K.</summary>
    public static LinearForm Ordinate { get; } = new(0.0, (Channel.V19, 0.9164), (Channel.V37, -1.0), (Channel.H37, 0.4965));

    /// <summary>The line of closed ice.</summary>
    public IceLine Line { get; }

    /// <inheritdoc/>
    public string Name => MethodName;

    /// <inheritdoc/>
    public string Source => "[Smith1996], [Hanna2001]";

    /// <inheritdoc/>
    public IReadOnlyList<Channel> Channels { get; } = [Channel.V19, Channel.V37, Channel.H37];

    /// <inheritdoc/>
    public bool SeparatesIceTypes => false;

    /// <inheritdoc/>
    public PureTangents PureTangents => new(form, form, form);

    /// <inheritdoc/>
    public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into)
    {
        ArgumentNullException.ThrowIfNull(into);
        concentration.Evaluate(observed, cells, cells.Of(into.Total));
        cells.Of(into.Multiyear).Fill(float.NaN);
    }

    /// <inheritdoc/>
    public LinearForm TangentAt(ChannelKelvins surface) => form;

    /// <inheritdoc/>
    public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(noise);
        variance.Fill((float)noise.VarianceOf(form));
    }
}
