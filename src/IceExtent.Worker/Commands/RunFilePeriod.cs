using System.CommandLine;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>The run file and the period that most commands take.</summary>
internal sealed class RunFilePeriod
{
    private readonly Argument<string> runFile = new("RUNFILE") { Description = "The run file (TOML)." };
    private readonly Option<DateOnly?> from = CommonOptions.Day("--from", "Leave out days before this one.");
    private readonly Option<DateOnly?> to = CommonOptions.Day("--to", "Leave out days after this one.");

    /// <summary>Gives a command its argument and options.</summary>
    public RunFilePeriod(Command command)
    {
        command.Add(runFile);
        command.Add(from);
        command.Add(to);
    }

    public string RunFile(ParseResult parsed) => parsed.GetValue(runFile)!;

    public DateOnly? From(ParseResult parsed) => parsed.GetValue(from);

    public DateOnly? To(ParseResult parsed) => parsed.GetValue(to);

    /// <summary>Checks the period and reads the run file.</summary>
    /// <exception cref="ConfigurationException">One of them cannot be used.</exception>
    public RunSettings Load(ParseResult parsed)
    {
        CommonOptions.CheckPeriod(From(parsed), To(parsed));
        return RunFileLoader.Load(RunFile(parsed), ConfigFolder.BesideProgram);
    }
}
