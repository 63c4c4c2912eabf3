namespace IceExtent.Retrieval;

/// <summary>Everything between one day's brightness temperatures and its concentration, for one method.</summary>
/// <remarks>
/// The steps, in order: retrieve, empty land and polar gap, screen weather, mask what cannot be ice in its month, clip, correct the coast, standard error, smearing. The
/// range check of the temperatures comes before them, once a day: <see cref="CheckRange"/>. Immutable and safe to use from several
/// threads. The cells are handled in runs that stay in the processor's cache.
/// </remarks>
public sealed class DayRetrieval
{
    private const int RunCells = 8_192; // Eight planes of it are 224 kB: inside a second-level cache.

    private readonly IConcentrationMethod method;
    private readonly WeatherScreens screens;
    private readonly ErrorBudget errors;
    private readonly CellMask mask;
    private readonly ICoastStep? coast;
    private readonly SmearingFactors smearing;
    private readonly Channel[] needed;
    private readonly float? screenedError;

    /// <summary>Prepares the retrieval of one sensor on one grid.</summary>
    /// <param name="method">The tuned method.</param>
    /// <param name="screens">The weather screens.</param>
    /// <param name="scatter">The scatter over the pure surfaces, instrument noise included.</param>
    /// <param name="mask">Land and polar gap.</param>
    /// <param name="coast">Corrects concentrations near land, or null.</param>
    /// <param name="smearing">How much a change from cell to cell widens the standard error, or null for not at all.</param>
    /// <param name="noise">The instrument noise, or null where it is not told apart.</param>
    /// <param name="offsetErrors">The standard errors of offsets taken off the temperatures, or null.</param>
    /// <param name="screenedError">The standard error of a cell that a screen or a mask set to open water, or null for that of open water. Unit: 1.</param>
    public DayRetrieval(
        IConcentrationMethod method, WeatherScreens screens, RetrievalScatter scatter, CellMask mask, ICoastStep? coast = null, SmearingFactors? smearing = null,
        ChannelNoise? noise = null, ChannelNoise? offsetErrors = null, double? screenedError = null)
    {
        ArgumentNullException.ThrowIfNull(method);
        ArgumentNullException.ThrowIfNull(screens);
        ArgumentNullException.ThrowIfNull(scatter);
        ArgumentNullException.ThrowIfNull(mask);
        (this.method, this.screens, this.mask, this.coast, this.smearing) = (method, screens, mask, coast, smearing ?? SmearingFactors.None);
        errors = new(method, scatter, noise ?? ChannelNoise.None, offsetErrors);
        this.screenedError = (float?)screenedError;
        needed = [.. method.Channels];
    }

    /// <summary>The tuned method.</summary>
    public IConcentrationMethod Method => method;

    /// <summary>The limits of the weather screens.</summary>
    public WeatherScreens Screens => screens;

    /// <summary>The scatter over the pure surfaces, instrument noise left out.</summary>
    public RetrievalScatter SurfaceScatter => errors.SurfaceScatter;

    /// <summary>Makes impossible temperatures of every channel missing. Call it once a day, before any <see cref="Retrieve"/>.</summary>
    /// <param name="observed">Changed in place.</param>
    /// <param name="range">The values that are believed.</param>
    /// <param name="conditions">Cleared, then receives <see cref="CellConditions.OutOfRange"/> where a value was made missing.</param>
    /// <returns>The number of values made missing.</returns>
    public static int CheckRange(BrightnessPlanes observed, KelvinRange range, Span<CellConditions> conditions)
    {
        ArgumentNullException.ThrowIfNull(observed);
        conditions.Clear();
        int count = 0;
        foreach (Channel channel in observed.Channels)
        {
            count += RangeScreen.Apply(observed.Kelvins(channel), range, conditions);
        }

        return count;
    }

    /// <summary>Retrieves one day.</summary>
    /// <param name="observed">Brightness temperatures after <see cref="CheckRange"/>; only read.</param>
    /// <param name="rangeConditions">What <see cref="CheckRange"/> marked.</param>
    /// <param name="into">Receives the day.</param>
    /// <param name="month">Where ice cannot be in the day's month, or null for nowhere.</param>
    /// <returns>What happened to the cells; <see cref="RetrievalCounts.OutOfRange"/> is left 0.</returns>
    public RetrievalCounts Retrieve(
        BrightnessPlanes observed, ReadOnlySpan<CellConditions> rangeConditions, ConcentrationPlanes into, MonthMask? month = null)
    {
        ArgumentNullException.ThrowIfNull(observed);
        ArgumentNullException.ThrowIfNull(into);
        rangeConditions.CopyTo(into.Conditions);
        RetrievalCounts counts = default;
        for (int start = 0; start < observed.CellCount; start += RunCells)
        {
            counts += RetrieveRun(observed, new(start, Math.Min(RunCells, observed.CellCount - start)), into, month);
        }

        counts = coast is null ? counts : counts with { CoastCorrected = CorrectCoast(coast, observed, into) };
        if (screenedError is { } screened)
        {
            ScreenedError.Apply(into.Conditions, screened, into.StandardError);
        }

        EdgeSmearing.Apply(into.Total, mask.Columns, smearing, into.StandardError);
        return counts;
    }

    // The step looks at neighbours, so it needs the whole plane; a new total has a new standard error.
    private int CorrectCoast(ICoastStep step, BrightnessPlanes observed, ConcentrationPlanes into)
    {
        int corrected = step.Correct(into);
        if (corrected > 0)
        {
            errors.Apply(observed, new(0, observed.CellCount), into.Total, into.StandardError);
        }

        return corrected;
    }

    private RetrievalCounts RetrieveRun(BrightnessPlanes observed, CellRange cells, ConcentrationPlanes into, MonthMask? month)
    {
        Span<float> total = cells.Of(into.Total);
        Span<CellConditions> conditions = cells.Of(into.Conditions);

        method.Retrieve(observed, cells, into);
        (int noObservation, int noSolution) =
            MissingCells.Mark(cells.Of(mask.Conditions), new(observed, needed, cells), total, conditions);
        Clipping.Copy(total, cells.Of(into.Unscreened));
        int screened3719 = Screen(Channel.V37, screens.Gradient3719Limit, CellConditions.WeatherGradient3719);
        int screened2219 = Screen(Channel.V22, screens.Gradient2219Limit, CellConditions.WeatherGradient2219);
        (int outside, int warm) = month?.Apply(cells, into) ?? default;
        (int below, int above) = Clipping.Apply(total, cells.Of(into.Multiyear), cells.Of(into.FirstYear), conditions);
        errors.Apply(observed, cells, total, cells.Of(into.StandardError));
        return new(0, screened3719, screened2219, below, above, noObservation, noSolution)
        {
            OutsideIceMask = outside,
            WarmWater = warm,
        };

        int Screen(Channel upper, double? limit, CellConditions condition) =>
            limit is { } value && observed.Has(upper) && observed.Has(Channel.V19)
                ? GradientScreen.Apply(
                    cells.Of(observed.Kelvins(upper)),
                    cells.Of(observed.Kelvins(Channel.V19)),
                    value,
                    condition,
                    cells.Of(into.Total),
                    cells.Of(into.Conditions))
                : 0;
    }
}
