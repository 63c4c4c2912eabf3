using IceExtent.Storage.Faults;

namespace IceExtent.Worker.Commands;

/// <summary>Where a command writes: results to one stream, progress and messages to the other.</summary>
/// <param name="Results">Standard output.</param>
/// <param name="Messages">Standard error.</param>
/// <param name="IsTerminal">Whether messages go to a terminal that can redraw lines.</param>
internal sealed record CommandConsole(TextWriter Results, TextWriter Messages, bool IsTerminal)
{
    /// <summary>The process's own streams.</summary>
    public static CommandConsole System { get; } = new(Console.Out, Console.Error, !Console.IsErrorRedirected && Environment.GetEnvironmentVariable("TERM") is not (null or "dumb"));

    /// <summary>Writes one line of results.</summary>
    public void Print(string line) => Results.WriteLine(line);

    /// <summary>Writes one line of messages.</summary>
    public void Say(string line) => Messages.WriteLine(line);

    /// <summary>Writes faults, one a line.</summary>
    public void Tell(IEnumerable<Fault> faults)
    {
        foreach (Fault fault in faults)
        {
            Say(fault.ToString());
        }
    }
}
