using System.Collections;
using System.Globalization;
using System.Reflection;
using System.Runtime.CompilerServices;
using System.Text;
using IceExtent.Retrieval;
using Tomlyn;
using Tomlyn.Model;

namespace IceExtent.Scenes.Tests.Kit;

/// <summary>
/// Fills a record of init properties from a TOML table: each property is a key in snake_case. A missing or an unknown
/// key is refused, so the shipped files and the records cannot drift apart.
/// </summary>
internal static class RecordFromToml
{
    public static T Read<T>(string path) => (T)Fill(typeof(T), TomlSerializer.Deserialize<TomlTable>(File.ReadAllText(path))!, "");

    public static string KeyOf(string property)
    {
        StringBuilder key = new();
        for (int index = 0; index < property.Length; index++)
        {
            if (index > 0 && char.IsUpper(property[index]))
            {
                key.Append('_');
            }

            key.Append(char.ToLowerInvariant(property[index]));
        }

        return key.ToString();
    }

    private static object Fill(Type type, TomlTable table, string where)
    {
        object record = RuntimeHelpers.GetUninitializedObject(type);
        HashSet<string> known = [];
        foreach (PropertyInfo property in type.GetProperties().Where(property => property.CanWrite))
        {
            string key = KeyOf(property.Name);
            known.Add(key);
            Assert.True(table.TryGetValue(key, out object? value), $"{where}.{key} is missing.");
            property.SetValue(record, Convert(property.PropertyType, value!, $"{where}.{key}"));
        }

        Assert.Empty(table.Keys.Except(known).Select(key => $"{where}.{key} is unknown."));
        return record;
    }

    private static object Convert(Type type, object value, string where)
    {
        if (type == typeof(bool) || type == typeof(double) || type == typeof(int) || type == typeof(string))
        {
            return System.Convert.ChangeType(value, type, CultureInfo.InvariantCulture);
        }

        if (type == typeof(DateOnly))
        {
            return DateOnly.FromDateTime(((TomlDateTime)value).DateTime.DateTime);
        }

        if (type == typeof(IReadOnlyDictionary<Channel, double>))
        {
            return ((TomlTable)value).ToDictionary(
                pair => ChannelNames.Parse(pair.Key) ?? throw new InvalidDataException($"{where}.{pair.Key} is no channel."),
                pair => System.Convert.ToDouble(pair.Value, CultureInfo.InvariantCulture));
        }

        if (type.IsGenericType && type.GetGenericTypeDefinition() == typeof(IReadOnlyList<>))
        {
            Type item = type.GetGenericArguments()[0];
            IList list = (IList)Activator.CreateInstance(typeof(List<>).MakeGenericType(item))!;
            foreach (object? element in (IEnumerable)value)
            {
                list.Add(Convert(item, element!, where));
            }

            return list;
        }

        return Fill(type, (TomlTable)value, where);
    }
}
