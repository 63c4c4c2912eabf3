using System.Globalization;
using IceExtent.Statistics.Seasons;

namespace IceExtent.Worker.Configuration;

/// <summary>Takes keys from the first of several tables that has them, such as run file, the scheme's hemisphere, the scheme and the defaults.</summary>
internal sealed class SchemeScope(params ConfigScope[] layers)
{
    private const string DayText = "a day that every year has, such as \"03-01\"";

    public bool Flag(string key) => Take(key, (scope, required) => scope.Flag(key, required)) ?? false;

    public double Number(string key, double lowest, double highest) =>
        Take(key, (scope, required) => scope.Number(key, lowest, highest, string.Empty, required)) ?? double.NaN;

    public int WholeNumber(string key, int lowest, int highest) =>
        Take(key, (scope, required) => scope.WholeNumber(key, lowest, highest, required)) ?? lowest;

    public int? OptionalWholeNumber(string key, int lowest, int highest) => Has(key)
        ? Take(key, (scope, required) => scope.WholeNumber(key, lowest, highest, required))
        : Learn<int?>(key, scope => scope.WholeNumber(key, lowest, highest, required: false));

    public T OneOf<T>(string key, params (string Name, T Value)[] names)
    {
        string[] known = [.. names.Select(pair => pair.Name)];
        string? name = Take(key, (scope, required) => scope.Name(key, known, required));
        return names.FirstOrDefault(pair => pair.Name == name).Value!;
    }

    public bool Has(string key) => Array.Exists(layers, layer => layer.Has(key));

    public CalendarDay Day(string key)
    {
        string? written = Take(key, (scope, required) => scope.Text(key, required));
        return written is null ? new(1, 1) : Parsed(key, written);
    }

    /// <summary>Two days, or null where no table has the key.</summary>
    public CalendarWindow? Window(string key)
    {
        if (!Has(key))
        {
            return Learn<CalendarWindow?>(key, scope =>
            {
                scope.Texts(key, required: false);
                return null;
            });
        }

        IReadOnlyList<(string Text, ConfigPosition At)>? days = Take(key, (scope, required) => scope.Texts(key, required));
        if (days is null)
        {
            return null;
        }

        if (days.Count != 2)
        {
            ConfigScope scope = Owner(key);
            scope.Faults.Add(new("IE1006", scope.Where(key, scope.PositionOf(key)), $"{days.Count} days", "two days, such as [\"06-01\", \"10-31\"]", "Change the value."));
            return null;
        }

        return new(Parsed(key, days[0].Text), Parsed(key, days[1].Text));
    }

    /// <summary>Adds IE1011 for a value that does not go with another.</summary>
    public void Refuse(string key, string found, string allowed)
    {
        ConfigScope scope = Owner(key);
        scope.Faults.Add(new("IE1011", scope.Where(key, scope.PositionOf(key)), found, allowed, "Correct one of the two."));
    }

    private CalendarDay Parsed(string key, string written)
    {
        if (DateOnly.TryParseExact("2001-" + written, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day)) // 2001: no 29 February.
        {
            return new(day.Month, day.Day);
        }

        ConfigScope scope = Owner(key);
        scope.Faults.Add(new("IE1006", scope.Where(key, scope.PositionOf(key)), $"\"{written}\"", DayText, "Change the value."));
        return new(1, 1);
    }

    private ConfigScope Owner(string key) => Array.Find(layers, layer => layer.Has(key)) ?? layers[0];

    // Every table must learn that the key exists, so that no other key is unknown for it.
    private T? Take<T>(string key, Func<ConfigScope, bool, T?> take)
    {
        ConfigScope owner = Array.Find(layers, layer => layer.Has(key)) ?? layers[^2]; // The scheme itself should have had it.
        T? value = default;
        foreach (ConfigScope layer in layers)
        {
            T? here = take(layer, ReferenceEquals(layer, owner));
            value = ReferenceEquals(layer, owner) ? here : value;
        }

        return value;
    }

    private T? Learn<T>(string key, Func<ConfigScope, T?> ask)
    {
        foreach (ConfigScope layer in layers)
        {
            ask(layer);
        }

        return default;
    }
}
