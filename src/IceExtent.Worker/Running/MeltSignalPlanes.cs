using IceExtent.Retrieval;

namespace IceExtent.Worker.Running;

/// <summary>The melt signals of one day in memory of a worker. Not shared between threads.</summary>
internal sealed class MeltSignalPlanes(MeltSignalArchive archive)
{
    /// <summary>19 GHz less 37 GHz, horizontal, in K; NaN without ice or temperatures.</summary>
    public float[] HorizontalRange { get; } = new float[archive.CellCount];

    /// <summary>19 GHz vertical, likewise.</summary>
    public float[] Vertical19 { get; } = new float[archive.CellCount];

    /// <summary>37 GHz vertical, likewise.</summary>
    public float[] Vertical37 { get; } = new float[archive.CellCount];

    /// <summary>Takes the signals of a day and writes them.</summary>
    /// <param name="day">The day.</param>
    /// <param name="observed">Its temperatures.</param>
    /// <param name="first">What the run's first method retrieved of them, before anything was filled.</param>
    /// <param name="method">That method.</param>
    public void Write(DayLabel day, ObservedDay observed, ConcentrationPlanes first, string method)
    {
        ReadOnlySpan<float> v19 = observed.Planes.Kelvins(Channel.V19), h19 = observed.Planes.Kelvins(Channel.H19);
        ReadOnlySpan<float> v37 = observed.Planes.Kelvins(Channel.V37), h37 = observed.Planes.Kelvins(Channel.H37);
        ReadOnlySpan<float> ice = first.Total;
        float least = archive.IceFraction;
        for (int cell = 0; cell < ice.Length; cell++)
        {
            bool has = ice[cell] >= least;
            HorizontalRange[cell] = has ? h19[cell] - h37[cell] : float.NaN;
            Vertical19[cell] = has ? v19[cell] : float.NaN;
            Vertical37[cell] = has ? v37[cell] : float.NaN;
        }

        archive.Write(day, method, this);
    }
}
