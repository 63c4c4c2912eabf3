using Microsoft.Extensions.FileSystemGlobbing;

namespace IceExtent.Worker.Configuration;

/// <summary>Finds the files a pattern means.</summary>
internal static class FileGlob
{
    private static readonly char[] Wildcards = ['*', '?'];

    /// <summary>The files that match, as absolute paths in ordinal order.</summary>
    /// <param name="pattern">A path with <c>*</c>, <c>?</c> (in the last part) and <c>**</c>, relative to a folder or absolute.</param>
    /// <param name="folder">What a relative pattern starts from.</param>
    public static IReadOnlyList<string> Find(string pattern, string folder)
    {
        string[] parts = pattern.Replace('\\', '/').Split('/');
        int wild = Array.FindIndex(parts, part => part.IndexOfAny(Wildcards) >= 0);
        int fixedParts = wild < 0 ? parts.Length - 1 : wild;
        string fixedPath = string.Join('/', parts[..fixedParts]);
        string start = Path.GetFullPath(fixedPath.Length == 0 && pattern.StartsWith('/') ? "/" : fixedPath, folder);
        if (!Directory.Exists(start))
        {
            return [];
        }

        Matcher matcher = new(StringComparison.Ordinal);
        matcher.AddInclude(string.Join('/', parts[fixedParts..]));
        return [.. matcher.GetResultsInFullPath(start).Order(StringComparer.Ordinal)];
    }
}
