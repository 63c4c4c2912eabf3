using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>The archive's own melt signals, read back.</summary>
public sealed class ArchiveMeltSignalsTests : IDisposable
{
    private static readonly DateOnly Day = new(1990, 6, 1);
    private static readonly float[] Range = [.. Enumerable.Range(0, 30).Select(cell => cell == 4 ? float.NaN : -20f + (1.3f * cell))];
    private static readonly float[] Vertical = [.. Enumerable.Range(0, 30).Select(cell => cell == 4 ? float.NaN : 190.07f + cell)];

    private readonly TemporaryFolder folder = new();
    private readonly ArchiveLayout layout;

    public ArchiveMeltSignalsTests() => layout = new(folder.PathOf("archive"));

    public void Dispose() => folder.Dispose();

    /// <summary>Origin: worked. Tenths of K: −20 + 1.3 · 2 = −17.4 K is −174; 190.07 K is 1,901.</summary>
    [Fact]
    public void Read_WhatWasWritten_ComesBackInTenths()
    {
        Write(Day, MeltSignalVariables.Of(Range, Vertical, Vertical));
        ArchiveMeltSignals signals = new(layout, SmallFiles.Grid);
        short[] range = new short[30], v19 = new short[30], v37 = new short[30];
        float[] kelvins = new float[30];

        signals.Read(signals.List(null, null)[0].Path, range, v19, v37);
        ArchiveMeltSignals.Unpack(range, kelvins);

        Assert.Equal((-174, Packing.Fill, 1_901), (range[2], range[4], v19[0]));
        Assert.Equal(v19, v37);
        Assert.Equal((-17.4f, float.NaN), (kelvins[2], kelvins[4]));
    }

    [Fact]
    public void Read_SeveralThreads_GiveTheSame()
    {
        DateOnly[] days = [.. Enumerable.Range(0, 24).Select(Day.AddDays)];
        Array.ForEach(days, day => Write(day, MeltSignalVariables.Of(Array.ConvertAll(Range, value => value + (day.Day / 10f)), Vertical, Vertical)));
        ArchiveMeltSignals signals = new(layout, SmallFiles.Grid);
        IReadOnlyList<(DateOnly Day, string Path)> files = signals.List(days[2], days[^1]);
        short[] first = new short[files.Count];

        Parallel.For(0, files.Count, new ParallelOptions { MaxDegreeOfParallelism = 4 }, file =>
        {
            short[] range = new short[30], v19 = new short[30], v37 = new short[30];
            signals.Read(files[file].Path, range, v19, v37);
            first[file] = range[0];
        });

        Assert.Equal(files.Select(file => (short)(-200 + file.Day.Day)), first);
    }

    [Fact]
    public void Read_FileOfAnotherKind_IsAFault()
    {
        ArchiveMeltSignals signals = new(layout, SmallFiles.Grid);
        Grid shifted = new("shifted", 3411, SmallFiles.Grid.Projection, SmallFiles.Grid.Frame with { LeftMeters = 0.0 });
        Write(Day, MeltSignalVariables.Of(Range, Vertical, Vertical));
        Assert.Equal("IE2108", Code(new(layout, shifted)));

        GridVariable other = new PackedVariable(MeltSignalVariables.HorizontalRange, "other steps", null, [], "K", Vertical, Packing.BrightnessKelvins);
        Write(Day, [other, .. MeltSignalVariables.Of(Range, Vertical, Vertical).Skip(1)]);
        Assert.Equal("IE2111", Code(signals));
        Write(Day, [new PackedVariable("concentration", "none of them", null, [], "1", Range, Packing.Fraction)]);
        Assert.Equal("IE2105", Code(signals));
        Assert.Throws<ArgumentException>(() => signals.Read(layout.MeltSignalFile(Hemisphere.North, Day), new short[29], new short[30], new short[30]));

        string Code(ArchiveMeltSignals reader) => Assert.Throws<FaultException>(
            () => reader.Read(layout.MeltSignalFile(Hemisphere.North, Day), new short[30], new short[30], new short[30])).Fault.Code;
    }

    private void Write(DateOnly day, IReadOnlyList<GridVariable> variables) =>
        GridFile.Write(layout.MeltSignalFile(Hemisphere.North, day), SmallFiles.Grid, day, variables, [new("title", "Invented")]);
}
