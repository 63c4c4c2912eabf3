namespace IceExtent.Storage.Faults;

/// <summary>Work on one file, day or folder cannot go on. It always says where and what to do.</summary>
#pragma warning disable CA1032 // No constructor without a fault: that is the point of the type.
public sealed class FaultException : Exception
#pragma warning restore CA1032
{
    /// <summary>Makes the error.</summary>
    /// <param name="fault">What is shown to the person who runs the program.</param>
    /// <param name="cause">What a library threw, or null.</param>
    public FaultException(Fault fault, Exception? cause = null)
        : base(fault?.ToString(), cause)
    {
        ArgumentNullException.ThrowIfNull(fault);
        Fault = fault;
    }

    /// <summary>What is wrong.</summary>
    public Fault Fault { get; }
}
