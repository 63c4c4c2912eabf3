using System.Buffers;
using System.Buffers.Binary;
using System.Globalization;
using System.Runtime.InteropServices;
using IceExtent.Retrieval;
using IceExtent.Storage.Faults;
using Microsoft.Win32.SafeHandles;

namespace IceExtent.Storage.Reading.RawGrids;

/// <summary>Reads days from headerless grids: one channel a file, told apart by their names.</summary>
/// <remarks>
/// A day for which some channel has no file is listed all the same: reading it ends in IE2122, so that the day
/// becomes a gap with a reason, unless that channel is not asked for.
/// </remarks>
internal sealed class RawGridSource : IBrightnessSource
{
    private readonly SourceDescription description;
    private readonly RawLayout layout;
    private readonly RawNamePattern pattern;
    private readonly Channel[] channels;
    private readonly KelvinRule rule;

    /// <summary>Takes the description of a source; touches no file.</summary>
    /// <exception cref="FaultException">IE2120: the name pattern cannot be used.</exception>
    public RawGridSource(SourceDescription description, RawLayout layout)
    {
        (this.description, this.layout) = (description, layout);
        pattern = RawNamePattern.Parse(layout.NamePattern, description.Channels);
        channels = [.. description.Channels.Keys];
        rule = new(new KelvinEncoding(NumberOf(layout.Number), layout.ScaleKelvins, layout.OffsetKelvins)
        {
            Missing = layout.MissingValue is { } missing ? [AsStored(missing, layout.Number)] : [],
        });
    }

    /// <inheritdoc/>
    public SourceInventory List(CancellationToken cancellation)
    {
        List<Fault> faults = [];
        SortedDictionary<DateOnly, Dictionary<Channel, List<string>>> byDate = [];
        foreach (string path in description.Files)
        {
            cancellation.ThrowIfCancellationRequested();
            if (pattern.Read(Path.GetFileName(path)) is not var (date, channel))
            {
                faults.Add(RawFaults.Name(path, layout.NamePattern));
                continue;
            }

            if (!byDate.TryGetValue(date, out Dictionary<Channel, List<string>>? ofDay))
            {
                byDate[date] = ofDay = [];
            }

            if (!ofDay.TryGetValue(channel, out List<string>? paths))
            {
                ofDay[channel] = paths = [];
            }

            paths.Add(path);
        }

        return new([.. byDate.SelectMany(day => DaysOf(day.Key, day.Value))], faults);
    }

    /// <inheritdoc/>
    public void Read(SourceDay day, BrightnessPlanes into)
    {
        ArgumentNullException.ThrowIfNull(day);
        ArgumentNullException.ThrowIfNull(into);
        if (into.CellCount != description.Grid.CellCount)
        {
            throw new ArgumentException(
                $"The planes have {into.CellCount} cells; the grid {description.Grid.Name} has {description.Grid.CellCount}.", nameof(into));
        }

        foreach (Channel channel in ChannelNames.All)
        {
            if (!into.Has(channel))
            {
                continue;
            }

            int at = Array.IndexOf(channels, channel);
            if (at < 0)
            {
                into.Kelvins(channel).Fill(float.NaN);
            }
            else
            {
                ReadFile(day.Files[at], channel, into.Kelvins(channel));
            }
        }
    }

    // Where several files claim one channel of one day, the day is listed once for each.
    private IEnumerable<SourceDay> DaysOf(DateOnly date, Dictionary<Channel, List<string>> files)
    {
        foreach (List<string> paths in files.Values)
        {
            paths.Sort(StringComparer.Ordinal);
        }

        int copies = files.Values.Max(paths => paths.Count);
        for (int copy = 0; copy < copies; copy++)
        {
            string known = files.Values.First(paths => paths.Count > copy)[copy];
            string[] ofDay = Array.ConvertAll(channels, channel =>
                files.TryGetValue(channel, out List<string>? paths) && paths.Count > copy
                    ? paths[copy]
                    : Path.Combine(
                        Path.GetDirectoryName(known) ?? string.Empty,
                        pattern.NameOfOther(Path.GetFileName(known), description.Channels[channel])));
            yield return new(date, ofDay, 0);
        }
    }

    private void ReadFile(string path, Channel channel, Span<float> kelvins)
    {
        int width = StoredNumbers.BytesOf(rule.Encoding.Number);
        int bytes = checked(kelvins.Length * width);
        byte[] buffer = ArrayPool<byte>.Shared.Rent(bytes);
        try
        {
            using SafeFileHandle file = File.OpenHandle(path, options: FileOptions.SequentialScan);
            long length = RandomAccess.GetLength(file);
            Span<byte> stored = buffer.AsSpan(0, bytes);
            if (length != layout.HeaderBytes + (long)bytes || Fill(file, layout.HeaderBytes, stored) != bytes)
            {
                throw RawFaults.Length(path, length, layout.HeaderBytes + (long)bytes, Shape(width));
            }

            if (layout.BigEndian)
            {
                Reverse(stored, width);
            }

            CellOrder order = layout.TopRowFirst ? CellOrder.TopDown(description.Grid) : CellOrder.BottomUp(description.Grid);
            KelvinDecoder.Decode(stored, order, rule, kelvins);
        }
        catch (Exception missing) when (missing is FileNotFoundException or DirectoryNotFoundException)
        {
            throw RawFaults.NoFile(path, ChannelNames.NameOf(channel));
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException)
        {
            throw RawFaults.CannotOpen(path, cause);
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(buffer);
        }
    }

    private string Shape(int width) => string.Create(
        CultureInfo.InvariantCulture,
        $"a header of {layout.HeaderBytes}, then {description.Grid.Rows} rows of {description.Grid.Columns} numbers of {width} bytes");

    private static int Fill(SafeFileHandle file, long start, Span<byte> buffer)
    {
        int done = 0;
        while (done < buffer.Length && RandomAccess.Read(file, buffer[done..], start + done) is > 0 and var count)
        {
            done += count;
        }

        return done;
    }

    private static void Reverse(Span<byte> stored, int width)
    {
        switch (width)
        {
            case 2:
                Span<ushort> two = MemoryMarshal.Cast<byte, ushort>(stored);
                BinaryPrimitives.ReverseEndianness(two, two);
                break;
            case 4:
                Span<uint> four = MemoryMarshal.Cast<byte, uint>(stored);
                BinaryPrimitives.ReverseEndianness(four, four);
                break;
            default:
                Span<ulong> eight = MemoryMarshal.Cast<byte, ulong>(stored);
                BinaryPrimitives.ReverseEndianness(eight, eight);
                break;
        }
    }

    private static StoredNumber NumberOf(RawNumber number) => number switch
    {
        RawNumber.SignedTwoBytes => StoredNumber.SignedTwoBytes,
        RawNumber.UnsignedTwoBytes => StoredNumber.UnsignedTwoBytes,
        RawNumber.SignedFourBytes => StoredNumber.SignedFourBytes,
        RawNumber.RealFourBytes => StoredNumber.RealFourBytes,
        RawNumber.RealEightBytes => StoredNumber.RealEightBytes,
        _ => throw new ArgumentOutOfRangeException(nameof(number), number, "There is no such number type."),
    };

    // A missing value written as -999.9 means the nearest number that the files can hold.
    private static double AsStored(double missing, RawNumber number) =>
        number == RawNumber.RealFourBytes ? (float)missing : missing;
}
