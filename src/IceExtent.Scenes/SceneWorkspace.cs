using IceExtent.Retrieval;
using IceExtent.Scenes.Fields;
using IceExtent.Scenes.World;

namespace IceExtent.Scenes;

/// <summary>Room for making one day of a scene at a time. One for each thread; made by <see cref="Scene.CreateWorkspace"/>.</summary>
public sealed class SceneWorkspace
{
    private readonly float[]?[] kelvins = new float[]?[ChannelNames.All.Count];

    internal SceneWorkspace(Scene owner)
    {
        Owner = owner;
        int count = owner.Grid.CellCount;
        Cells = new(count);
        Storms = new(count);
        Scratch = new(owner.Grid.Rows, owner.Grid.Columns);
        (First, Second) = (new float[Cells.Length], new float[Cells.Length]);
        Lost = new bool[count];
        foreach (Channel channel in owner.Channels)
        {
            kelvins[(int)channel] = new float[Cells.Length];
        }

        PlaneOf = channel => kelvins[(int)channel]!;
    }

    internal Scene Owner { get; }

    internal CellPlanes Cells { get; }

    internal StormPlanes Storms { get; }

    internal FieldScratch Scratch { get; }

    internal float[] First { get; }

    internal float[] Second { get; }

    internal bool[] Lost { get; }

    internal Func<Channel, float[]> PlaneOf { get; }
}
