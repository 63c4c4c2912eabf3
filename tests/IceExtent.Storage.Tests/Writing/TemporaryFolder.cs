namespace IceExtent.Storage.Tests.Writing;

/// <summary>An empty folder that is deleted when the test ends.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    private readonly DirectoryInfo folder = Directory.CreateTempSubdirectory("iceextent-");

    public string Path => folder.FullName;

    public string PathOf(params string[] parts) => System.IO.Path.Combine([Path, .. parts]);

    /// <summary>Every file below, by its path from here, in ordinal order.</summary>
    public IEnumerable<string> Files() => Directory
        .EnumerateFiles(Path, "*", SearchOption.AllDirectories)
        .Select(file => System.IO.Path.GetRelativePath(Path, file))
        .Order(StringComparer.Ordinal);

    public void Dispose() => folder.Delete(recursive: true);
}
