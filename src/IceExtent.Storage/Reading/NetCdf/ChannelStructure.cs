using IceExtent.Grids;
using IceExtent.Retrieval;
using PureHDF;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>All that must be known of a channel's variable before its cells are read; holds nothing of an open file.</summary>
/// <param name="Channel">The channel.</param>
/// <param name="Name">The variable's name.</param>
/// <param name="Shape">The variable's axes.</param>
/// <param name="Turn">Which axes run against the grid's.</param>
/// <param name="Rule">What the stored numbers mean.</param>
/// <param name="Chunk">The length of a chunk along every axis, or null where the numbers stand in one piece.</param>
internal sealed record ChannelStructure(
    Channel Channel, string Name, PlaneShape Shape, Turn Turn, KelvinRule Rule, ulong[]? Chunk)
{
    /// <summary>Finds it out from an open file.</summary>
    /// <exception cref="Faults.FaultException">The variable is not there, not on the grid or not readable.</exception>
    public static ChannelStructure Of(
        HdfFile file, Channel channel, string name, Grid grid, GridAgreement agreement, KelvinRules rules)
    {
        FileVariable variable = file.Variable(name);
        GridAxes axes = GridAxes.Find(variable, grid);
        ulong[]? chunk = ChunkLimits.BytesOf(variable) is null ? null : variable.Dataset.Layout.Chunks;
        KelvinRule rule = rules.For(channel, PackingAttributes.Of(variable));
        return new(channel, name, axes.Shape, agreement.TurnOf(variable, axes), rule, chunk);
    }
}
