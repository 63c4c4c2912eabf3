using IceExtent.Grids;
using IceExtent.Retrieval;
using IceExtent.Scenes.Emission;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.Observation;
using IceExtent.Scenes.Parameters;
using IceExtent.Scenes.World;

namespace IceExtent.Scenes;

/// <summary>An invented sea with ice whose truth is known, seen by a real or invented radiometer.</summary>
/// <remarks>
/// Everything follows from the parameters and the seed. A day does not depend on any other day being made, so days
/// may be made in any order and on any number of threads, each with its own <see cref="SceneWorkspace"/>, and come
/// out the same to the last bit (on one kind of processor: exponentials may round differently on another). What the
/// sea looks like does not depend on the sensor: two sensors see one truth.
/// </remarks>
public sealed class Scene
{
    /// <summary>The radiometer that a scene has where nothing is said.</summary>
    public const int FirstRadiometer = 1;

    private readonly IceCover ice;
    private readonly Weather weather;
    private readonly MeltSeason? meltSeason;
    private readonly Instrument instrument;
    private readonly Coverage coverage;
    private readonly EmissionKernel[] kernels;
    private readonly float[] landShare;

    /// <summary>Sets a scene up; no day is made yet.</summary>
    /// <param name="parameters">Season, ice, weather, surfaces, instrument and coverage.</param>
    /// <param name="grid">The grid.</param>
    /// <param name="land">The share of land of every cell of the grid.</param>
    /// <param name="sensor">The radiometer; its tie points in the hemisphere of the grid are the pure surfaces.</param>
    /// <param name="seed">Another seed, another sea.</param>
    /// <param name="radiometer">Another number, another radiometer over the same sea: other noise, other lost days, passes and cells.</param>
    /// <exception cref="ArgumentException">
    /// A parameter is out of range (see <see cref="SceneCheck.FindProblems"/>), the land shares belong to another grid,
    /// or no emissivity fits a tie point.
    /// </exception>
    public Scene(SceneParameters parameters, Grid grid, LandShare land, Sensor sensor, long seed, int radiometer = FirstRadiometer)
    {
        ArgumentNullException.ThrowIfNull(parameters);
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(land);
        ArgumentNullException.ThrowIfNull(sensor);
        if (SceneCheck.FindProblems(parameters) is [SceneProblem first, ..])
        {
            throw new ArgumentException(first.ToString(), nameof(parameters));
        }

        if (land.Fraction.Length != grid.CellCount)
        {
            throw new ArgumentException(
                $"There are land shares of {land.Fraction.Length} cells; the grid has {grid.CellCount}.", nameof(land));
        }

        (Grid, Sensor) = (grid, sensor);
        ulong key = Draws.Mix((ulong)seed);
        SeasonClock clock = new(parameters.Season, Draws.Key(key, 1));
        ice = new(parameters.Ice, clock, grid, land, Draws.Key(key, 2));
        weather = new(parameters.Weather, parameters.Surfaces, grid, Draws.Key(key, 3));
        meltSeason = parameters.MeltSeason.Imposed
            ? new(parameters.MeltSeason, parameters.Weather.FreezingKelvins, parameters.Surfaces.AirShareInIce, grid, Draws.Key(key, 7))
            : null;
        ulong own = radiometer == FirstRadiometer ? key : Draws.Key(Draws.Key(key, 6), radiometer);
        instrument = new(parameters.Instrument, sensor.FirstDay, grid.Frame.CellMeters, Draws.Key(own, 4));
        coverage = new(parameters.Coverage, sensor.FirstDay, sensor.PolarGapLatitudeDegrees, grid, Draws.Key(own, 5));

        SurfaceEmission surfaces = new(
            parameters.MeltSeason.Imposed ? parameters.Surfaces with { WetIceEmissivity = parameters.MeltSeason.WetIceEmissivity } : parameters.Surfaces,
            parameters.Instrument.IncidenceDegrees, sensor, sensor.In(grid.Hemisphere).TiePoints);
        Channels = surfaces.Channels;
        kernels = [.. Channels.Select(channel => OceanConstants.BandOf(channel)!).Distinct().Select(band =>
            new EmissionKernel(surfaces, band, parameters.Weather.FreezingKelvins, parameters.Weather.WarmestSeaKelvins))];
        landShare = new float[PlaneMath.PaddedLength(grid.CellCount)];
        land.Fraction.CopyTo(landShare);
    }

    /// <summary>The grid of every plane.</summary>
    public Grid Grid { get; }

    /// <summary>The radiometer.</summary>
    public Sensor Sensor { get; }

    /// <summary>The channels that can be made: those of the sensor that the ocean model knows.</summary>
    public IReadOnlyList<Channel> Channels { get; }

    /// <summary>Makes room for a thread.</summary>
    public SceneWorkspace CreateWorkspace() => new(this);

    /// <summary>Whether a whole day is missing; days outside the sensor's service count as missing.</summary>
    public bool IsMissing(DateOnly day) => !Sensor.Serves(day) || coverage.IsMissing(day);

    /// <summary>Writes the true ice of a day, missing days included.</summary>
    /// <param name="day">The day, UTC; the state is that of noon.</param>
    /// <param name="workspace">Room of this scene.</param>
    /// <param name="truth">Receives the ice.</param>
    /// <exception cref="ArgumentException">The workspace belongs to another scene, or a plane has another length.</exception>
    public void Truth(DateOnly day, SceneWorkspace workspace, SceneTruth truth)
    {
        Check(workspace);
        ArgumentNullException.ThrowIfNull(truth);
        if (truth.Concentration.Length != Grid.CellCount)
        {
            throw new ArgumentException($"The truth has {truth.Concentration.Length} cells; the grid has {Grid.CellCount}.", nameof(truth));
        }

        ice.Fill(TimeOf(day), workspace.Scratch, (workspace.First, workspace.Second), workspace.Cells);
        float[] firstYear = workspace.Cells.FirstYear;
        float[] multiyear = workspace.Cells.Multiyear;
        for (int cell = 0; cell < truth.Concentration.Length; cell++)
        {
            bool sea = landShare[cell] < 1f;
            truth.FirstYear[cell] = sea ? firstYear[cell] : float.NaN;
            truth.Multiyear[cell] = sea ? multiyear[cell] : float.NaN;
            truth.Concentration[cell] = sea ? firstYear[cell] + multiyear[cell] : float.NaN;
        }
    }

    /// <summary>Writes how much of the ice's surface is melting: wet snow or ponds, whichever is more.</summary>
    /// <param name="day">The day, UTC.</param>
    /// <param name="workspace">Room of this scene.</param>
    /// <param name="share">Receives 0 to 1, for cells without ice too. Shape: one value a cell, row-major; none missing.</param>
    /// <exception cref="ArgumentException">The workspace belongs to another scene, or the plane has another length.</exception>
    public void Melt(DateOnly day, SceneWorkspace workspace, Span<float> share)
    {
        Check(workspace);
        if (share.Length != Grid.CellCount)
        {
            throw new ArgumentException($"The plane has {share.Length} cells; the grid has {Grid.CellCount}.", nameof(share));
        }

        FillSurfaces(TimeOf(day), workspace);
        for (int cell = 0; cell < share.Length; cell++)
        {
            share[cell] = Math.Max(workspace.Cells.Wetness[cell], workspace.Cells.PondShare[cell]);
        }
    }

    /// <summary>Whether each cell has a melt season of its own: see <see cref="MeltTurns"/>.</summary>
    public bool HasMeltSeason => meltSeason is not null;

    /// <summary>Writes when the ice of each cell turns wet and dry in the season that begins in a calendar year.</summary>
    /// <param name="year">The year in which the ice turns wet.</param>
    /// <param name="workspace">Room of this scene.</param>
    /// <param name="wet">
    /// Receives the first day on which the surface of ice is more wet than dry at noon, on the scale of
    /// <see cref="DateOnly.DayNumber"/>, for cells without ice too. Shape: one value a cell, row-major; none missing.
    /// </param>
    /// <param name="dry">The same of the first day after them on which it is more dry than wet, and stays so.</param>
    /// <exception cref="InvalidOperationException">The weather decides in this scene.</exception>
    /// <exception cref="ArgumentException">The workspace belongs to another scene, or a plane has another length.</exception>
    public void MeltTurns(int year, SceneWorkspace workspace, Span<int> wet, Span<int> dry)
    {
        Check(workspace);
        if (meltSeason is null)
        {
            throw new InvalidOperationException("No melt season is imposed: melt comes and goes with the weather in this scene.");
        }

        if (wet.Length != Grid.CellCount || dry.Length != Grid.CellCount)
        {
            throw new ArgumentException($"The planes have {wet.Length} and {dry.Length} cells; the grid has {Grid.CellCount}.", nameof(wet));
        }

        meltSeason.FillTurns(year, workspace.Scratch, workspace.First, workspace.Second);
        for (int cell = 0; cell < wet.Length; cell++)
        {
            wet[cell] = MeltSeason.DayNumberOf(year, workspace.First[cell]);
            dry[cell] = MeltSeason.DayNumberOf(year, workspace.Second[cell]);
        }
    }

    /// <summary>Writes what the radiometer reports for a day.</summary>
    /// <param name="day">The day, UTC.</param>
    /// <param name="workspace">Room of this scene.</param>
    /// <param name="into">
    /// Receives every channel that it holds and the scene can make, in K; NaN where nothing was observed, everywhere
    /// on a missing day, and in channels that the scene cannot make.
    /// </param>
    /// <exception cref="ArgumentException">The workspace belongs to another scene, or the planes have another length.</exception>
    public void Observe(DateOnly day, SceneWorkspace workspace, BrightnessPlanes into)
    {
        Check(workspace);
        ArgumentNullException.ThrowIfNull(into);
        if (into.CellCount != Grid.CellCount)
        {
            throw new ArgumentException($"The planes have {into.CellCount} cells; the grid has {Grid.CellCount}.", nameof(into));
        }

        into.Clear();
        if (IsMissing(day))
        {
            return;
        }

        FillSurfaces(TimeOf(day), workspace);
        foreach (EmissionKernel kernel in kernels)
        {
            kernel.Paint(workspace.Cells, landShare, workspace.PlaneOf);
        }

        coverage.MarkLost(day, workspace.Lost);
        foreach (Channel channel in Channels.Where(into.Has))
        {
            Span<float> observed = into.Kelvins(channel);
            instrument.Observe(
                day, channel, workspace.PlaneOf(channel).AsSpan(0, Grid.CellCount), Grid.Columns, workspace.First, observed);
            Blank(workspace.Lost, observed);
        }
    }

    private void FillSurfaces(double time, SceneWorkspace workspace)
    {
        ice.Fill(time, workspace.Scratch, (workspace.First, workspace.Second), workspace.Cells);
        weather.Fill(
            time, ice.Clock.Summerness(time), workspace.Scratch, (workspace.First, workspace.Second), workspace.Storms, workspace.Cells);
        meltSeason?.Impose(time, workspace.Scratch, (workspace.First, workspace.Second), workspace.Cells);
    }

    private static double TimeOf(DateOnly day) => day.DayNumber + 0.5;

    private static void Blank(ReadOnlySpan<bool> lost, Span<float> kelvins)
    {
        for (int cell = 0; cell < kelvins.Length; cell++)
        {
            kelvins[cell] = lost[cell] ? float.NaN : kelvins[cell];
        }
    }

    private void Check(SceneWorkspace workspace)
    {
        ArgumentNullException.ThrowIfNull(workspace);
        if (!ReferenceEquals(workspace.Owner, this))
        {
            throw new ArgumentException("The workspace belongs to another scene.", nameof(workspace));
        }
    }
}
