using System.CommandLine;
using System.CommandLine.Parsing;
using IceExtent.Storage.Faults;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>The program as the shell sees it: verbs in, exit code out.</summary>
internal static class CommandLine
{
    private static readonly string[] ArchiveHeldCodes = ["IE3002"];

    /// <summary>What a person types to start the program.</summary>
    public static string ProgramPath { get; } = Environment.GetEnvironmentVariable("ICEEXTENT_PROGRAM") ?? "iceextent";

    /// <summary>Runs one command line. Every expected failure becomes a coded line on the message stream.</summary>
    public static async Task<int> RunAsync(string[] args, CommandConsole console)
    {
        RootCommand root = new(
            "Sea-ice concentration, extent and area from passive-microwave brightness temperatures.\n\n"
            + Cautions.Text + "\n\n"
            + "Exit codes: 0 done, 1 done with gaps, 2 configuration or output folder, 3 no usable day, 4 archive held by another run,\n70 defect, 130 stopped. The manuals are in docs/.")
        {
            DemoCommand.Make(console),
            RunCommand.Make(console),
            PlanCommand.Make(console),
            CheckCommand.Make(console),
            CompareCommand.Make(console),
            SeasonCommand.Make(console),
            IceMaskCommand.Make(console),
            SceneCommand.Make(console),
            CoastMinimumCommand.Make(console),
        };
        ParseResult parsed = root.Parse(args);
        string[] known = [.. parsed.CommandResult.Command.Options.Select(option => option.Name)];
        if (parsed.Errors.Count > 0 || UnknownOptions(args, known).Length > 0) // The parser would take one for a file name.
        {
            TellUsage(args, parsed, root, console);
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
            console.Say("Stopped. What was written is whole; the same command begins anew.");
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

    private static void TellUsage(string[] args, ParseResult parsed, RootCommand root, CommandConsole console)
    {
        Command command = parsed.CommandResult.Command;
        string[] verbs = [.. root.Subcommands.Select(verb => verb.Name)];
        if (command == root)
        {
            string? first = args.FirstOrDefault(arg => !arg.StartsWith('-'));
            console.Tell([new(
                "IE1012",
                "command line",
                first is null ? "no command" : $"the unknown command {first}",
                string.Join(", ", verbs),
                first is null ? "See iceextent --help." : NearestName.Suggestion(first, verbs))]);
            return;
        }

        string[] options = [.. command.Options.Select(option => option.Name)];
        string[] unknown = UnknownOptions(args, options);
        if (unknown.Length > 0)
        {
            console.Tell(unknown.Select(option => new Fault(
                "IE1012", "command line", $"the unknown option {option}", string.Join(", ", options), NearestName.Suggestion(option, options))));
            return;
        }

        // Messages of our own checks name what was found and what is allowed already.
        console.Tell(parsed.Errors.Select(error => error.Message.Split(OptionCheck.Separator) is [string option, string found, string allowed]
            ? new Fault("IE1012", option, found, allowed, $"See iceextent {command.Name} --help.")
            : new Fault("IE1012", "command line", error.Message.TrimEnd('.'), "what --help shows", $"See iceextent {command.Name} --help.")));
    }

    private static string[] UnknownOptions(string[] args, string[] options) =>
        [.. args.Where(arg => arg.StartsWith("--", StringComparison.Ordinal)).Select(arg => arg.Split('=')[0]).Except([.. options, "--help", "--version"])];
}
