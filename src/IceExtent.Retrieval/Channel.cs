namespace IceExtent.Retrieval;

/// <summary>A radiometer channel by its nominal frequency in GHz and its polarisation.</summary>
/// <remarks>
/// The name is nominal: 19 stands for 18.0 to 19.35 GHz, 22 for 21 to 23.8, 37 for 36.5 to 37, 89 for 85.5 to 91.7.
/// A sensor's file says which frequency it has.
/// </remarks>
public enum Channel
{
    /// <summary>19 GHz, vertical.</summary>
    V19,

    /// <summary>19 GHz, horizontal.</summary>
    H19,

    /// <summary>22 GHz, vertical.</summary>
    V22,

    /// <summary>37 GHz, vertical.</summary>
    V37,

    /// <summary>37 GHz, horizontal.</summary>
    H37,

    /// <summary>89 GHz, vertical.</summary>
    V89,

    /// <summary>89 GHz, horizontal.</summary>
    H89,
}
