namespace IceExtent.Worker.Configuration;

/// <summary>Takes values from the run file where it has them, else from config/defaults.toml.</summary>
internal sealed class LayeredScope(ConfigScope run, ConfigScope defaults)
{
    private readonly Dictionary<string, ConfigScope?> runTables = new(StringComparer.Ordinal);
    private readonly Dictionary<string, ConfigScope?> defaultTables = new(StringComparer.Ordinal);

    public double? Number(string table, string key, double lowest, double highest, string unit) =>
        Take(table, key, (scope, required) => scope.Number(key, lowest, highest, unit, required));

    public int? WholeNumber(string table, string key, int lowest, int highest) =>
        Take(table, key, (scope, required) => scope.WholeNumber(key, lowest, highest, required));

    public bool? Flag(string table, string key) =>
        Take(table, key, (scope, required) => scope.Flag(key, required));

    /// <summary>A text that must be one of some names.</summary>
    public string? Name(string table, string key, IReadOnlyCollection<string> names) =>
        Take(table, key, (scope, required) => scope.Name(key, names, required));

    /// <summary>A text that only the run file may have, or null.</summary>
    public string? Text(string table, string key) => TableOf(runTables, run, table, required: false)?.Text(key, required: false);

    /// <summary>Adds IE1011 for a value that does not go with another.</summary>
    public void Refuse(string table, string key, string found, string allowed)
    {
        ConfigScope scope = runTables[table] ?? defaultTables[table]!;
        scope.Faults.Add(new("IE1011", scope.Where(key, scope.PositionOf(key)), found, allowed, "Correct one of the two."));
    }

    public void RefuseUnknown()
    {
        foreach (ConfigScope? scope in runTables.Values.Concat(defaultTables.Values))
        {
            scope?.RefuseUnknown();
        }
    }

    // The run file's table is asked in any case: it must learn that the key exists, so that no other key is unknown for it.
    private T? Take<T>(string table, string key, Func<ConfigScope, bool, T?> take)
    {
        ConfigScope? shipped = TableOf(defaultTables, defaults, table, required: true);
        T? byDefault = shipped is null ? default : take(shipped, true);
        ConfigScope? own = TableOf(runTables, run, table, required: false);
        T? byRun = own is null ? default : take(own, false);
        return own?.Has(key) == true ? byRun : byDefault;
    }

    private static ConfigScope? TableOf(Dictionary<string, ConfigScope?> cache, ConfigScope scope, string table, bool required)
    {
        if (!cache.TryGetValue(table, out ConfigScope? found))
        {
            found = scope.Table(table, required);
            cache[table] = found;
        }

        return found;
    }
}
