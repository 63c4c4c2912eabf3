using IceExtent.Grids;
using IceExtent.Grids.Outlines;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.Outlines;
using IceExtent.Storage.Writing;
using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the sets of regions that a run file names and lays them over its grid.</summary>
internal sealed class RegionLoader
{
    private static readonly string[] Endings = [".geojson", ".json"];

    private readonly List<DrawnRegion> drawn = [];
    private readonly List<string> paths = [];
    private readonly bool usable;

    /// <summary>Reads the files.</summary>
    /// <param name="scope">The run file.</param>
    /// <param name="config">Where the shipped sets are.</param>
    /// <param name="runFolder">Where paths start.</param>
    public RegionLoader(ConfigScope scope, ConfigFolder config, string runFolder)
    {
        int before = scope.Faults.Count;
        foreach ((string written, ConfigPosition at) in scope.Texts("regions", required: false) ?? [])
        {
            if (Resolve(scope, config, written, at, runFolder) is not { } path)
            {
                continue;
            }

            if (paths.Contains(path))
            {
                scope.Faults.Add(new("IE1003", scope.Where("regions", at), $"the set {written} a second time", "each set once", "Remove one of the two."));
                continue;
            }

            paths.Add(path);
            drawn.AddRange(RegionFile.Read(path, scope.Faults));
        }

        RefuseSecondNames(drawn.Select(region => (region.Outline.Name, region.Where)), "each name once over all sets of a run", scope.Faults);
        usable = scope.Faults.Count == before;
    }

    /// <summary>Computes the cells, where there is no archive; regions without one are left out.</summary>
    public IReadOnlyList<GridRegion> On(Grid grid, bool[] ocean) =>
        [.. drawn.OrderBy(region => region.Outline.Name, StringComparer.Ordinal).Select(region => GridRegion.Of(grid, region.Outline, ocean)).Where(region => region.Cells.Count > 0)];

    /// <summary>Takes the cells from the archive where they are those of the same files, grid and land; else computes them.</summary>
    /// <returns>The regions; without those that have no cell, after adding IE1509.</returns>
    public RegionSettings LayOver(GridLand land, ICollection<Fault> faults)
    {
        if (paths.Count == 0 || !usable)
        {
            return RegionSettings.None;
        }

        string digest = land.DigestWith(paths, "regions");
        string stored = new ArchiveLayout(land.Archive).RegionCellFile(land.Grid.Hemisphere);
        if (RegionCellTable.Read(stored, land.Grid, digest) is { } known)
        {
            return new(paths, known, digest, Stored: true);
        }

        List<GridRegion> regions = [];
        foreach (DrawnRegion region in drawn.OrderBy(region => region.Outline.Name, StringComparer.Ordinal))
        {
            GridRegion laid = GridRegion.Of(land.Grid, region.Outline, land.Ocean);
            regions.Add(laid);
            if (laid.Cells.Count == 0)
            {
                faults.Add(WithoutOcean(land, region));
            }
        }

        return new(paths, regions, digest, Stored: false);
    }

    /// <summary>Adds IE1504 for each name that was there before.</summary>
    public static void RefuseSecondNames(IEnumerable<(string Name, string Where)> named, string allowed, ICollection<Fault> faults)
    {
        foreach (IGrouping<string, (string Name, string Where)> same in named.GroupBy(one => one.Name, StringComparer.Ordinal))
        {
            foreach ((string name, string where) in same.Skip(1))
            {
                faults.Add(new("IE1504", where, $"the name {name} a second time; the first is {same.First().Where}", allowed, "Rename one of the two."));
            }
        }
    }

    private static string? Resolve(ConfigScope scope, ConfigFolder config, string written, ConfigPosition at, string runFolder)
    {
        if (Endings.Any(ending => written.EndsWith(ending, StringComparison.OrdinalIgnoreCase)))
        {
            return Path.GetFullPath(written, runFolder);
        }

        IReadOnlyList<string> names = ConfigFolder.NamesIn(config.Regions, Endings[0]);
        if (names.Contains(written))
        {
            return Path.Combine(config.Regions, written + Endings[0]);
        }

        scope.UnknownName("regions", at, written, [.. names, "a path that ends in .geojson"]);
        return null;
    }

    private static Fault WithoutOcean(GridLand land, DrawnRegion region)
    {
        const string Allowed = "regions with ocean on the grid";
        if (Covers(land.Grid, region.Outline))
        {
            return new("IE1509", region.Where, $"a region of land alone on the grid {land.Grid.Name}", Allowed, "Draw it over the sea, or leave it out.");
        }

        bool swapped = Covers(land.Grid, region.Outline with { LongitudeLatitude = Swapped(region.Outline.LongitudeLatitude) });
        Envelope box = region.Outline.LongitudeLatitude.EnvelopeInternal;
        return new(
            "IE1509",
            region.Where,
            FormattableString.Invariant($"a region outside the grid {land.Grid.Name}: longitudes {box.MinX:0.##} to {box.MaxX:0.##}, latitudes {box.MinY:0.##} to {box.MaxY:0.##}"),
            Allowed,
            swapped
                ? "With longitude and latitude exchanged it would lie on the grid: in GeoJSON the longitude comes first."
                : "Leave it out, or choose the grid of the other hemisphere.");
    }

    private static bool Covers(Grid grid, RegionOutline outline)
    {
        bool[] all = new bool[grid.CellCount];
        Array.Fill(all, true);
        return OutlineCheck.FirstFault(outline.LongitudeLatitude) is null && GridRegion.Of(grid, outline, all).Cells.Count > 0;
    }

    // Latitudes beyond 90 degrees make it lie nowhere.
    private static Geometry Swapped(Geometry geometry)
    {
        Envelope box = geometry.EnvelopeInternal;
        return Math.Max(Math.Abs(box.MinX), Math.Abs(box.MaxX)) <= 90.0
            ? AffineTransformation.ReflectionInstance(1.0, 1.0).Transform(geometry)
            : GeometryFactory.Default.CreatePolygon();
    }
}
