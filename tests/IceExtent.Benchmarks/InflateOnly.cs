using System.Diagnostics;
using System.Globalization;
using System.IO.Compression;
using PureHDF;
using PureHDF.Filters;
using PureHDF.VOL.Native;

namespace IceExtent.Benchmarks;

/// <summary>The least time any reader of a folder can take: open each file, read its bytes, inflate its chunks, nothing else.</summary>
/// <remarks>
/// <c>inflate FOLDER VARIABLE... --workers N</c>. Where the chunks lie and how long they are is found before the clock
/// starts, so neither the file format nor unshuffling nor decoding is in the time. Inflating is .NET's own.
/// </remarks>
internal static class InflateOnly
{
    public static int Run(string[] args)
    {
        int at = Array.IndexOf(args, "--workers");
        int workers = at >= 0 ? int.Parse(args[at + 1], CultureInfo.InvariantCulture) : Environment.ProcessorCount;
        string[] names = at >= 0 ? args[..at] : args;
        string[] files = [.. Directory.EnumerateFiles(names[0], "*.nc").Order(StringComparer.Ordinal)];
        Chunk[][] chunks = [.. files.Select(file => Find(file, names[1..]))];

        Stopwatch watch = Stopwatch.StartNew();
        long inflated = 0;
        Parallel.For(0, files.Length, new ParallelOptions { MaxDegreeOfParallelism = workers }, index =>
            Interlocked.Add(ref inflated, Inflate(files[index], chunks[index])));
        watch.Stop();

        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{watch.Elapsed.TotalSeconds:F3} s, {files.Length / watch.Elapsed.TotalSeconds:F0} days/s, {inflated / 1e6:F0} MB inflated"));
        return 0;
    }

    private static long Inflate(string file, Chunk[] chunks)
    {
        byte[] bytes = File.ReadAllBytes(file);
        byte[] plane = new byte[chunks.Max(chunk => chunk.Inflated)];
        long total = 0;
        foreach (Chunk chunk in chunks)
        {
            using MemoryStream deflated = new(bytes, chunk.Offset, chunk.Deflated, writable: false);
            using ZLibStream stream = new(deflated, CompressionMode.Decompress);
            total += stream.ReadAtLeast(plane.AsSpan(0, chunk.Inflated), chunk.Inflated);
        }

        return total;
    }

    // Reads each variable once through the library with a filter in between that notes what it was given.
    private static Chunk[] Find(string file, string[] variables)
    {
        List<byte[]> seen = [];
        List<int> sizes = [];
        H5Filter.Register(new NotingFilter(seen, sizes));
        using (NativeFile open = H5File.OpenRead(file))
        {
            foreach (string variable in variables)
            {
                open.Dataset(variable).Read<ushort[]>();
            }
        }

        byte[] bytes = File.ReadAllBytes(file);
        return [.. seen.Select((deflated, index) => new Chunk(bytes.AsSpan().IndexOf(deflated), deflated.Length, sizes[index]))];
    }

    private readonly record struct Chunk(int Offset, int Deflated, int Inflated);

    private sealed class NotingFilter(List<byte[]> seen, List<int> sizes) : IH5Filter
    {
        private readonly DeflateFilter library = new();

        public ushort FilterId => DeflateFilter.Id;

        public string Name => library.Name;

        public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
            library.GetParameters(chunkDimensions, typeSize, options);

        public Memory<byte> Filter(FilterInfo info)
        {
            seen.Add(info.Buffer.ToArray());
            Memory<byte> inflated = library.Filter(info);
            sizes.Add(inflated.Length);
            return inflated;
        }
    }
}
