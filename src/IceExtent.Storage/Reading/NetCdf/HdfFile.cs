using System.Runtime.CompilerServices;
using IceExtent.Storage.Faults;
using PureHDF;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>An open NetCDF-4 file. Belongs to one thread.</summary>
internal sealed class HdfFile : IDisposable
{
    private readonly Dictionary<ulong, FileVariable> scales = [];
    private readonly NativeFile root;
    private AttributeBag? attributes;

    private HdfFile(string path, GuardedStream stream)
    {
        (Path, Stream) = (path, stream);
        root = H5File.Open(stream, leaveOpen: true);
    }

    /// <summary>The file's path.</summary>
    public string Path { get; }

    /// <summary>The file's bytes.</summary>
    public GuardedStream Stream { get; }

    /// <summary>The attributes of the whole file.</summary>
    public AttributeBag Attributes => attributes ??= new(root);

    /// <summary>The variable whose cells are being read, for messages; null while it is the file's structure.</summary>
    public string? ReadingCellsOf { get; set; }

    /// <summary>Opens a file, lets it be read, and closes it. Every error that a file can cause ends in a coded one.</summary>
    /// <exception cref="FaultException">The file cannot be opened, read or used.</exception>
    public static T Read<T>(string path, Func<HdfFile, T> read)
    {
        HdfFile? file = null;
        try
        {
            using GuardedStream stream = new(path);
            FileSignature.Check(path, stream);
            ChunkUnpacking.Use();
            file = new(path, stream);
            return read(file);
        }
        catch (Exception cause) when (cause is not (FaultException or OperationCanceledException))
        {
            throw NetCdfFaults.Explain(path, file?.ReadingCellsOf, cause);
        }
        finally
        {
            file?.Dispose();
        }
    }

    /// <summary>A variable that must be there.</summary>
    /// <exception cref="FaultException">IE2105: it is not.</exception>
    public FileVariable Variable(string name)
    {
        try
        {
            // Asking first whether the link exists would walk the file's index twice.
            return root.Get(name) is NativeDataset dataset ? new(this, dataset) : throw NetCdfFaults.NoVariable(this, name);
        }
        catch (Exception cause) when (cause is not FaultException && !root.LinkExists(name))
        {
            throw NetCdfFaults.NoVariable(this, name);
        }
    }

    /// <summary>A variable, or null where the file has none of that name.</summary>
    public FileVariable? Find(string name) =>
        root.LinkExists(name) && root.Get(name) is NativeDataset dataset ? new(this, dataset) : null;

    /// <summary>The variable or bare dimension that an axis refers to; null where the reference leads nowhere.</summary>
    public FileVariable? Scale(NativeObjectReference1 reference)
    {
        // Each look-up walks the file's index, and all channels share their axes.
        ulong address = Unsafe.BitCast<NativeObjectReference1, ulong>(reference);
        if (!scales.TryGetValue(address, out FileVariable? scale) && root.Get(reference) is NativeDataset dataset)
        {
            scale = new(this, dataset);
            scales[address] = scale;
        }

        return scale;
    }

    /// <summary>The names of all variables at the top of the file, in ordinal order.</summary>
    public IReadOnlyList<string> VariableNames() =>
        [.. root.Children().OfType<NativeDataset>().Select(dataset => dataset.Name).Order(StringComparer.Ordinal)];

    /// <inheritdoc/>
    public void Dispose()
    {
        root.Dispose();
    }
}
