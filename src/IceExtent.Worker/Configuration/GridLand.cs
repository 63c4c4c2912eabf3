using System.Security.Cryptography;
using System.Text;
using IceExtent.Grids;

namespace IceExtent.Worker.Configuration;

/// <summary>What regions and places are laid over.</summary>
/// <param name="Loaded">The grid.</param>
/// <param name="Ocean">Whether each cell counts as ocean.</param>
/// <param name="LandLimitFraction">From this share of land on it does not.</param>
/// <param name="Archive">The archive's folder, in which cells may be stored already.</param>
internal sealed record GridLand(LoadedGrid Loaded, bool[] Ocean, double LandLimitFraction, string Archive)
{
    public Grid Grid => Loaded.Grid;

    /// <summary>SHA-256 over the grid, its land, some files and what else decides cells, in hexadecimal.</summary>
    public string DigestWith(IEnumerable<string> paths, string rules)
    {
        using IncrementalHash hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (string path in paths.Prepend(Loaded.LandPath).Prepend(Loaded.ConfigPath))
        {
            hash.AppendData(Encoding.UTF8.GetBytes(Path.GetFileName(path)));
            hash.AppendData(SHA256.HashData(File.ReadAllBytes(path)));
        }

        hash.AppendData(Encoding.UTF8.GetBytes(FormattableString.Invariant($"{ProgramVersion.Text}\n{LandLimitFraction:R}\n{rules}")));
        return Convert.ToHexStringLower(hash.GetHashAndReset());
    }
}
