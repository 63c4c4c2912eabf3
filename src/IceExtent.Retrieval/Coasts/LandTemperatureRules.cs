namespace IceExtent.Retrieval;

/// <summary>What rules the estimate of land's brightness temperature near a coast.</summary>
/// <param name="TileMeters">The side of the squares of the map that get one temperature each.</param>
/// <param name="PureLandFraction">Land cells whose footprints hold at least this share of land in every channel tell it directly.</param>
/// <param name="SearchMeters">How far away such cells may be.</param>
/// <param name="Cells">How many of them are enough.</param>
/// <param name="SpreadKelvins">How much land beside the coast differs from such cells at no distance: a standard deviation.</param>
/// <param name="SpreadKelvinsPerMeter">How much that grows with distance.</param>
/// <param name="LeastResidualKelvins">The fit of a tile is never taken to be better than this: a standard deviation.</param>
/// <param name="CellsPerLook">So many cells of a fit count as one, because their footprints overlap.</param>
/// <param name="MostErrorKelvins">A tile whose temperature is less sure than this standard error has none.</param>
public sealed record LandTemperatureRules(
    double TileMeters,
    double PureLandFraction,
    double SearchMeters,
    int Cells,
    double SpreadKelvins,
    double SpreadKelvinsPerMeter,
    double LeastResidualKelvins,
    double CellsPerLook,
    double MostErrorKelvins);
