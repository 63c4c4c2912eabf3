using System.Text.Json.Serialization;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Writing;

/// <summary>What one run did. Written to <c>runs/</c> as JSON; the fields are documented in docs/DATA.md.</summary>
public sealed record RunRecord
{
    /// <summary>The version of this shape; it rises when a field changes its meaning or goes.</summary>
    public const int CurrentSchemaVersion = 1;

    /// <summary>The version of the shape this record has.</summary>
    public int SchemaVersion { get; init; } = CurrentSchemaVersion;

    /// <summary>The version of the program.</summary>
    public required string ProgramVersion { get; init; }

    /// <summary>When the run began, UTC.</summary>
    public required DateTimeOffset Started { get; init; }

    /// <summary>When the run ended, UTC.</summary>
    public required DateTimeOffset Finished { get; init; }

    /// <summary>The run file.</summary>
    public required DigestedFile RunFile { get; init; }

    /// <summary>SHA-256 of everything that rules the numbers: the run file and the files it names. Hexadecimal, lower case.</summary>
    public required string ConfigurationDigest { get; init; }

    /// <summary>The options of the command line, as given.</summary>
    public required IReadOnlyList<string> CommandLine { get; init; }

    /// <summary>How many days went which way.</summary>
    public required RunCounts Counts { get; init; }

    /// <summary>Every day the run covered, in date order, then by hemisphere.</summary>
    public required IReadOnlyList<DayRecord> Days { get; init; }

    /// <summary>Faults that belong to no single day, such as an archive file that could not be read.</summary>
    public required IReadOnlyList<Fault> Faults { get; init; }

    /// <summary>The ice years whose dates were made, by method and year.</summary>
    public IReadOnlyList<SeasonRecord> Seasons { get; init; } = [];

    /// <summary>The input files that were read, in the order of their paths.</summary>
    public required IReadOnlyList<string> FilesRead { get; init; }

    /// <summary>What the process returned.</summary>
    public required int ExitCode { get; init; }
}

/// <summary>What a run made of one ice year.</summary>
/// <param name="Method">The method.</param>
/// <param name="IceYear">The calendar year of its first day.</param>
/// <param name="Status"><c>final</c>, or <c>provisional</c> while later days may change its dates.</param>
/// <param name="Cells">Cells that held ice.</param>
/// <param name="UnreadDays">Days whose grid could not be read, and that count as missing.</param>
/// <param name="ProvisionalDates">What became of the cells' dates that stood as provisional, by date; empty where none did.</param>
/// <param name="NamedChanges">Dates of regions and places that moved, were withdrawn or are new in years that stood as provisional, in words.</param>
public sealed record SeasonRecord(
    string Method, int IceYear, string Status, int Cells, int UnreadDays, IReadOnlyDictionary<string, DateChangeCounts> ProvisionalDates, IReadOnlyList<string> NamedChanges);

/// <summary>How many provisional dates went which way.</summary>
/// <param name="Confirmed">Found again on the same day.</param>
/// <param name="Moved">Found again on another day.</param>
/// <param name="Withdrawn">No longer found.</param>
/// <param name="New">Found for the first time.</param>
public sealed record DateChangeCounts(int Confirmed, int Moved, int Withdrawn, int New);

/// <summary>A file and what it held.</summary>
/// <param name="Path">Its full path.</param>
/// <param name="Sha256">SHA-256 of its bytes, hexadecimal, lower case.</param>
public sealed record DigestedFile(string Path, string Sha256);

/// <summary>How many days went which way. A day counts once for each hemisphere.</summary>
/// <param name="DaysDone">Days with numbers.</param>
/// <param name="Gaps">Days without input, or with input that could not be used.</param>
/// <param name="Rejected">Of the gaps, those whose input was there and could not be used.</param>
/// <param name="PolarGapFallbacks">Of the days done, those whose polar gap was to be filled and was not, for some method: too little of its rim was observed.</param>
/// <param name="TiePointFallbacks">Of the days done, those whose tie points were to move and did not, or not all: too few samples.</param>
/// <param name="EmptiedDays">Of the days done, those on which screens, masks and coast correction left no cell that counts as ice, for some method, though there were such cells before them.</param>
/// <param name="DaysFilled">Days without usable input whose numbers are wholly from days before and after; neither done nor gaps.</param>
public sealed record RunCounts(int DaysDone, int Gaps, int Rejected, int PolarGapFallbacks = 0, int TiePointFallbacks = 0, int EmptiedDays = 0, int DaysFilled = 0);

/// <summary>How one day of one hemisphere went.</summary>
public enum DayOutcome
{
    /// <summary>It has numbers.</summary>
    Done,

    /// <summary>There was no input.</summary>
    Gap,

    /// <summary>There was input, and it could not be used.</summary>
    Rejected,

    /// <summary>It had no usable input, and its numbers are wholly from days before and after.</summary>
    Filled,
}

/// <summary>One day of one hemisphere in a run.</summary>
/// <param name="Date">The day, UTC.</param>
/// <param name="Hemisphere">The hemisphere.</param>
/// <param name="Outcome">How it went.</param>
/// <param name="Cells">What befell its cells, one entry a method in the order of the run file; empty where there are no numbers.</param>
/// <param name="Faults">Why it is not, or not wholly, done.</param>
/// <param name="TiePoints">Where its tie points come from, by name; <c>fixed</c> where the run takes no samples.</param>
public sealed record DayRecord(
    DateOnly Date, Hemisphere Hemisphere, DayOutcome Outcome, IReadOnlyList<CellCounts> Cells, IReadOnlyList<Fault> Faults, string TiePoints = "fixed");

/// <summary>How many cells of one day fell under each condition with one method. A cell may count under several.</summary>
/// <param name="Method">The method.</param>
/// <param name="OutOfRange">A brightness temperature was not believed.</param>
/// <param name="ClippedBelow">The concentration was below 0.</param>
/// <param name="ClippedAbove">The concentration was above 1.</param>
/// <param name="Screened3719">The 37/19 screen found open water.</param>
/// <param name="Screened2219">The 22/19 screen found open water.</param>
/// <param name="NoSolution">The method had no answer.</param>
/// <param name="Filled">Filled from the neighbours; 0 in a record that does not say it.</param>
/// <param name="PolarGapFilled">Filled inside the polar gap; 0 in a record that does not say it.</param>
/// <param name="CoastCorrected">The coast correction changed the cell.</param>
/// <param name="OutsideIceMask">The screens left ice in it, and it lies outside the month's ice mask.</param>
/// <param name="WarmWater">The screens left ice in it, in a sea that is too warm in the month.</param>
/// <param name="FilledFromDays">Filled from days before and after; 0 in a record that does not say it.</param>
public sealed record CellCounts(
    string Method,
    int OutOfRange,
    int ClippedBelow,
    int ClippedAbove,
    [property: JsonPropertyName("screened_37_19")] int Screened3719,
    [property: JsonPropertyName("screened_22_19")] int Screened2219,
    int NoSolution,
    int Filled = 0,
    int PolarGapFilled = 0,
    int CoastCorrected = 0,
    int OutsideIceMask = 0,
    int WarmWater = 0,
    int FilledFromDays = 0);
