using System.Globalization;
using IceExtent.Storage.Faults;
using Tomlyn;
using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads TOML into nodes that remember where they stand.</summary>
internal static class TomlFile
{
    private const int MostSyntaxFaults = 10;

    /// <summary>Reads a file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="faults">Receives IE1001 when it cannot be read, IE1002 for each syntax error, a key written twice among them.</param>
    /// <returns>The table of the whole file, or null where there are faults.</returns>
    public static ConfigTable? Read(string path, ICollection<Fault> faults)
    {
        string text;
        try
        {
            if (Directory.Exists(path))
            {
                faults.Add(new("IE1001", path, "a folder", "a readable TOML file", "Name the file in it."));
                return null;
            }

            text = File.ReadAllText(path);
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            faults.Add(new("IE1001", path, "a file that cannot be read (" + cause.Message.TrimEnd('.') + ")", "a readable TOML file", "Check the path and its permissions."));
            return null;
        }

        return Parse(text, path, faults);
    }

    /// <summary>Parses text.</summary>
    /// <inheritdoc cref="Read"/>
    public static ConfigTable? Parse(string text, string path, ICollection<Fault> faults)
    {
        if (text.Contains('\0', StringComparison.Ordinal))
        {
            faults.Add(new("IE1002", path, "binary content", "TOML 1.0", "Name the run file, not a data file."));
            return null;
        }

        DocumentSyntax document = SyntaxParser.Parse(text, path);
        if (document.HasErrors)
        {
            // The first message of a line tells its fault; the others follow from it.
            foreach (DiagnosticMessage message in document.Diagnostics.DistinctBy(message => message.Span.Start.Line).Take(MostSyntaxFaults))
            {
                ConfigPosition at = At(message.Span, path);
                faults.Add(new("IE1002", at.ToString(), $"text that is not TOML ({message.Message})", "TOML 1.0", "Correct the line; strings stand in double quotes."));
            }

            return null;
        }

        return new Builder(path).Build(document);
    }

    private static ConfigPosition At(SourceSpan span, string path) => new(path, span.Start.Line + 1, span.Start.Column + 1);

    // The parser has refused keys that come twice or mean two things.
    private sealed class Builder(string path)
    {
        public ConfigTable Build(DocumentSyntax document)
        {
            ConfigTable root = new(new ConfigPosition(path, 0, 0));
            AddAll(document.KeyValues, root);
            foreach (TableSyntaxBase section in document.Tables)
            {
                ConfigTable target = Section(root, section);
                AddAll(section.Items, target);
            }

            return root;
        }

        private ConfigTable Section(ConfigTable root, TableSyntaxBase section)
        {
            List<(string Name, ConfigPosition At)> names = Names(section.Name!);
            ConfigTable parent = Descend(root, names[..^1]);
            (string last, ConfigPosition at) = names[^1];
            if (section is TableArraySyntax)
            {
                ConfigTable item = new(at);
                if (parent.Entries.TryGetValue(last, out ConfigNode? existing) && existing is ConfigList list)
                {
                    list.Items.Add(item);
                }
                else
                {
                    parent.Entries[last] = new ConfigList(at, [item]);
                }

                return item;
            }

            return Descend(parent, [names[^1]]);
        }

        private static ConfigTable Descend(ConfigTable from, IReadOnlyList<(string Name, ConfigPosition At)> names)
        {
            foreach ((string name, ConfigPosition at) in names)
            {
                if (!from.Entries.TryGetValue(name, out ConfigNode? next))
                {
                    next = new ConfigTable(at);
                    from.Entries[name] = next;
                }

                from = next switch
                {
                    ConfigTable table => table,
                    ConfigList { Items: [.., ConfigTable lastItem] } => lastItem,
                    _ => new ConfigTable(at),
                };
            }

            return from;
        }

        private void AddAll(IEnumerable<KeyValueSyntax> pairs, ConfigTable target)
        {
            foreach (KeyValueSyntax pair in pairs)
            {
                List<(string Name, ConfigPosition At)> names = Names(pair.Key!);
                ConfigTable owner = Descend(target, names[..^1]);
                owner.Entries[names[^1].Name] = Value(pair.Value!);
            }
        }

        private List<(string Name, ConfigPosition At)> Names(KeySyntax key)
        {
            List<(string, ConfigPosition)> names = [(Name(key.Key!), At(key.Key!.Span, path))];
            foreach (DottedKeyItemSyntax item in key.DotKeys)
            {
                names.Add((Name(item.Key!), At(item.Key!.Span, path)));
            }

            return names;
        }

        private static string Name(BareKeyOrStringValueSyntax key) => key switch
        {
            BareKeySyntax bare => bare.Key?.Text ?? string.Empty,
            StringValueSyntax quoted => quoted.Value ?? string.Empty,
            _ => key.ToString(),
        };

        private ConfigNode Value(ValueSyntax value)
        {
            ConfigPosition at = At(value.Span, path);
            switch (value)
            {
                case StringValueSyntax text:
                    return new ConfigScalar(at, text.Value ?? string.Empty, '"' + (text.Value ?? string.Empty) + '"');
                case IntegerValueSyntax whole:
                    return new ConfigScalar(at, whole.Value, whole.Value.ToString(CultureInfo.InvariantCulture));
                case FloatValueSyntax real:
                    return new ConfigScalar(at, real.Value, real.Value.ToString("R", CultureInfo.InvariantCulture));
                case BooleanValueSyntax flag:
                    return new ConfigScalar(at, flag.Value, flag.Value ? "true" : "false");
                case DateTimeValueSyntax date:
                    string written = date.ToString().Trim();
                    return new ConfigScalar(
                        at,
                        DateOnly.TryParseExact(written, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day) ? day : written,
                        written);
                case ArraySyntax array:
                    return new ConfigList(at, [.. array.Items.Select(item => Value(item.Value!))]);
                case InlineTableSyntax inline:
                    ConfigTable table = new(at);
                    AddAll(inline.Items.Select(item => item.KeyValue!), table);
                    return table;
                default:
                    return new ConfigScalar(at, value.ToString().Trim(), value.ToString().Trim());
            }
        }
    }
}
