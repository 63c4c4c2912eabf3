using IceExtent.Retrieval;

namespace IceExtent.Worker.Configuration;

/// <summary>Where land is taken out of ocean cells.</summary>
internal enum CoastCorrection
{
    /// <summary>Nowhere.</summary>
    Off,

    /// <summary>In brightness temperatures, before the retrieval.</summary>
    Brightness,

    /// <summary>In concentrations, after screening and clipping.</summary>
    Concentration,

    /// <summary>First the one, then the other.</summary>
    Both,
}

/// <summary>What a run does about land in the footprints of ocean cells.</summary>
/// <param name="Correction">Which correction.</param>
/// <param name="Brightness">The rules of the first.</param>
/// <param name="Minimum">The rules of the second where minima are known.</param>
/// <param name="Spill">The rules of the second where none are.</param>
/// <param name="MinimumPath">The file of minima, absolute, or null.</param>
/// <param name="MinimumFraction">The minima on the run's grid, or null.</param>
/// <param name="LeastDaysPerMonth">Where minima are made: a monthly mean of fewer days is none.</param>
internal sealed record CoastSettings(
    CoastCorrection Correction,
    CoastBrightnessRules Brightness,
    CoastMinimumRules Minimum,
    CoastSpillRules Spill,
    string? MinimumPath,
    float[]? MinimumFraction,
    int LeastDaysPerMonth)
{
    /// <summary>Whether temperatures are corrected.</summary>
    public bool InTemperatures => Correction is CoastCorrection.Brightness or CoastCorrection.Both;

    /// <summary>Whether concentrations are corrected.</summary>
    public bool InConcentrations => Correction is CoastCorrection.Concentration or CoastCorrection.Both;
}
