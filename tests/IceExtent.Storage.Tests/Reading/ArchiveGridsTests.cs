using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Reading;

/// <summary>The archive's own grids, read back.</summary>
public sealed class ArchiveGridsTests : IDisposable
{
    private static readonly float[] Fraction = [.. Enumerable.Range(0, 30).Select(cell => cell == 4 ? float.NaN : cell / 30f)];
    private readonly TemporaryFolder folder = new();
    private readonly ArchiveLayout layout;

    public ArchiveGridsTests() => layout = new(folder.PathOf("archive"));

    public void Dispose() => folder.Dispose();

    [Fact]
    public void List_SeveralYears_GivesTheWantedDaysInOrder()
    {
        DateOnly[] days = [new(1991, 1, 2), new(1990, 12, 31), new(1989, 3, 1), new(1991, 1, 1)];
        foreach (DateOnly day in days)
        {
            Write(day);
        }

        File.WriteAllText(Path.Combine(Path.GetDirectoryName(layout.GridFile("any", Hemisphere.North, days[0]))!, "1990-05-05.nc"), "of another year");
        File.WriteAllText(Path.Combine(Path.GetDirectoryName(layout.GridFile("any", Hemisphere.North, days[0]))!, "note.nc"), "no day");

        ArchiveGrids grids = new(layout, "any", SmallFiles.Grid);

        Assert.Equal(days.Order(), grids.List(null, null).Select(file => file.Day));
        Assert.Equal([new(1990, 12, 31), new(1991, 1, 1)], grids.List(new(1990, 1, 1), new(1991, 1, 1)).Select(file => file.Day));
        Assert.Empty(new ArchiveGrids(layout, "other", SmallFiles.Grid).List(null, null));
    }

    /// <summary>Origin: worked. Steps of 0.0001.</summary>
    [Fact]
    public void ReadConcentration_WhatWasWritten_ComesBack()
    {
        Write(new(1990, 1, 1));
        float[] back = new float[30];
        ArchiveGrids grids = new(layout, "any", SmallFiles.Grid);

        grids.ReadConcentration(grids.List(null, null)[0].Path, back);

        Assert.Equal(Fraction, back, (one, other) => one.Equals(other) || Math.Abs(one - other) <= 0.5001e-4f);
    }

    [Fact]
    public void ReadConcentration_OtherGridOrNoGrid_IsAFault()
    {
        Write(new(1990, 1, 1));
        string path = layout.GridFile("any", Hemisphere.North, new(1990, 1, 1));
        Grid shifted = new("shifted", 3411, SmallFiles.Grid.Projection, SmallFiles.Grid.Frame with { LeftMeters = 0.0 });

        Assert.Equal("IE2108", Assert.Throws<FaultException>(() => new ArchiveGrids(layout, "any", shifted).ReadConcentration(path, new float[30])).Fault.Code);
        File.WriteAllText(path, "text");
        Assert.Equal("IE2102", Assert.Throws<FaultException>(() => new ArchiveGrids(layout, "any", SmallFiles.Grid).ReadConcentration(path, new float[30])).Fault.Code);
    }

    private void Write(DateOnly day) => GridFile.Write(
        layout.GridFile("any", Hemisphere.North, day),
        SmallFiles.Grid,
        day,
        [new PackedVariable("concentration", "ice", "sea_ice_area_fraction", [], "1", Fraction, Packing.Fraction)],
        [new("title", "Invented")]);
}
