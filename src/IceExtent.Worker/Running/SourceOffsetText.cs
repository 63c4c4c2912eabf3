using IceExtent.Retrieval;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>Offsets of sources as metadata and digests hold them.</summary>
internal static class SourceOffsetText
{
    /// <summary>One source's offsets, such as <c>19v=0.4(0.05)</c> with standard errors in brackets; <c>none</c> without.</summary>
    public static string Of(RunSource source) => source.Offsets is not { } offsets
        ? "none"
        : string.Join(' ', offsets.Kelvins.Select(pair => FormattableString.Invariant($"{ChannelNames.NameOf(pair.Key)}={pair.Value:R}")
            + (offsets.StandardErrorKelvins.TryGetValue(pair.Key, out double error) ? FormattableString.Invariant($"({error:R})") : string.Empty)));

    /// <summary>Those of all sources that have some, each after its sensor's name; <c>none</c> where no source has.</summary>
    public static string OfAll(IEnumerable<RunSource> sources)
    {
        string all = string.Join("; ", sources.Where(source => source.Offsets is not null).Select(source => $"{source.Sensor.Name}: {Of(source)}"));
        return all.Length == 0 ? "none" : all;
    }
}
