namespace IceExtent.Worker;

/// <summary>What the program tells the shell; documented in docs/ERRORS.md.</summary>
internal static class ExitCode
{
    /// <summary>Everything was done.</summary>
    public const int Done = 0;

    /// <summary>Done, but at least one day or file that was there could not be used.</summary>
    public const int DoneWithGaps = 1;

    /// <summary>The run file, a configuration file or the command line cannot be used, or an output cannot be written.</summary>
    public const int Configuration = 2;

    /// <summary>Not one day could be used.</summary>
    public const int NoUsableInput = 3;

    /// <summary>Another run holds the archive.</summary>
    public const int ArchiveHeld = 4;

    /// <summary>Stopped by the person or the system before the end.</summary>
    public const int Cancelled = 130;

    /// <summary>A defect of the program.</summary>
    public const int Defect = 70;
}
