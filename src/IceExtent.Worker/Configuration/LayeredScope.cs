namespace IceExtent.Worker.Configuration;

/// <summary>Takes values from the run file where it has them, else from config/defaults.toml.</summary>
internal sealed class LayeredScope(ConfigScope run, ConfigScope defaults)
{
    private readonly Dictionary<string, ConfigScope?> runTables = new(StringComparer.Ordinal);
    private readonly Dictionary<string, ConfigScope?> defaultTables = new(StringComparer.Ordinal);

    public double? Number(string table, string key, double lowest, double highest, string unit)
    {
        ConfigScope? own = TableOf(runTables, run, table, required: false);
        ConfigScope? shipped = TableOf(defaultTables, defaults, table, required: true);
        double? byDefault = shipped?.Number(key, lowest, highest, unit);
        return own?.Has(key) == true ? own.Number(key, lowest, highest, unit) : Ask(own, key, byDefault, lowest, highest, unit);
    }

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

    // The run file's table must learn that the key exists, so that its absence is no unknown key elsewhere.
    private static double? Ask(ConfigScope? own, string key, double? byDefault, double lowest, double highest, string unit)
    {
        _ = own?.Number(key, lowest, highest, unit, required: false);
        return byDefault;
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
