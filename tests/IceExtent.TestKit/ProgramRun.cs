using IceExtent.Worker.Commands;

namespace IceExtent.TestKit;

/// <summary>One command line run inside the test process, with what it wrote.</summary>
/// <param name="ExitCode">What the shell would see.</param>
/// <param name="Results">Standard output.</param>
/// <param name="Messages">Standard error.</param>
public sealed record ProgramRun(int ExitCode, string Results, string Messages)
{
    /// <summary>Runs the program.</summary>
    public static async Task<ProgramRun> OfAsync(params string[] args)
    {
        using StringWriter results = new();
        using StringWriter messages = new();
        int exitCode = await CommandLine.RunAsync(args, new CommandConsole(results, messages, IsTerminal: false));
        return new(exitCode, results.ToString(), messages.ToString());
    }
}
