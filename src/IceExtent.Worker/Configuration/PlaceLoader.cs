using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.Outlines;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads the places that a run file names and finds their cells.</summary>
internal sealed class PlaceLoader
{
    private readonly List<DrawnPlace> drawn = [];
    private readonly List<string> paths = [];
    private readonly double? mostLandShare;
    private readonly bool usable;

    /// <summary>Reads the files.</summary>
    /// <param name="scope">The run file.</param>
    /// <param name="layered">The run file over the defaults.</param>
    /// <param name="runFolder">Where paths start.</param>
    public PlaceLoader(ConfigScope scope, LayeredScope layered, string runFolder)
    {
        int before = scope.Faults.Count;
        foreach ((string written, ConfigPosition at) in scope.Texts("places", required: false) ?? [])
        {
            string path = Path.GetFullPath(written, runFolder);
            if (!PlaceFile.Endings.Any(ending => written.EndsWith(ending, StringComparison.OrdinalIgnoreCase)))
            {
                scope.Faults.Add(new("IE1007", scope.Where("places", at), $"the file {written}", $"files that end in {string.Join(", ", PlaceFile.Endings)}", "Save the places as one of these."));
            }
            else if (paths.Contains(path))
            {
                scope.Faults.Add(new("IE1003", scope.Where("places", at), $"the file {written} a second time", "each file once", "Remove one of the two."));
            }
            else
            {
                paths.Add(path);
                drawn.AddRange(PlaceFile.Read(path, scope.Faults));
            }
        }

        RegionLoader.RefuseSecondNames(drawn.Select(place => (place.Outline.Name, place.Where)), "each name once over all files of places of a run", scope.Faults);
        mostLandShare = layered.Number("routes", "most_land_share", 0.0, 1.0, string.Empty);
        usable = scope.Faults.Count == before;
    }

    /// <summary>Takes the cells from the archive where they are those of the same files, grid and land; else finds them.</summary>
    /// <returns>The places; without those that have no cell, after adding IE1510 or IE1511.</returns>
    public PlaceSettings FindOn(GridLand land, ICollection<Fault> faults)
    {
        if (paths.Count == 0 || !usable)
        {
            return PlaceSettings.None;
        }

        string digest = land.DigestWith(paths, FormattableString.Invariant($"places {mostLandShare:R}"));
        string stored = new ArchiveLayout(land.Archive).PlaceCellFile(land.Grid.Hemisphere);
        if (PlaceCellTable.Read(stored, land.Grid, digest) is { } known)
        {
            return new(paths, known, digest, Stored: true);
        }

        PlaceSearch search = new(land.Grid, land.Ocean);
        List<GridPlace> places = [];
        foreach (DrawnPlace place in drawn.OrderBy(place => place.Outline.Name, StringComparer.Ordinal))
        {
            GridPlace found = search.CellsOf(place.Outline);
            places.Add(found);
            if (found.Cells.Count == 0)
            {
                faults.Add(OutOfReach(land.Grid, search, place));
            }
            else if (place.Outline.IsRoute && OverLand(land, place) is { } fault)
            {
                faults.Add(fault);
            }
        }

        return new(paths, places, digest, Stored: false);
    }

    private static Fault OutOfReach(Grid grid, PlaceSearch search, DrawnPlace place)
    {
        string found = FormattableString.Invariant($"no ocean cell of {grid.Name} within {place.Outline.ReachMeters / 1000.0:0.###} km");
        return search.NearestMeters(place.Outline) is { } nearest
            ? new(
                "IE1510",
                place.Where,
                FormattableString.Invariant($"{found}; the center of the nearest is {nearest / 1000.0:F1} km away"),
                "a place with the center of an ocean cell in reach",
                nearest > 1e6 ? "Check latitude and longitude, and that the grid is that of the place's hemisphere." : "Widen the reach, or move the place to the water.")
            : new("IE1510", place.Where, $"{found}; the grid has no ocean at all", "a grid with ocean", "Check the land file of the grid.");
    }

    private Fault? OverLand(GridLand land, DrawnPlace place)
    {
        RouteOnLand course = RouteOnLand.Of(land.Grid, place.Outline, land.Ocean);
        return course.Share <= mostLandShare
            ? null
            : new(
                "IE1511",
                place.Where,
                FormattableString.Invariant($"{course.Share:P1} of the route over land cells or off the grid, first at longitude {course.FirstAt?.LongitudeDegrees:F3}, latitude {course.FirstAt?.LatitudeDegrees:F3}"),
                FormattableString.Invariant($"at most {mostLandShare:P0} (routes.most_land_share)"),
                "Draw the route over water, or allow more.");
    }
}
