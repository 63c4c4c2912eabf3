using System.Globalization;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Twelve planes on a grid, January first: what they are called and how their faults are told.</summary>
/// <param name="VariableName">The variable.</param>
/// <param name="Allowed">What must be in the file.</param>
/// <param name="Remedy">What to do about any fault.</param>
/// <param name="OtherGridCode">The file is on another grid.</param>
/// <param name="UnreadableCode">The file cannot be read.</param>
/// <param name="NoPlanesCode">There are no such planes in it.</param>
internal sealed record MonthPlanes(
    string VariableName, string Allowed, string Remedy, string OtherGridCode, string UnreadableCode, string NoPlanesCode)
{
    /// <summary>The months are not the twelve of a year.</summary>
    public const string MonthsCode = "IE2224";

    private const int Months = 12;

    /// <summary>Turns the numbers of a month into what the reader keeps; throws where they make no sense.</summary>
    /// <param name="variable">Where the numbers stand.</param>
    /// <param name="values">One number a cell of the grid, row-major, row 0 at the top; NaN is missing.</param>
    public delegate TMonth Take<TMonth>(FileVariable variable, ReadOnlySpan<float> values);

    /// <summary>Reads all twelve, turned as the grid runs.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <param name="take">Takes one month.</param>
    /// <exception cref="FaultException">One of the four codes.</exception>
    public TMonth[] Read<TMonth>(string path, Grid grid, Take<TMonth> take)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(grid);
        try
        {
            return HdfFile.Read(path, file => Read(file, grid, take));
        }
        catch (FaultException cause) when (cause.Fault.Code != NoPlanesCode && cause.Fault.Code != MonthsCode)
        {
            throw new FaultException(AsOwnFault(cause.Fault), cause);
        }
    }

    /// <summary>The file holds something else.</summary>
    public FaultException NoPlanes(FileVariable variable, string found) => new(new(NoPlanesCode, variable.Where, found, Allowed, Remedy));

    private TMonth[] Read<TMonth>(HdfFile file, Grid grid, Take<TMonth> take)
    {
        FileVariable variable = file.Variable(VariableName);
        GridAxes axes = GridAxes.Find(variable, grid, anySteps: true);
        PlaneShape shape = axes.Shape;
        if (shape.Steps != Months)
        {
            throw WrongMonths(variable, shape.Steps == 1 ? "one plane" : $"{shape.Steps} planes", "twelve, January first");
        }

        CheckOrder(variable, axes.Time!);
        KelvinEncoding encoding = PackingAttributes.Of(variable); // The rules of packing are the same for every unit.
        ulong[]? chunk = ChunkLimits.BytesOf(variable) is null ? null : variable.Dataset.Layout.Chunks;
        ChannelStructure structure = new(default, VariableName, shape, new GridAgreement(grid).TurnOf(variable, axes), new(encoding), chunk);
        float[] values = new float[grid.CellCount];
        TMonth[] months = new TMonth[Months];
        for (int month = 0; month < Months; month++)
        {
            CellReader.Read(file, structure, month, grid, values);
            months[month] = Array.TrueForAll(values, float.IsNaN)
                ? throw WrongMonths(variable, $"no value in month {month + 1}", "values in every month")
                : take(variable, values);
        }

        return months;
    }

    // Dates or numbers along the axis must be those of the twelve months. Where it has none, the order is the file's word.
    private void CheckOrder(FileVariable variable, FileAxis axis)
    {
        if (axis.Scale is not { IsDimensionOnly: false } scale || scale.ReadAll(Months) is not { } numbers)
        {
            return;
        }

        int?[] months = Array.ConvertAll(numbers, number => (int?)(number is >= 0.0 and <= 99.0 && double.IsInteger(number) ? (int)number : null));
        if (FileAxis.CountsTime(scale))
        {
            string? calendar = scale.Attributes.Text("calendar");
            TimeUnits? units = scale.Attributes.Text("units") is { } text && TimeUnits.IsReal(calendar) ? TimeUnits.Parse(text, calendar) : null;
            months = Array.ConvertAll(numbers, number => units?.DayOf(number)?.Month);
            if (Array.TrueForAll(months, month => month is null))
            {
                return; // A climatology's time may lie in no calendar.
            }
        }

        if (!months.SequenceEqual(Enumerable.Range(1, Months).Select(month => (int?)month)))
        {
            string found = string.Join(", ", months.Select(month => month?.ToString(CultureInfo.InvariantCulture) ?? "?"));
            throw WrongMonths(variable, $"the months {found} along {scale.Name}", "1 to 12 in order");
        }
    }

    private FaultException WrongMonths(FileVariable variable, string found, string allowed) => new(new(MonthsCode, variable.Where, found, allowed, Remedy));

    // What reading any file may find, with the remedy of this kind of file.
    private Fault AsOwnFault(Fault fault) => fault with
    {
        Code = fault.Code switch
        {
            "IE2107" or "IE2108" => OtherGridCode,
            "IE2105" or "IE2106" or "IE2111" => NoPlanesCode,
            _ => UnreadableCode,
        },
        Remedy = Remedy,
    };
}
