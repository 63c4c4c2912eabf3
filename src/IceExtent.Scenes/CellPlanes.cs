using IceExtent.Scenes.Fields;

namespace IceExtent.Scenes;

/// <summary>The state of every cell on one day, plane by plane. See <see cref="Emission.CellState"/> for units.</summary>
/// <remarks>Planes are padded so that whole vectors fill them; the padding holds harmless numbers.</remarks>
internal sealed class CellPlanes(int cellCount)
{
    private readonly int length = PlaneMath.PaddedLength(cellCount);

    /// <summary>The length of every plane.</summary>
    public int Length => length;

    /// <summary>How far inside the edge a cell lies, in degrees of latitude; negative outside.</summary>
    public float[] DepthDegrees { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] FirstYear { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] Multiyear { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] PondShare { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] Wetness { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] SeaKelvins { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] IceKelvins { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] LandKelvins { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] Wind { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] Vapor { get; } = new float[PlaneMath.PaddedLength(cellCount)];

    public float[] Cloud { get; } = new float[PlaneMath.PaddedLength(cellCount)];
}
