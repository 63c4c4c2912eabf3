using System.Text;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>A file is there whole or not at all. The error numbers are worked from errno(3) and the Win32 system error codes.</summary>
public sealed class PublishedFileTests : IDisposable
{
    private const string Old = "old";
    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Write_MissingFolders_MakesThemAndLeavesNothingElse()
    {
        PublishedFile.Write(folder.PathOf("a", "b", "c.txt"), "new"u8);

        Assert.Equal([Path.Combine("a", "b", "c.txt")], folder.Files());
        Assert.Equal("new", File.ReadAllText(folder.PathOf("a", "b", "c.txt")));
    }

    [Fact]
    public void Write_FileThere_ReplacesAllOfIt()
    {
        string path = Existing("a rather long text that was there before");

        PublishedFile.WriteText(path, "new");

        Assert.Equal("new"u8.ToArray(), File.ReadAllBytes(path));
    }

    [Fact]
    public void Write_WhileWriting_TheOldFileStandsAndTheNewOneIsBeside()
    {
        string path = Existing(Old);
        string part = PublishedFile.PartPathOf(path);

        PublishedFile.Write(path, stream =>
        {
            stream.Write("new"u8);
            Assert.Equal(Old, File.ReadAllText(path));
            Assert.Equal("new"u8.Length, new FileInfo(part).Length);
        });

        Assert.Equal("new", File.ReadAllText(path));
        Assert.False(File.Exists(part));
    }

    [Fact]
    public void Write_WriterThrows_KeepsTheOldFileAndPassesTheErrorOn()
    {
        string path = Existing(Old);

        Assert.Throws<InvalidOperationException>(() => PublishedFile.Write(path, stream =>
        {
            stream.Write("half of the new"u8);
            throw new InvalidOperationException();
        }));

        Assert.Equal(Old, File.ReadAllText(path));
        Assert.Equal(["file.txt"], folder.Files());
    }

    [Fact]
    public void Write_DiskFull_KeepsTheOldFileAndSaysSo()
    {
        string path = Existing(Old);

        // Writing to /dev/full fails as writing to a full disk does (Linux, full(4)).
        Fault fault = FaultOf(() => PublishedFile.Write(path, stream =>
        {
            stream.Write("half of the new"u8);
            using FileStream full = new("/dev/full", FileMode.Open, FileAccess.Write, FileShare.ReadWrite, bufferSize: 0);
            full.Write("the other half"u8);
        }));

        Assert.Equal(("IE3102", path), (fault.Code, fault.Where));
        Assert.Equal(Old, File.ReadAllText(path));
        Assert.Equal(["file.txt"], folder.Files());
    }

    [Fact]
    public void Write_KilledEarlier_OverwritesWhatWasLeft()
    {
        string path = Existing(Old);
        File.WriteAllText(PublishedFile.PartPathOf(path), "what a killed run left, longer than the new text");

        PublishedFile.WriteText(path, "new");

        Assert.Equal("new", File.ReadAllText(path));
        Assert.Equal(["file.txt"], folder.Files());
    }

    [Fact]
    public void RemoveLeftovers_PartsAndOthers_DeletesThePartsAlone()
    {
        string deep = folder.PathOf("a", "b");
        Directory.CreateDirectory(deep);
        foreach (string name in (string[])[".x.nc.part", "x.nc", "y.part", ".z.parts"])
        {
            File.WriteAllText(Path.Combine(deep, name), Old);
        }

        Assert.Equal(1, PublishedFile.RemoveLeftovers(folder.Path));

        Assert.Equal([.. ((string[])[".z.parts", "x.nc", "y.part"]).Select(name => Path.Combine("a", "b", name))], folder.Files());
        Assert.Equal(0, PublishedFile.RemoveLeftovers(folder.PathOf("none")));
    }

    [Fact]
    public void Write_FileWhereAFolderIsNeeded_NamesThatFile()
    {
        string blocker = Existing(Old);

        Fault fault = FaultOf(() => PublishedFile.WriteText(Path.Combine(blocker, "year=1990", "x.nc"), "new"));

        Assert.Equal("IE3104", fault.Code);
        Assert.Contains(blocker, fault.Found, StringComparison.Ordinal);
        Assert.Equal(Old, File.ReadAllText(blocker));
    }

    [Fact]
    public void Write_FolderInTheWay_SaysSo()
    {
        Directory.CreateDirectory(folder.PathOf("x.nc"));

        Fault fault = FaultOf(() => PublishedFile.WriteText(folder.PathOf("x.nc"), "new"));

        Assert.Equal("IE3105", fault.Code);
        Assert.Empty(folder.Files());
    }

    [Fact]
    public void Write_NameTooLong_SaysSo()
    {
        string name = new('n', 300); // ext4, xfs and btrfs take 255 bytes.

        Assert.Equal("IE3103", FaultOf(() => PublishedFile.WriteText(folder.PathOf(name), "new")).Code);
    }

    [Fact]
    public void Write_FolderThatRefuses_SaysSo()
    {
        // Even root makes no file in sysfs: no permission, or a read-only mount in a container.
        Fault fault = FaultOf(() => PublishedFile.WriteText("/sys/iceextent.txt", "new"));

        Assert.Contains(fault.Code, (string[])["IE3101", "IE3106"]);
    }

    [Theory]
    [InlineData(28, "IE3102")] // ENOSPC
    [InlineData(122, "IE3102")] // EDQUOT
    [InlineData(unchecked((int)0x80070070), "IE3102")] // ERROR_DISK_FULL
    [InlineData(unchecked((int)0x80070027), "IE3102")] // ERROR_HANDLE_DISK_FULL
    [InlineData(30, "IE3106")] // EROFS
    [InlineData(unchecked((int)0x80070013), "IE3106")] // ERROR_WRITE_PROTECT
    [InlineData(5, "IE3107")] // EIO
    public void Write_SystemError_HasItsCode(int number, string code)
    {
        Fault fault = FaultOf(() => PublishedFile.Write(
            folder.PathOf("x.txt"), _ => throw new IOException("The system's words.", number)));

        Assert.Equal(code, fault.Code);
        Assert.Empty(folder.Files());
    }

    [Fact]
    public void WriteText_LettersBeyondAscii_AreUtf8WithoutMark()
    {
        PublishedFile.WriteText(folder.PathOf("x.txt"), "Öland\n");

        Assert.Equal([0xC3, 0x96, .. Encoding.ASCII.GetBytes("land\n")], File.ReadAllBytes(folder.PathOf("x.txt")));
    }

    private string Existing(string content)
    {
        string path = folder.PathOf("file.txt");
        File.WriteAllText(path, content);
        return path;
    }

    private static Fault FaultOf(Action action) => Assert.Throws<FaultException>(action).Fault;

    /// <summary>
    /// Three threads meet a folder that none has made yet. Before it was mended this failed within twelve rounds, three
    /// times of three; a pass does not prove the absence of races.
    /// </summary>
    [Fact]
    public void Write_SeveralThreadsIntoANewFolder_WritesThemAll()
    {
        using TemporaryFolder folder = new();
        for (int round = 0; round < 200; round++)
        {
            string name = Path.Join(folder.Path, $"round-{round}", "year");
            using Barrier start = new(3);
            Parallel.For(0, 3, new ParallelOptions { MaxDegreeOfParallelism = 3 }, file =>
            {
                start.SignalAndWait(TimeSpan.FromSeconds(1)); // Bounded: on one core the two may run one after the other.
                PublishedFile.WriteText(Path.Join(name, $"{file}.txt"), "whole");
            });

            Assert.Equal(3, Directory.GetFiles(name).Length);
        }
    }
}
