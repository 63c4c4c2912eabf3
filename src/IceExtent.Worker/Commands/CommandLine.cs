using System.CommandLine;
using System.CommandLine.Parsing;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>The program as the shell sees it: verbs in, exit code out.</summary>
internal static class CommandLine
{
    private static readonly string[] ArchiveHeldCodes = ["IE3002"];

    /// <summary>Runs one command line. Every expected failure becomes a coded line on the message stream.</summary>
    public static async Task<int> RunAsync(string[] args, CommandConsole console)
    {
        RootCommand root = new("Sea-ice concentration, extent and area from passive-microwave brightness temperatures.")
        {
            DemoCommand.Make(console),
            RunCommand.Make(console),
            PlanCommand.Make(console),
            CheckCommand.Make(console),
            CompareCommand.Make(console),
            SceneCommand.Make(console),
        };
        ParseResult parsed = root.Parse(args);
        if (parsed.Errors.Count > 0)
        {
            TellUsage(parsed, root, console);
            return ExitCode.Configuration;
        }

        try
        {
            return await parsed.InvokeAsync(new InvocationConfiguration { EnableDefaultExceptionHandler = false, Output = console.Results, Error = console.Messages });
        }
        catch (ConfigurationException faulty)
        {
            console.Tell(faulty.Faults);
            return ExitCode.Configuration;
        }
        catch (FaultException faulty)
        {
            console.Tell([faulty.Fault]);
            return ArchiveHeldCodes.Contains(faulty.Fault.Code) ? ExitCode.ArchiveHeld : ExitCode.Configuration;
        }
        catch (OperationCanceledException)
        {
            console.Say("Stopped. What stands in the archive is whole; run again to go on.");
            return ExitCode.Cancelled;
        }
#pragma warning disable CA1031 // The last line of defence: a defect is told as one, with its trace, and has its own exit code.
        catch (Exception defect)
#pragma warning restore CA1031
        {
            console.Tell([new("IE9001", "the program", $"a defect ({defect.Message})", "none", "Report it with the lines below and the run file.")]);
            console.Say(defect.ToString());
            return ExitCode.Defect;
        }
    }

    private static void TellUsage(ParseResult parsed, RootCommand root, CommandConsole console)
    {
        string[] verbs = [.. root.Subcommands.Select(command => command.Name)];
        string? first = parsed.UnmatchedTokens.Count > 0 ? parsed.UnmatchedTokens[0] : null;
        if (parsed.CommandResult.Command == root && first is not null)
        {
            console.Tell([new("IE1012", "command line", $"the unknown command {first}", string.Join(", ", verbs), NearestName.Suggestion(first, verbs))]);
            return;
        }

        string[] options = [.. parsed.CommandResult.Command.Options.Select(option => option.Name)];
        foreach (ParseError error in parsed.Errors)
        {
            string? unknown = parsed.UnmatchedTokens.FirstOrDefault(token => error.Message.Contains(token, StringComparison.Ordinal));
            string remedy = unknown is not null && unknown.StartsWith("--", StringComparison.Ordinal)
                ? NearestName.Suggestion(unknown, options)
                : $"See iceextent {parsed.CommandResult.Command.Name} --help.";
            console.Tell([new("IE1012", "command line", error.Message.TrimEnd('.'), "what --help shows", remedy)]);
        }
    }
}
