using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Statistics;
using IceExtent.Storage.Reading;

namespace IceExtent.Worker.Configuration;

/// <summary>One source of a run: a sensor and its files.</summary>
/// <param name="Sensor">The sensor.</param>
/// <param name="SensorPath">Its configuration file.</param>
/// <param name="Description">Its files and how they are read.</param>
/// <param name="Status">Whether its days may still change.</param>
internal sealed record RunSource(Sensor Sensor, string SensorPath, SourceDescription Description, DayStatus Status)
{
    /// <summary>The days it may rule.</summary>
    public SourcePeriod Period { get; init; }

    /// <summary>What is taken off its temperatures, or null.</summary>
    public ChannelOffsets? Offsets { get; init; }
}

/// <summary>A checked run file. An instance is always valid.</summary>
internal sealed record RunSettings
{
    /// <summary>The run file, absolute.</summary>
    public required string RunFile { get; init; }

    /// <summary>The archive's folder, absolute.</summary>
    public required string Output { get; init; }

    public required Grid Grid { get; init; }

    /// <summary>The files beside the run file that decide numbers: defaults, grid, land.</summary>
    public required IReadOnlyList<string> ConfigPaths { get; init; }

    /// <summary>The parts of the ocean that get totals of their own.</summary>
    public required RegionSettings Regions { get; init; }

    /// <summary>The harbors, points and routes that get series of their own.</summary>
    public required PlaceSettings Places { get; init; }

    /// <summary>Whether each cell counts as ocean.</summary>
    public required bool[] Ocean { get; init; }

    /// <summary>How much of each cell is land.</summary>
    public required LandShare Land { get; init; }

    /// <summary>What is done about land in the footprints of ocean cells.</summary>
    public required CoastSettings Coast { get; init; }

    /// <summary>Whether and how tie points follow samples.</summary>
    public required TiePointSettings TiePoints { get; init; }

    /// <summary>What is done about weather that looks like ice.</summary>
    public required WeatherSettings Weather { get; init; }

    /// <summary>How an ice mask is made of the archive; decides no number of the archive itself.</summary>
    public required IceMaskRules IceMask { get; init; }

    /// <summary>Whether melt signals are written, and how melt is found.</summary>
    public required MeltSettings Melt { get; init; }

    public required IReadOnlyList<string> Methods { get; init; }

    public required bool WriteGrids { get; init; }

    public required TotalsRules Rules { get; init; }

    /// <summary>The observed neighbours from which on an empty cell is filled; 0 where none is.</summary>
    public required int LeastNeighbours { get; init; }

    /// <summary>How empty cells are filled from days before and after, or null where they are not.</summary>
    public required DayFillingRules? DayFilling { get; init; }

    /// <summary>Whether days without usable input are made wholly from days before and after.</summary>
    public required bool FillMissingDays { get; init; }

    /// <summary>The share of the polar gap's rim that must be observed where the gap is filled. Unit: 1.</summary>
    public required double LeastRimShare { get; init; }

    public required double LandLimitFraction { get; init; }

    public required ErrorLengths ErrorLengths { get; init; }

    /// <summary>How much a change from cell to cell widens a standard error.</summary>
    public required SmearingFactors Smearing { get; init; }

    /// <summary>How days that two sensors both saw are compared.</summary>
    public required OverlapSettings Overlap { get; init; }

    /// <summary>How season dates are found, or null where the run finds none. It decides no number of the days.</summary>
    public required SeasonSettings? Season { get; init; }

    /// <summary>A line that every output carries, or null.</summary>
    public required string? Notice { get; init; }

    /// <summary>In the order of the run file: where two have a day, the first rules.</summary>
    public required IReadOnlyList<RunSource> Sources { get; init; }
}
