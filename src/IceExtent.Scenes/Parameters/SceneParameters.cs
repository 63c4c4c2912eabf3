namespace IceExtent.Scenes.Parameters;

/// <summary>Everything tunable about an invented scene. Read from config/scenes; no value has a default in code.</summary>
/// <remarks>
/// In files each property is a key in <c>snake_case</c>, and each group below is a table. Range checks:
/// <c>SceneCheck</c>.
/// </remarks>
public sealed record SceneParameters
{
    /// <summary>A name for people.</summary>
    public required string Title { get; init; }

    /// <summary>The yearly march of the ice edge.</summary>
    public required SeasonParameters Season { get; init; }

    /// <summary>What the ice looks like inside and at its edge.</summary>
    public required IceParameters Ice { get; init; }

    /// <summary>Sea, air, wind, vapor and cloud.</summary>
    public required WeatherParameters Weather { get; init; }

    /// <summary>A melt season with a day of its own in every cell.</summary>
    public required MeltSeasonParameters MeltSeason { get; init; }

    /// <summary>How the surfaces emit.</summary>
    public required SurfaceParameters Surfaces { get; init; }

    /// <summary>The radiometer, beyond what its sensor file says.</summary>
    public required InstrumentParameters Instrument { get; init; }

    /// <summary>What is not observed.</summary>
    public required CoverageParameters Coverage { get; init; }
}
