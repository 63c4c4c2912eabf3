namespace IceExtent.Worker.Configuration;

/// <summary>A place in a configuration file. Lines and columns count from 1.</summary>
internal readonly record struct ConfigPosition(string File, int Line, int Column)
{
    public override string ToString() => Line > 0 ? FormattableString.Invariant($"{File}, line {Line}, column {Column}") : File;
}

/// <summary>A value of a configuration file with its place.</summary>
internal abstract record ConfigNode(ConfigPosition At);

/// <summary>A text, a whole or real number, a flag or a date.</summary>
internal sealed record ConfigScalar(ConfigPosition At, object Value, string Written) : ConfigNode(At);

/// <summary>A list of values; a list of tables where each item is one.</summary>
internal sealed record ConfigList(ConfigPosition At, List<ConfigNode> Items) : ConfigNode(At);

/// <summary>Keys with values, in the order of the file.</summary>
internal sealed record ConfigTable(ConfigPosition At, Dictionary<string, ConfigNode> Entries) : ConfigNode(At)
{
    public ConfigTable(ConfigPosition at)
        : this(at, new(StringComparer.Ordinal))
    {
    }
}
