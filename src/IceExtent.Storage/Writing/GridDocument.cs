using System.Buffers;
using System.Runtime.InteropServices;
using IceExtent.Grids;
using PureHDF;

namespace IceExtent.Storage.Writing;

/// <summary>The content of one grid file while it is put together.</summary>
internal sealed class GridDocument : IDisposable
{
    private const string MappingName = "crs";
    private static readonly DateOnly Epoch = new(1970, 1, 1);

    private readonly Grid grid;
    private readonly NetcdfText text = new();
    private readonly H5File file = [];
    private readonly NetcdfDimension[] planeDimensions;
    private readonly List<byte[]> rented = [];

    /// <summary>Starts a file with its coordinates and its map.</summary>
    public GridDocument(Grid grid, DateOnly day)
    {
        this.grid = grid;
        file.Attributes["Conventions"] = text.Of("CF-1.11");

        double start = day.DayNumber - Epoch.DayNumber;
        NetcdfDimension time = Coordinate(0, "time", [start], "time", "start of the UTC day", "days since 1970-01-01 00:00:00", "T");
        NetcdfDimension y = Coordinate(1, "y", Centers(grid.Rows, grid.RowCenterMeters), "projection_y_coordinate", "y of the cell's center, up from the pole", "m", "Y");
        NetcdfDimension x = Coordinate(2, "x", Centers(grid.Columns, grid.ColumnCenterMeters), "projection_x_coordinate", "x of the cell's center, right from the pole", "m", "X");
        NetcdfDimension ends = NetcdfDimension.Bare(text, 3, "nv", 2);
        planeDimensions = [time, y, x];

        time.Scale.Attributes["calendar"] = text.Of("standard");
        time.Scale.Attributes["bounds"] = text.Of("time_bnds");
        H5Dataset bounds = new(new[] { start, start + 1.0 }, fileDims: [1, 2]);
        NetcdfDimension.Attach(bounds, [time, ends]);

        foreach (NetcdfDimension dimension in (NetcdfDimension[])[time, y, x, ends])
        {
            file[dimension.Name] = dimension.Scale;
        }

        file["time_bnds"] = bounds;
        file[MappingName] = Mapping();
    }

    /// <summary>Adds a global text attribute.</summary>
    public void Describe(string name, string value)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        file.Attributes[name] = text.Of(value);
    }

    /// <summary>Adds a variable.</summary>
    public void Add(GridVariable variable)
    {
        H5Dataset plane = variable switch
        {
            PackedVariable packed when packed.Values.Length == grid.CellCount => Packed(packed),
            BytePackedVariable packed when packed.Values.Length == grid.CellCount => Packed(packed),
            MaskVariable mask when mask.Values.Length == grid.CellCount => Mask(mask),
            _ => throw new ArgumentException($"The plane of {variable.Name} does not have the {grid.CellCount} cells of the grid {grid.Name}.", nameof(variable)),
        };
        plane.Attributes["grid_mapping"] = text.Of(MappingName);
        NetcdfDimension.Attach(plane, planeDimensions);
        if (!file.TryAdd(variable.Name, plane))
        {
            throw new ArgumentException($"The name {variable.Name} is taken.", nameof(variable));
        }
    }

    /// <summary>Writes the whole file.</summary>
    public void Encode(Stream stream) => file.Write(stream, text.Options);

    /// <inheritdoc/>
    public void Dispose()
    {
        rented.ForEach(memory => ArrayPool<byte>.Shared.Return(memory));
        rented.Clear();
    }

    private H5Dataset<short[]> Packed(PackedVariable variable)
    {
        H5Dataset<short[]> plane = Plane(variable, out Span<short> stored);
        StoredRange range = variable.Packing.Range;
        PlanePacker.Pack(variable.Values.Span, range, stored);
        DescribePacking(plane, variable.Units, Packing.Fill, variable.Packing.Scale, variable.Packing.Offset);
        plane.Attributes["valid_range"] = new[] { (short)range.Lowest, (short)range.Highest };
        return plane;
    }

    private H5Dataset<byte[]> Packed(BytePackedVariable variable)
    {
        H5Dataset<byte[]> plane = Plane(variable, out Span<byte> stored);
        StoredRange range = variable.Packing.Range;
        PlanePacker.Pack(variable.Values.Span, range, stored);
        DescribePacking(plane, variable.Units, BytePacking.Fill, variable.Packing.Scale, variable.Packing.Offset);
        plane.Attributes["valid_range"] = new[] { (byte)range.Lowest, (byte)range.Highest };
        return plane;
    }

    private void DescribePacking<T>(H5Dataset plane, string units, T fill, double scale, double offset)
        where T : unmanaged
    {
        plane.Attributes["units"] = text.Of(units);
        plane.Attributes["_FillValue"] = fill;
        plane.Attributes["scale_factor"] = scale;
        plane.Attributes["add_offset"] = offset;
    }

    private H5Dataset<ushort[]> Mask(MaskVariable variable)
    {
        H5Dataset<ushort[]> plane = Plane(variable, out Span<ushort> stored);
        variable.Values.Span.CopyTo(stored);
        plane.Attributes["flag_masks"] = variable.Meanings.Select(flag => flag.Mask).ToArray();
        plane.Attributes["flag_meanings"] = text.Of(string.Join(' ', variable.Meanings.Select(flag => flag.Meaning)));
        return plane;
    }

    // The plane's memory is filled by the caller and read when the file is encoded.
    private unsafe H5Dataset<T[]> Plane<T>(GridVariable variable, out Span<T> stored)
        where T : unmanaged
    {
        int length = grid.CellCount * sizeof(T);
        byte[] memory = ArrayPool<byte>.Shared.Rent(length);
        rented.Add(memory);
        stored = MemoryMarshal.Cast<byte, T>(memory.AsSpan(0, length));
        H5Dataset<T[]> plane = new(
            fileDims: [1, (ulong)grid.Rows, (ulong)grid.Columns],
            chunks: [1, (uint)grid.Rows, (uint)grid.Columns],
            datasetCreation: new(new WholePlane(memory.AsMemory(0, length)), PlaneFilters.Of(sizeof(T))));
        plane.Attributes["long_name"] = text.Of(variable.LongName);
        if (variable.StandardName is { } standardName)
        {
            plane.Attributes["standard_name"] = text.Of(standardName);
        }

        foreach (KeyValuePair<string, string> attribute in variable.Attributes)
        {
            plane.Attributes[attribute.Key] = text.Of(attribute.Value);
        }

        return plane;
    }

    private H5Dataset Mapping()
    {
        H5Dataset mapping = new(0);
        foreach (KeyValuePair<string, object> attribute in GridMapping.AttributesOf(grid))
        {
            mapping.Attributes[attribute.Key] = attribute.Value is string words ? text.Of(words) : attribute.Value;
        }

        return mapping;
    }

    private NetcdfDimension Coordinate(int id, string name, double[] values, string standardName, string longName, string units, string axis)
    {
        NetcdfDimension dimension = NetcdfDimension.WithCoordinate(text, id, name, values);
        dimension.Scale.Attributes["standard_name"] = text.Of(standardName);
        dimension.Scale.Attributes["long_name"] = text.Of(longName);
        dimension.Scale.Attributes["units"] = text.Of(units);
        dimension.Scale.Attributes["axis"] = text.Of(axis);
        return dimension;
    }

    private static double[] Centers(int count, Func<int, double> center) =>
        [.. Enumerable.Range(0, count).Select(center)];
}
