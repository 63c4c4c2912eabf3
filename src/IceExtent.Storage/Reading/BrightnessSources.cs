using IceExtent.Storage.Reading.NetCdf;
using IceExtent.Storage.Reading.RawGrids;

namespace IceExtent.Storage.Reading;

/// <summary>Chooses the reader of a source.</summary>
public static class BrightnessSources
{
    /// <summary>Opens a source; no file is touched yet.</summary>
    public static IBrightnessSource Open(SourceDescription description)
    {
        ArgumentNullException.ThrowIfNull(description);
        return description.Raw is null ? new NetCdfSource(description) : new RawGridSource(description, description.Raw);
    }
}
