namespace IceExtent.Storage.Reading;

/// <summary>Chooses the reader of a source.</summary>
public static class BrightnessSources
{
    /// <summary>Opens a source; no file is touched yet.</summary>
    public static IBrightnessSource Open(SourceDescription description)
    {
        ArgumentNullException.ThrowIfNull(description);
        throw new InvalidOperationException("No reader is registered.");
    }
}
