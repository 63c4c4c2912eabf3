namespace IceExtent.Retrieval;

/// <summary>Names of <see cref="TiePointState"/> and <see cref="PureSurface"/> in files.</summary>
public static class TiePointStates
{
    /// <summary>The name in the column <c>tie_points</c> and in run records.</summary>
    public static string NameOf(TiePointState state) => state switch
    {
        TiePointState.Fixed => "fixed",
        TiePointState.Moving => "moving",
        TiePointState.MovingWater => "moving-water",
        TiePointState.MovingIce => "moving-ice",
        TiePointState.TooFewSamples => "too-few-samples",
        TiePointState.NoSolution => "no-solution",
        _ => throw new ArgumentOutOfRangeException(nameof(state), state, "There is no such state."),
    };

    /// <summary>The state of a name, or null.</summary>
    public static TiePointState? Parse(string name)
    {
        foreach (TiePointState state in Enum.GetValues<TiePointState>())
        {
            if (string.Equals(NameOf(state), name, StringComparison.Ordinal))
            {
                return state;
            }
        }

        return null;
    }

    /// <summary>The name in the column <c>surface</c> of the table of tie points.</summary>
    public static string NameOf(PureSurface surface) => surface switch
    {
        PureSurface.OpenWater => "open-water",
        PureSurface.ClosedIce => "closed-ice",
        PureSurface.FirstYear => "first-year",
        PureSurface.Multiyear => "multiyear",
        _ => throw new ArgumentOutOfRangeException(nameof(surface), surface, "There is no such surface."),
    };
}
