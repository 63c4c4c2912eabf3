using System.Globalization;

namespace IceExtent.Grids.Outlines;

/// <summary>A ring cannot be read.</summary>
#pragma warning disable CA1032 // No constructor without a fault: that is the point of the type.
internal sealed class RingRefusedException(OutlineFault fault) : ArgumentException(string.Create(
    CultureInfo.InvariantCulture,
    $"The ring has {fault.What} (at longitude {fault.At.LongitudeDegrees}, latitude {fault.At.LatitudeDegrees}). Put its vertices at most 90 degrees of longitude apart."))
#pragma warning restore CA1032
{
    /// <summary>What is wrong.</summary>
    public OutlineFault Fault { get; } = fault;
}
