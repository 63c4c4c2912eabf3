namespace IceExtent.Retrieval;

/// <summary>The NASA Team method.</summary>
/// <remarks>Source: [Cavalieri1984], [Gloersen1986]; see docs/METHODS.md for what it is and where it is weak.</remarks>
public sealed class NasaTeam : IConcentrationMethod
{
    /// <summary>The name run files use.</summary>
    public const string MethodName = "nasa-team";

    private readonly NasaTeamCoefficients coefficients;
    private readonly NasaTeamKernel kernel;
    private readonly NasaTeamNoiseKernel noiseKernel;

    /// <summary>Tunes the method.</summary>
    /// <param name="points">The three pure surfaces of one sensor and hemisphere.</param>
    public NasaTeam(TiePoints points)
    {
        ArgumentNullException.ThrowIfNull(points);
        coefficients = NasaTeamCoefficients.From(points);
        kernel = new(coefficients);
        noiseKernel = new(coefficients);
        PureTangents = new(TangentAt(points.OpenWater.Kelvins), TangentAt(points.FirstYear.Kelvins), TangentAt(points.Multiyear.Kelvins));
    }

    /// <inheritdoc/>
    public string Name => MethodName;

    /// <inheritdoc/>
    public string Source => "[Cavalieri1984], [Gloersen1986]";

    /// <inheritdoc/>
    public IReadOnlyList<Channel> Channels { get; } = [Channel.V19, Channel.H19, Channel.V37];

    /// <inheritdoc/>
    public bool SeparatesIceTypes => true;

    /// <inheritdoc/>
    public PureTangents PureTangents { get; }

    /// <inheritdoc/>
    public void Retrieve(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into)
    {
        ArgumentNullException.ThrowIfNull(observed);
        ArgumentNullException.ThrowIfNull(into);
        kernel.Retrieve(
            cells.Of(observed.Kelvins(Channel.V19)),
            cells.Of(observed.Kelvins(Channel.H19)),
            cells.Of(observed.Kelvins(Channel.V37)),
            cells.Of(into.Total),
            cells.Of(into.Multiyear));
    }

    /// <inheritdoc/>
    public LinearForm TangentAt(ChannelKelvins surface) => NasaTeamPlain.TangentAt(coefficients, surface);

    /// <inheritdoc/>
    public void WriteNoiseVariance(BrightnessPlanes observed, CellRange cells, ChannelNoise noise, Span<float> variance)
    {
        ArgumentNullException.ThrowIfNull(observed);
        noiseKernel.Write(
            cells.Of(observed.Kelvins(Channel.V19)),
            cells.Of(observed.Kelvins(Channel.H19)),
            cells.Of(observed.Kelvins(Channel.V37)),
            noise,
            variance);
    }
}
