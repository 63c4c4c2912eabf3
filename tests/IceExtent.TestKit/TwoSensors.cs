namespace IceExtent.TestKit;

/// <summary>A small run with two sensors: the first reads <c>days</c>, the second, <c>second.toml</c>, a folder of its own.</summary>
public sealed class TwoSensors : IDisposable
{
    public TwoSensors()
    {
        Directory.CreateDirectory(Run.PathOf("others"));
        Run.Write("second.toml", TinyRun.Sensor("1990-01-01", "1999-12-31"));
    }

    public TinyRun Run { get; } = new();

    /// <summary>Writes a day of the first sensor.</summary>
    public void WriteFirst(DateOnly day, Func<int, double> iceFraction) => Run.WriteDay(day, iceFraction);

    /// <summary>Writes a day of the second sensor; the first one must not have it yet.</summary>
    public void WriteSecond(DateOnly day, Func<int, double> iceFraction)
    {
        Run.WriteDay(day, iceFraction);
        string name = FormattableString.Invariant($"{day:yyyyMMdd}_*.bin");
        foreach (string file in Directory.GetFiles(Run.PathOf("days"), name))
        {
            File.Move(file, Run.PathOf("others", Path.GetFileName(file)));
        }
    }

    /// <summary>Writes the run file, after the days; the texts stand inside the two sources and before them.</summary>
    public void WriteRunFile(string first = "", string second = "", string head = "")
    {
        Run.WriteRunFile(head, first);
        string text = File.ReadAllText(Run.RunFile);
        Run.WriteRunFile(head, second, "second.toml");
        string other = File.ReadAllText(Run.RunFile);
        Run.Write("run.toml", text + other[other.IndexOf("[[source]]", StringComparison.Ordinal)..].Replace("days/*.bin", "others/*.bin", StringComparison.Ordinal));
    }

    public void Dispose() => Run.Dispose();
}
