namespace IceExtent.Retrieval;

/// <summary>Takes ice that land has feigned out of a day's concentrations. Immutable and safe to use from several threads.</summary>
public interface ICoastStep
{
    /// <summary>Corrects one day, after screening and clipping.</summary>
    /// <param name="planes">
    /// Total and ice types shrink in the same proportion, and <see cref="CellConditions.CoastCorrected"/> is set, where
    /// there was ice to take away. The standard error is left as it is. NaN stays NaN.
    /// </param>
    /// <returns>The number of cells changed.</returns>
    int Correct(ConcentrationPlanes planes);
}
