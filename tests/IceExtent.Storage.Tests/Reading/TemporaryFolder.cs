namespace IceExtent.Storage.Tests.Reading;

/// <summary>A folder that is removed when the test ends.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    private readonly DirectoryInfo folder = Directory.CreateTempSubdirectory("iceextent-reading-");

    /// <summary>Writes a file and gives its path.</summary>
    public string Write(string name, byte[] bytes)
    {
        string path = PathOf(name);
        File.WriteAllBytes(path, bytes);
        return path;
    }

    /// <summary>A path in the folder.</summary>
    public string PathOf(string name) => Path.Combine(folder.FullName, name);

    public void Dispose() => folder.Delete(recursive: true);
}
