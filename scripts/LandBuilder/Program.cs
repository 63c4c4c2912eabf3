using System.Globalization;
using System.Text.Json;
using IceExtent.Grids;
using IceExtent.LandBuilder;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;
using IceExtent.Worker.Configuration;
using NetTopologySuite.Geometries;

// Writes the land file of each grid named on the command line. See scripts/build-land.sh.
if (args.Length < 3)
{
    await Console.Error.WriteLineAsync("Usage: LandBuilder LAND_TOPOJSON ICE_FRONTS GRID_TOML...").ConfigureAwait(false);
    return 2;
}

using JsonDocument topology = JsonDocument.Parse(await File.ReadAllBytesAsync(args[0]).ConfigureAwait(false));
MultiPolygon land = LandOutlines.WithPolesInPlace(new Topology(topology.RootElement).Polygons("land"));
MultiPolygon iceFronts = IceFronts.Read(args[1]);
List<Fault> faults = [];
foreach (string gridFile in args[2..])
{
    if (GridLoader.Load(gridFile, faults) is not { } loaded)
    {
        continue;
    }

    Grid grid = loaded.Grid;
    float[] shares = LandOutlines.Shares(grid, land, iceFronts);
    GridFile.WriteUndated(loaded.LandPath, grid, [LandOutlines.Variable(shares)], LandOutlines.Attributes(grid));
    double squareKilometers = 0.0;
    for (int cell = 0; cell < shares.Length; cell++)
    {
        squareKilometers += float.IsNaN(shares[cell]) ? 0.0 : shares[cell] * grid.CellAreasSquareMeters[cell] / 1e6;
    }

    Console.WriteLine(string.Create(
        CultureInfo.InvariantCulture,
        $"{grid.Name}: {squareKilometers:N0} km2 of land, {new FileInfo(loaded.LandPath).Length:N0} bytes"));
}

faults.ForEach(Console.Error.WriteLine);
return faults.Count == 0 ? 0 : 2;
