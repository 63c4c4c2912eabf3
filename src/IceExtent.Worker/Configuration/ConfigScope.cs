using System.Globalization;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>Takes checked values out of one table of a configuration file and remembers which keys were asked for.</summary>
/// <remarks>Every getter adds a fault and returns null where the value cannot be used, so all faults come out at once.</remarks>
internal sealed class ConfigScope(ConfigTable table, string path, ICollection<Fault> faults)
{
    private readonly HashSet<string> known = new(StringComparer.Ordinal);

    /// <summary>The faults of the whole file.</summary>
    public ICollection<Fault> Faults => faults;

    /// <summary>The keys that the table holds.</summary>
    public IEnumerable<string> Keys => table.Entries.Keys;

    /// <summary>Whether a key stands in the table.</summary>
    public bool Has(string key) => table.Entries.ContainsKey(key);

    /// <summary>Where a key's value stands, or the table where it is missing.</summary>
    public ConfigPosition PositionOf(string key) => table.Entries.TryGetValue(key, out ConfigNode? node) ? node.At : table.At;

    /// <summary>The key with the tables that hold it, such as <c>source[2].sensor</c>.</summary>
    public string FullKey(string key) => path.Length == 0 ? key : $"{path}.{key}";

    public string? Text(string key, bool required = true) =>
        Scalar(key, required, "a text in double quotes") is not { } scalar ? null
        : scalar.Value is string { Length: > 0 } text ? text
        : WrongType<string>(key, scalar, "a text in double quotes");

    /// <summary>A text that must be one of some names.</summary>
    public string? Name(string key, IReadOnlyCollection<string> names, bool required = true)
    {
        string? text = Text(key, required);
        if (text is null || names.Contains(text))
        {
            return text;
        }

        UnknownName(key, PositionOf(key), text, names);
        return null;
    }

    public double? Number(string key, double lowest, double highest, string unit, bool required = true)
    {
        string allowed = string.Create(CultureInfo.InvariantCulture, $"a number from {lowest} to {highest} {unit}").TrimEnd();
        if (Scalar(key, required, allowed) is not { } scalar)
        {
            return null;
        }

        double? value = scalar.Value switch { double real => real, long whole => whole, _ => null };
        if (value is not { } number)
        {
            WrongType<string>(key, scalar, allowed);
            return null;
        }

        if (!(number >= lowest && number <= highest))
        {
            string hint = highest <= 1.0 && number is > 1.0 and <= 100.0
                ? string.Create(CultureInfo.InvariantCulture, $"Write the fraction: {number / 100.0}, not {number}.")
                : "Change the value.";
            faults.Add(new("IE1006", Where(key, scalar.At), scalar.Written, allowed, hint));
            return null;
        }

        return number;
    }

    public int? WholeNumber(string key, int lowest, int highest, bool required = true)
    {
        string allowed = $"a whole number from {lowest} to {highest}";
        if (Scalar(key, required, allowed) is not { } scalar)
        {
            return null;
        }

        if (scalar.Value is not long number)
        {
            WrongType<string>(key, scalar, allowed);
            return null;
        }

        if (number < lowest || number > highest)
        {
            faults.Add(new("IE1006", Where(key, scalar.At), scalar.Written, allowed, "Change the value."));
            return null;
        }

        return (int)number;
    }

    public bool? Flag(string key, bool required = true)
    {
        if (Scalar(key, required, "true or false") is not { } scalar)
        {
            return null;
        }

        if (scalar.Value is bool flag)
        {
            return flag;
        }

        WrongType<string>(key, scalar, "true or false");
        return null;
    }

    public DateOnly? Date(string key, bool required = true)
    {
        const string Allowed = "a date such as 1984-12-25, without quotes";
        if (Scalar(key, required, Allowed) is not { } scalar)
        {
            return null;
        }

        if (scalar.Value is DateOnly day)
        {
            return day;
        }

        WrongType<string>(key, scalar, Allowed);
        return null;
    }

    /// <summary>A list of texts, at least one; each with its position.</summary>
    public IReadOnlyList<(string Text, ConfigPosition At)>? Texts(string key, bool required = true)
    {
        const string Allowed = "a list of texts, such as [\"a\", \"b\"]";
        if (!Find(key, required, Allowed, out ConfigNode? node))
        {
            return null;
        }

        if (node is ConfigScalar { Value: string { Length: > 0 } single } one)
        {
            return [(single, one.At)];
        }

        if (node is ConfigList { Items.Count: > 0 } list && list.Items.TrueForAll(item => item is ConfigScalar { Value: string { Length: > 0 } }))
        {
            return [.. list.Items.Cast<ConfigScalar>().Select(item => ((string)item.Value, item.At))];
        }

        WrongType<string>(key, node, Allowed);
        return null;
    }

    /// <summary>A list of exactly some numbers.</summary>
    public double[]? Numbers(string key, int count, double lowest, double highest, string unit)
    {
        string allowed = string.Create(CultureInfo.InvariantCulture, $"a list of {count} numbers from {lowest} to {highest} {unit}");
        if (!Find(key, required: true, allowed, out ConfigNode? node))
        {
            return null;
        }

        double[] values = node is ConfigList list
            ? [.. list.Items.OfType<ConfigScalar>().Select(item => item.Value switch { double real => real, long whole => whole, _ => double.NaN })]
            : [];
        if (values.Length == count && Array.TrueForAll(values, value => value >= lowest && value <= highest))
        {
            return values;
        }

        faults.Add(new("IE1006", Where(key, node!.At), "something else", allowed, "Change the value."));
        return null;
    }

    public ConfigScope? Table(string key, bool required = true)
    {
        const string Allowed = "a table";
        if (!Find(key, required, Allowed, out ConfigNode? node))
        {
            return null;
        }

        if (node is ConfigTable inner)
        {
            return new(inner, FullKey(key), faults);
        }

        WrongType<string>(key, node, Allowed);
        return null;
    }

    /// <summary>A table without keys, standing for one that the file lacks.</summary>
    public ConfigScope Empty(string key) => new(new ConfigTable(table.At), FullKey(key), faults);

    public IReadOnlyList<ConfigScope> Tables(string key, bool required = true)
    {
        string allowed = $"one or more [[{FullKey(key)}]] tables";
        if (!Find(key, required, allowed, out ConfigNode? node))
        {
            return [];
        }

        if (node is ConfigList list && (list.Items.Count > 0 || !required) && list.Items.TrueForAll(item => item is ConfigTable))
        {
            return [.. list.Items.Cast<ConfigTable>().Select((item, index) => new ConfigScope(item, $"{FullKey(key)}[{index + 1}]", faults))];
        }

        WrongType<string>(key, node, allowed);
        return [];
    }

    /// <summary>Adds IE1003 for each key that nobody asked for, with the nearest one that exists.</summary>
    public void RefuseUnknown()
    {
        foreach ((string key, ConfigNode node) in table.Entries)
        {
            if (!known.Contains(key))
            {
                faults.Add(new("IE1003", Where(key, node.At), $"the unknown key {key}", $"the keys {string.Join(", ", known)}", NearestName.Suggestion(key, known)));
            }
        }
    }

    /// <summary>Adds IE1007: a name that no file or list knows.</summary>
    public void UnknownName(string key, ConfigPosition at, string written, IReadOnlyCollection<string> names) =>
        faults.Add(new("IE1007", Where(key, at), $"the unknown name {written}", string.Join(", ", names), NearestName.Suggestion(written, names)));

    /// <summary>Where a value stands, with its key.</summary>
    public string Where(string key, ConfigPosition at) => $"{at} ({FullKey(key)})";

    private ConfigScalar? Scalar(string key, bool required, string allowed) =>
        !Find(key, required, allowed, out ConfigNode? node) ? null
        : node as ConfigScalar ?? WrongType<ConfigScalar>(key, node!, allowed);

    private bool Find(string key, bool required, string allowed, out ConfigNode? node)
    {
        known.Add(key);
        if (table.Entries.TryGetValue(key, out node))
        {
            return true;
        }

        if (required)
        {
            faults.Add(new("IE1004", Where(key, table.At), "nothing", allowed, $"Add the key {key}."));
        }

        return false;
    }

    private T? WrongType<T>(string key, ConfigNode? node, string allowed)
        where T : class
    {
        string found = node switch
        {
            ConfigScalar { Value: string { Length: 0 } } => "an empty text",
            ConfigScalar scalar => scalar.Written,
            ConfigList { Items.Count: 0 } => "an empty list",
            ConfigList => "a list",
            _ => "a table",
        };
        faults.Add(new("IE1005", Where(key, node?.At ?? table.At), found, allowed, "Change the value."));
        return null;
    }
}
