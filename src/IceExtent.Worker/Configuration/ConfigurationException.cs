using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>A run file or a file of config/ cannot be used. Holds every fault found, not only the first.</summary>
#pragma warning disable CA1032 // No constructor without faults: that is the point of the type.
internal sealed class ConfigurationException(IReadOnlyList<Fault> faults)
    : Exception(string.Join(Environment.NewLine, faults))
#pragma warning restore CA1032
{
    /// <summary>What is wrong, in the order of the files.</summary>
    public IReadOnlyList<Fault> Faults { get; } = faults;
}
