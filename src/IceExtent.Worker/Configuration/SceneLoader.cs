using System.Collections;
using System.Reflection;
using System.Runtime.CompilerServices;
using System.Text;
using IceExtent.Retrieval;
using IceExtent.Scenes.Parameters;
using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Configuration;

/// <summary>Reads scene files: config/scenes or one of the person's own.</summary>
/// <remarks>Each property of the parameter records is a key in snake_case and each group a table; every key must be there.</remarks>
internal static class SceneLoader
{
    /// <summary>Reads and checks one scene.</summary>
    /// <returns>The parameters, or null after adding to <paramref name="faults"/>.</returns>
    public static SceneParameters? Load(string path, ICollection<Fault> faults)
    {
        int before = faults.Count;
        if (TomlFile.Read(path, faults) is not { } table)
        {
            return null;
        }

        SceneParameters parameters = (SceneParameters)Fill(typeof(SceneParameters), new(table, string.Empty, faults));
        if (faults.Count > before)
        {
            return null;
        }

        foreach (SceneProblem problem in SceneCheck.FindProblems(parameters))
        {
            faults.Add(new("IE1006", $"{path} ({problem.Key})", problem.Found, problem.Allowed, "Change the value."));
        }

        return faults.Count > before ? null : parameters;
    }

    private static object Fill(Type type, ConfigScope scope)
    {
        object record = RuntimeHelpers.GetUninitializedObject(type);
        foreach (PropertyInfo property in type.GetProperties().Where(property => property.CanWrite))
        {
            property.SetValue(record, Value(property.PropertyType, KeyOf(property.Name), scope));
        }

        scope.RefuseUnknown();
        return record;
    }

    private static object? Value(Type type, string key, ConfigScope scope)
    {
        if (type == typeof(double))
        {
            return scope.Number(key, double.MinValue, double.MaxValue, string.Empty);
        }

        if (type == typeof(int))
        {
            return scope.WholeNumber(key, int.MinValue, int.MaxValue);
        }

        if (type == typeof(string))
        {
            return scope.Text(key);
        }

        if (type == typeof(bool))
        {
            return scope.Flag(key);
        }

        if (type == typeof(DateOnly))
        {
            return scope.Date(key);
        }

        if (type == typeof(IReadOnlyDictionary<Channel, double>))
        {
            return scope.Table(key) is { } channels ? ByChannel(channels) : null;
        }

        if (type.IsGenericType && type.GetGenericTypeDefinition() == typeof(IReadOnlyList<>))
        {
            return List(type.GetGenericArguments()[0], key, scope);
        }

        return scope.Table(key) is { } inner ? Fill(type, inner) : null;
    }

    private static IList List(Type item, string key, ConfigScope scope)
    {
        IList list = (IList)Activator.CreateInstance(typeof(List<>).MakeGenericType(item))!;
        foreach (ConfigScope element in scope.Tables(key, required: false))
        {
            list.Add(Fill(item, element));
        }

        return list;
    }

    private static Dictionary<Channel, double> ByChannel(ConfigScope scope)
    {
        Dictionary<Channel, double> values = [];
        foreach (Channel channel in ChannelNames.All)
        {
            if (scope.Number(ChannelNames.NameOf(channel), double.MinValue, double.MaxValue, string.Empty, required: false) is { } value)
            {
                values.Add(channel, value);
            }
        }

        scope.RefuseUnknown();
        return values;
    }

    private static string KeyOf(string property)
    {
        StringBuilder key = new();
        foreach (char letter in property)
        {
            key.Append(char.IsUpper(letter) && key.Length > 0 ? "_" : string.Empty).Append(char.ToLowerInvariant(letter));
        }

        return key.ToString();
    }
}
