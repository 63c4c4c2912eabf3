using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>A plane of shares from 0 to 1 that holds on every day: what it is called and how its faults are told.</summary>
/// <param name="VariableName">The variable.</param>
/// <param name="Share">What one number is called in an error.</param>
/// <param name="Allowed">What must be in the file.</param>
/// <param name="Remedy">What to do about any fault.</param>
/// <param name="OtherGridCode">The file is on another grid.</param>
/// <param name="UnreadableCode">The file cannot be read.</param>
/// <param name="NoPlaneCode">There are no such shares in it.</param>
internal sealed record SharePlane(
    string VariableName, string Share, string Allowed, string Remedy, string OtherGridCode, string UnreadableCode, string NoPlaneCode)
{
    /// <summary>Reads one plane, turned as the grid runs.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <param name="missing">What a cell without a value gets.</param>
    /// <exception cref="FaultException">One of the three codes.</exception>
    public float[] Read(string path, Grid grid, float missing)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(grid);
        try
        {
            return HdfFile.Read(path, file => Shares(file, grid, missing));
        }
        catch (FaultException cause) when (cause.Fault.Code != NoPlaneCode)
        {
            throw new FaultException(AsOwnFault(cause.Fault), cause);
        }
    }

    private float[] Shares(HdfFile file, Grid grid, float missing)
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
                float.NaN => missing,
                >= 0f and <= 1f => share,
                _ => throw NoShares(plane, FormattableString.Invariant($"a {Share} of {share} in row {cell / grid.Columns}, column {cell % grid.Columns}")),
            };
        }

        return shares;
    }

    private FaultException NoShares(FileVariable plane, string found) => new(new(NoPlaneCode, plane.Where, found, Allowed, Remedy));

    // What reading any file may find, with the remedy of this kind of file.
    private Fault AsOwnFault(Fault fault) => fault with
    {
        Code = fault.Code switch
        {
            "IE2107" or "IE2108" => OtherGridCode,
            "IE2105" or "IE2106" or "IE2111" => NoPlaneCode,
            _ => UnreadableCode,
        },
        Remedy = Remedy,
    };
}
