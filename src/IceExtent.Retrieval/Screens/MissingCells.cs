namespace IceExtent.Retrieval;

/// <summary>Empties the cells that cannot have a concentration and says why each empty cell is empty.</summary>
public static class MissingCells
{
    /// <summary>Marks a run of cells.</summary>
    /// <param name="mask">Land and polar gap.</param>
    /// <param name="channels">The planes the method needs, each as long as the run, in K.</param>
    /// <param name="totalFraction">Becomes NaN on land and in the polar gap.</param>
    /// <param name="conditions">
    /// Receives the mask, and <see cref="CellConditions.NoObservation"/> or <see cref="CellConditions.NoSolution"/>
    /// where an ocean cell is empty. On land and in the gap every other condition is dropped.
    /// </param>
    /// <returns>The numbers of ocean cells without an observation and without a solution.</returns>
    public static (int NoObservation, int NoSolution) Mark(
        ReadOnlySpan<CellConditions> mask,
        ChannelSet channels,
        Span<float> totalFraction,
        Span<CellConditions> conditions)
    {
        int noObservation = 0;
        int noSolution = 0;
        for (int cell = 0; cell < mask.Length; cell++)
        {
            if (mask[cell] != CellConditions.None)
            {
                totalFraction[cell] = float.NaN;
                conditions[cell] = mask[cell];
            }
            else if (float.IsNaN(totalFraction[cell]))
            {
                bool observed = channels.AllPresentAt(cell);
                noSolution += observed ? 1 : 0;
                noObservation += observed ? 0 : 1;
                conditions[cell] |= observed ? CellConditions.NoSolution : CellConditions.NoObservation;
            }
        }

        return (noObservation, noSolution);
    }
}
