using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads how much of every cell is land.</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates in m or km, a grid mapping and a plane
/// <c>land_area_fraction</c> of numbers, packed or plain. Rows and columns may run either way and in either order. A
/// cell without a value counts as land: no ocean is known to be there.
/// </remarks>
public static class LandShareFile
{
    /// <summary>The name of the plane; also its [CF] standard name.</summary>
    public const string VariableName = "land_area_fraction";

    private const string Remedy = "Write the file for this grid with scripts/build-land.sh, or name the right one as land in the grid file.";

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <exception cref="FaultException">IE2201: another grid. IE2202: not readable. IE2203: no plane of shares in it.</exception>
    public static LandShare Read(string path, Grid grid)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(grid);
        try
        {
            return new(HdfFile.Read(path, file => Shares(file, grid)));
        }
        catch (FaultException cause) when (!cause.Fault.Code.StartsWith("IE22", StringComparison.Ordinal))
        {
            throw new FaultException(AsLandFault(cause.Fault), cause);
        }
    }

    private static float[] Shares(HdfFile file, Grid grid)
    {
        FileVariable plane = file.Variable(VariableName);
        GridAxes axes = GridAxes.Find(plane, grid);
        Turn turn = new GridAgreement(grid).TurnOf(plane, axes);
        KelvinEncoding encoding = PackingAttributes.Of(plane);
        if (axes.Shape.Steps != 1 || encoding.Number != plane.Number)
        {
            throw NoShares(
                plane,
                axes.Shape.Steps != 1 ? $"{axes.Shape.Steps} steps of time" : "numbers whose sign an attribute turns round");
        }

        file.ReadingCellsOf = VariableName;
        double[] stored = plane.ReadAll(grid.CellCount) ?? throw NoShares(plane, "no numbers");
        CellOrder order = axes.Shape
            .OrderIn(grid, axes.Shape.Lengths, new ulong[axes.Shape.Lengths.Length])
            .Turned(turn.Rows, turn.Columns);
        float[] shares = new float[grid.CellCount];
        for (int cell = 0; cell < shares.Length; cell++)
        {
            int at = order.First + (cell / grid.Columns * order.RowStride) + (cell % grid.Columns * order.ColumnStride);
            float share = encoding.ToKelvins(stored[at]); // The rules of packing are the same for every unit.
            shares[cell] = share switch
            {
                float.NaN => 1f,
                >= 0f and <= 1f => share,
                _ => throw NoShares(plane, FormattableString.Invariant($"a land share of {share} in row {cell / grid.Columns}, column {cell % grid.Columns}")),
            };
        }

        return shares;
    }

    private static FaultException NoShares(FileVariable plane, string found) => new(
        new("IE2203", plane.Where, found, $"one plane {VariableName} of shares from 0 (sea) to 1 (land)", Remedy));

    // What reading any file may find, with the remedy of a land file.
    private static Fault AsLandFault(Fault fault) => fault with
    {
        Code = fault.Code switch
        {
            "IE2107" or "IE2108" => "IE2201",
            "IE2105" or "IE2106" or "IE2111" => "IE2203",
            _ => "IE2202",
        },
        Remedy = Remedy,
    };
}
