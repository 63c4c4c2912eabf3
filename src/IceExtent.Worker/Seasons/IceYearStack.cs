using System.Runtime.CompilerServices;
using IceExtent.Statistics.Seasons;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;

namespace IceExtent.Worker.Seasons;

/// <summary>Concentration and its standard error for every ocean cell on every day of one ice year, used again from year to year.</summary>
/// <remarks>Held as the grid files hold it, in 16 bits: a year of one hemisphere at 25 km takes some 120 MB.</remarks>
internal sealed class IceYearStack(int[] cells, int gridCells)
{
    private static readonly float StepsPerUnit = (float)(1.0 / Packing.Fraction.Scale);

    private readonly short[][] signals = [[], [], []]; // Horizontal range, 19 GHz and 37 GHz vertical, in tenths of K.
    private short[] fractions = [];
    private short[] errors = [];

    /// <summary>Indices of the ocean cells on the grid, rising.</summary>
    public int[] Cells => cells;

    /// <summary>Days that could not be read.</summary>
    public IReadOnlyList<Fault> Faults { get; private set; } = [];

    /// <summary>Reads the days of a span; a day without a file, or with one that cannot be read, is missing.</summary>
    /// <param name="grids">The archive.</param>
    /// <param name="span">The days.</param>
    /// <param name="melt">The melt signals beside them, or null where melt is not sought.</param>
    /// <param name="workers">How many files are read at a time.</param>
    /// <param name="cancellation">Stops at the next day.</param>
    public void Load(StoredDays<ArchiveGrids> grids, IceYearSpan span, StoredDays<ArchiveMeltSignals>? melt, int workers, CancellationToken cancellation)
    {
        MakeRoom(span, melt is not null);
        Fault?[] faults = new Fault?[span.Days];
        Parallel.For(
            0,
            span.Days,
            new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = cancellation },
            () => new Planes(new float[gridCells], new float[gridCells], [.. signals.Select(_ => new short[melt is null ? 0 : gridCells])]),
            (day, _, planes) =>
            {
                DateOnly date = span.FirstDate.AddDays(day);
                faults[day] = LoadDay(grids.Reader, grids.Files.GetValueOrDefault(date), day, planes);
                if (melt is not null)
                {
                    faults[day] = LoadSignals(melt.Reader, melt.Files.GetValueOrDefault(date), day, planes) ?? faults[day];
                }

                return planes;
            },
            _ => { });
        Faults = [.. faults.OfType<Fault>()];
    }

    /// <summary>Makes room for the days of a span, all missing until they are set.</summary>
    public void Clear(IceYearSpan span)
    {
        MakeRoom(span, withSignals: false);
        Array.Fill(fractions, Packing.Fill);
        Array.Fill(errors, Packing.Fill);
    }

    /// <summary>Sets one day. Different days may be set by several threads at a time.</summary>
    /// <param name="day">The day's place in the span.</param>
    /// <param name="fraction">One value a cell of the grid. Unit: 1. Missing: NaN.</param>
    /// <param name="standardError">Its standard error, likewise.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public void Set(int day, ReadOnlySpan<float> fraction, ReadOnlySpan<float> standardError)
    {
        Span<short> storedFraction = fractions.AsSpan(day * cells.Length, cells.Length);
        Span<short> storedError = errors.AsSpan(day * cells.Length, cells.Length);
        for (int index = 0; index < cells.Length; index++)
        {
            storedFraction[index] = Packed(fraction[cells[index]]);
            storedError[index] = Packed(standardError[cells[index]]);
        }
    }

    /// <summary>Copies one day out, onto the grid.</summary>
    /// <param name="day">The day's place in the span.</param>
    /// <param name="fraction">Receives one value a cell of the grid; other cells than those of the ocean are left alone. Missing: NaN.</param>
    public void CopyDay(int day, Span<float> fraction)
    {
        ReadOnlySpan<short> stored = fractions.AsSpan(day * cells.Length, cells.Length);
        for (int index = 0; index < cells.Length; index++)
        {
            fraction[cells[index]] = Unpacked(stored[index]);
        }
    }

    /// <summary>Copies the series of neighbouring cells out.</summary>
    /// <param name="days">The days of the span that was loaded.</param>
    /// <param name="first">The first cell's place among the ocean cells.</param>
    /// <param name="count">How many cells.</param>
    /// <param name="fraction">Receives one series after another, <paramref name="days"/> values each. Unit: 1. Missing: NaN.</param>
    /// <param name="standardError">Receives their standard errors, likewise.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public void CopySeries(int days, int first, int count, Span<float> fraction, Span<float> standardError)
    {
        for (int day = 0; day < days; day++)
        {
            ReadOnlySpan<short> storedFraction = fractions.AsSpan((day * cells.Length) + first, count);
            ReadOnlySpan<short> storedError = errors.AsSpan((day * cells.Length) + first, count);
            for (int cell = 0; cell < count; cell++)
            {
                fraction[(cell * days) + day] = Unpacked(storedFraction[cell]);
                standardError[(cell * days) + day] = Unpacked(storedError[cell]);
            }
        }
    }

    /// <summary>Copies the melt signals of neighbouring cells out.</summary>
    /// <param name="days">The days of the span that was loaded.</param>
    /// <param name="first">The first cell's place among the ocean cells.</param>
    /// <param name="count">How many cells.</param>
    /// <param name="kelvins">Three spans: horizontal range, 19 GHz and 37 GHz vertical; each receives one series after another. Missing: NaN.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // A night is over before tiering would notice.
    public void CopySignals(int days, int first, int count, float[][] kelvins)
    {
        Span<float> unpacked = stackalloc float[count];
        for (int signal = 0; signal < signals.Length; signal++)
        {
            for (int day = 0; day < days; day++)
            {
                ArchiveMeltSignals.Unpack(signals[signal].AsSpan((day * cells.Length) + first, count), unpacked);
                for (int cell = 0; cell < count; cell++)
                {
                    kelvins[signal][(cell * days) + day] = unpacked[cell];
                }
            }
        }
    }

    private Fault? LoadDay(ArchiveGrids grids, string? path, int day, Planes planes)
    {
        Span<short> storedFraction = fractions.AsSpan(day * cells.Length, cells.Length);
        Span<short> storedError = errors.AsSpan(day * cells.Length, cells.Length);
        if (path is null)
        {
            storedFraction.Fill(Packing.Fill);
            storedError.Fill(Packing.Fill);
            return null;
        }

        try
        {
            grids.ReadConcentration(path, planes.Fraction, planes.Error);
        }
        catch (FaultException unreadable)
        {
            storedFraction.Fill(Packing.Fill); // A bad file costs its day.
            storedError.Fill(Packing.Fill);
            return unreadable.Fault;
        }

        Set(day, planes.Fraction, planes.Error);
        return null;
    }

    private Fault? LoadSignals(ArchiveMeltSignals reader, string? path, int day, Planes planes)
    {
        Fault? fault = null;
        bool isRead = path is not null;
        try
        {
            if (path is not null)
            {
                reader.Read(path, planes.Signals[0], planes.Signals[1], planes.Signals[2]);
            }
        }
        catch (FaultException unreadable)
        {
            (isRead, fault) = (false, unreadable.Fault);
        }

        for (int signal = 0; signal < signals.Length; signal++)
        {
            Span<short> stored = signals[signal].AsSpan(day * cells.Length, cells.Length);
            short[] plane = planes.Signals[signal];
            for (int index = 0; index < cells.Length; index++)
            {
                stored[index] = isRead ? plane[cells[index]] : Packing.Fill;
            }
        }

        return fault;
    }

    private void MakeRoom(IceYearSpan span, bool withSignals)
    {
        int size = span.Days * cells.Length;
        for (int signal = 0; withSignals && signal < signals.Length; signal++)
        {
            signals[signal] = signals[signal].Length < size ? new short[size] : signals[signal];
        }

        if (fractions.Length < size)
        {
            (fractions, errors) = (new short[size], new short[size]);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static short Packed(float value) => float.IsNaN(value) ? Packing.Fill : (short)((value * StepsPerUnit) + 0.5f);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static float Unpacked(short stored) => stored == Packing.Fill ? float.NaN : stored / StepsPerUnit;

    private sealed record Planes(float[] Fraction, float[] Error, short[][] Signals);
}

/// <summary>The files of an archive by day, with what reads them.</summary>
/// <param name="Reader">Reads one.</param>
/// <param name="Files">The file of each day that has one.</param>
internal sealed record StoredDays<T>(T Reader, IReadOnlyDictionary<DateOnly, string> Files);
