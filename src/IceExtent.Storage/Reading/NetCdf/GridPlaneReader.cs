using IceExtent.Grids;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads single planes of real numbers from grid files of an archive. Safe to use from several threads.</summary>
/// <param name="grid">The grid of every file.</param>
internal sealed class GridPlaneReader(Grid grid)
{
    private readonly KelvinRules rules = new(); // The rules of packing are the same for every unit.

    /// <summary>Reads one plane.</summary>
    /// <param name="file">The open file.</param>
    /// <param name="name">The variable.</param>
    /// <param name="values">Receives one value a cell, in the variable's unit; NaN where missing.</param>
    /// <exception cref="Faults.FaultException">IE21xx: the file is on another grid or has no such variable.</exception>
    public void Read(HdfFile file, string name, Span<float> values)
    {
        FileVariable variable = file.Variable(name);
        GridAxes axes = GridAxes.Find(variable, grid);
        ulong[]? chunk = ChunkLimits.BytesOf(variable) is null ? null : variable.Dataset.Layout.Chunks;
        KelvinRule rule = rules.For(default, PackingAttributes.Of(variable));
        ChannelStructure structure = new(default, name, axes.Shape, new GridAgreement(grid).TurnOf(variable, axes), rule, chunk);
        CellReader.Read(file, structure, 0, grid, values);
    }
}
