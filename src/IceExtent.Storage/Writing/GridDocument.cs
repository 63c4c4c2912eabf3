using System.Buffers;
using System.Runtime.InteropServices;
using IceExtent.Grids;
using PureHDF;

namespace IceExtent.Storage.Writing;

/// <summary>The content of one grid file while it is put together. Its planes lie in pooled memory until it is disposed.</summary>
internal sealed class GridDocument : IDisposable
{
    private const string Conventions = "Conventions";
    private const string MappingName = "crs";
    private const string BoundsName = "time_bnds";
    private const int MonthsOfTheYear = 12;
    private static readonly DateOnly Epoch = new(1970, 1, 1);

    private readonly Grid grid;
    private readonly int values;
    private readonly NetcdfText text = new();
    private readonly H5File file = [];
    private readonly NetcdfDimension[] planeDimensions;
    private readonly List<byte[]> rented = [];

    /// <summary>Starts a file with its coordinates and its map.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="day">The day, UTC, or null for what holds on every day: the file then has no time.</param>
    /// <param name="months">Whether each variable has twelve planes, January first, in place of a time.</param>
    /// <param name="days">How many days the file holds for, from <paramref name="day"/> on.</param>
    public GridDocument(Grid grid, DateOnly? day, bool months = false, int days = 1)
    {
        this.grid = grid;
        values = grid.CellCount * (months ? MonthsOfTheYear : 1);
        file.Attributes[Conventions] = text.Of("CF-1.11");

        int timeDimensions = day is null && !months ? 0 : 1;
        NetcdfDimension y = NetcdfDimension.WithCoordinate(text, timeDimensions, "y", Centers(grid.Rows, grid.RowCenterMeters));
        NetcdfDimension x = NetcdfDimension.WithCoordinate(text, timeDimensions + 1, "x", Centers(grid.Columns, grid.ColumnCenterMeters));
        Describe(y, "projection_y_coordinate", "y of the center of the cell", "m", "Y");
        Describe(x, "projection_x_coordinate", "x of the center of the cell", "m", "X");
        if (day is { } dated)
        {
            planeDimensions = [AddTime(dated, days, y, x), y, x];
        }
        else if (months)
        {
            planeDimensions = [AddMonths(y, x), y, x];
        }
        else
        {
            planeDimensions = [y, x];
            AddScales(y, x);
        }

        file[MappingName] = Mapping();
    }

    /// <summary>Adds a global text attribute.</summary>
    public void Describe(string name, string value)
    {
        ArgumentException.ThrowIfNullOrEmpty(name);
        if (!file.Attributes.TryAdd(name, text.Of(value)))
        {
            throw new ArgumentException($"The attribute {name} comes twice.", nameof(name));
        }
    }

    /// <summary>Adds a variable: packs its plane, which is not needed afterwards.</summary>
    public void Add(GridVariable variable)
    {
        H5Dataset plane = variable switch
        {
            PackedVariable packed when packed.Values.Length == values => Packed(packed),
            BytePackedVariable packed when packed.Values.Length == values => Packed(packed),
            MaskVariable mask when mask.Values.Length == values => Mask(mask),
            FlagVariable flags when flags.Values.Length == values => Flags(flags),
            _ => throw new ArgumentException(
                $"{variable.Name} does not have {values} values, as the {grid.CellCount} cells of the grid {grid.Name} ask for.", nameof(variable)),
        };
        foreach (KeyValuePair<string, string> attribute in variable.Attributes)
        {
            if (!plane.Attributes.TryAdd(attribute.Key, text.Of(attribute.Value)))
            {
                throw new ArgumentException($"The attribute {variable.Name}:{attribute.Key} comes twice.", nameof(variable));
            }
        }

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
        H5Dataset<short[]> plane = Plane(variable, variable.Units, out Span<short> stored);
        StoredRange range = variable.Packing.Range;
        PlanePacker.Pack(variable.Values.Span, range, stored);
        KeptLimits.Apply(variable.Values.Span, variable.Limits, range, stored);
        DescribePacking(plane, Packing.Fill, variable.Packing.Scale, variable.Packing.Offset);
        plane.Attributes["valid_range"] = new[] { (short)range.Lowest, (short)range.Highest };
        return plane;
    }

    private H5Dataset<byte[]> Packed(BytePackedVariable variable)
    {
        H5Dataset<byte[]> plane = Plane(variable, variable.Units, out Span<byte> stored);
        StoredRange range = variable.Packing.Range;
        PlanePacker.Pack(variable.Values.Span, range, stored);
        DescribePacking(plane, BytePacking.Fill, variable.Packing.Scale, variable.Packing.Offset);
        plane.Attributes["valid_range"] = new[] { (byte)range.Lowest, (byte)range.Highest };
        return plane;
    }

    private H5Dataset<ushort[]> Mask(MaskVariable variable)
    {
        H5Dataset<ushort[]> plane = Plane(variable, units: null, out Span<ushort> stored);
        variable.Values.Span.CopyTo(stored);
        plane.Attributes["flag_masks"] = variable.Meanings.Select(flag => flag.Mask).ToArray();
        plane.Attributes["flag_meanings"] = text.Of(string.Join(' ', variable.Meanings.Select(flag => flag.Meaning)));
        return plane;
    }

    private H5Dataset<byte[]> Flags(FlagVariable variable)
    {
        H5Dataset<byte[]> plane = Plane(variable, units: null, out Span<byte> stored);
        variable.Values.Span.CopyTo(stored);
        plane.Attributes["_FillValue"] = BytePacking.Fill;
        plane.Attributes["flag_values"] = variable.Meanings.Select(flag => flag.Value).ToArray();
        plane.Attributes["flag_meanings"] = text.Of(string.Join(' ', variable.Meanings.Select(flag => flag.Meaning)));
        return plane;
    }

    // The caller fills the plane's memory; it is read when the file is encoded.
    private unsafe H5Dataset<T[]> Plane<T>(GridVariable variable, string? units, out Span<T> stored)
        where T : unmanaged
    {
        int length = values * sizeof(T);
        byte[] memory = ArrayPool<byte>.Shared.Rent(length);
        rented.Add(memory);
        stored = MemoryMarshal.Cast<byte, T>(memory.AsSpan(0, length));
        H5Dataset<T[]> plane = new(
            fileDims: [.. planeDimensions.Select(dimension => (ulong)dimension.Length)],
            chunks: [.. planeDimensions.Select(dimension => (uint)dimension.Length)],
            datasetCreation: new(new WholePlane(memory.AsMemory(0, length)), PlaneFilters.Of(sizeof(T))));
        plane.Attributes["long_name"] = text.Of(variable.LongName);
        if (variable.StandardName is { } standardName)
        {
            plane.Attributes["standard_name"] = text.Of(standardName);
        }

        if (units is not null)
        {
            plane.Attributes["units"] = text.Of(units);
        }

        return plane;
    }

    private static void DescribePacking<T>(H5Dataset plane, T fill, double scale, double offset)
        where T : unmanaged
    {
        plane.Attributes["_FillValue"] = fill;
        plane.Attributes["scale_factor"] = scale;
        plane.Attributes["add_offset"] = offset;
    }

    private NetcdfDimension AddTime(DateOnly day, int days, NetcdfDimension y, NetcdfDimension x)
    {
        double start = day.DayNumber - Epoch.DayNumber;
        NetcdfDimension time = NetcdfDimension.WithCoordinate(text, 0, "time", [start]);
        NetcdfDimension ends = NetcdfDimension.Bare(text, 3, "nv", 2);
        AddScales(time, y, x, ends);
        Describe(time, "time", days == 1 ? "start of the UTC day" : "start of the first UTC day", "days since 1970-01-01 00:00:00", "T");
        time.Scale.Attributes["calendar"] = text.Of("standard");
        time.Scale.Attributes["bounds"] = text.Of(BoundsName);

        H5Dataset bounds = new(new[] { start, start + days }, fileDims: [1, 2]);
        NetcdfDimension.Attach(bounds, [time, ends]);
        file[BoundsName] = bounds;
        return time;
    }

    private NetcdfDimension AddMonths(NetcdfDimension y, NetcdfDimension x)
    {
        NetcdfDimension month = NetcdfDimension.WithCoordinate(text, 0, "month", [.. Enumerable.Range(1, MonthsOfTheYear).Select(number => (double)number)]);
        AddScales(month, y, x);
        month.Scale.Attributes["long_name"] = text.Of("month of the year, January is 1");
        month.Scale.Attributes["units"] = text.Of("1");
        return month;
    }

    private void AddScales(params ReadOnlySpan<NetcdfDimension> dimensions)
    {
        foreach (NetcdfDimension dimension in dimensions)
        {
            file[dimension.Name] = dimension.Scale;
        }
    }

    // The variable holds nothing: its attributes are what counts.
    private H5Dataset Mapping()
    {
        GridMapping mapping = CoordinateSystemText.Mapping(grid);
        H5Dataset variable = new(0);
        variable.Attributes["grid_mapping_name"] = text.Of(mapping.Name);
        foreach (KeyValuePair<string, double> number in mapping.Numbers)
        {
            variable.Attributes[number.Key] = number.Value;
        }

        variable.Attributes["crs_wkt"] = text.Of(CoordinateSystemText.WellKnownText(grid));
        return variable;
    }

    private void Describe(NetcdfDimension dimension, string standardName, string longName, string units, string axis)
    {
        Dictionary<string, object> attributes = dimension.Scale.Attributes;
        attributes["standard_name"] = text.Of(standardName);
        attributes["long_name"] = text.Of(longName);
        attributes["units"] = text.Of(units);
        attributes["axis"] = text.Of(axis);
    }

    private static double[] Centers(int count, Func<int, double> center) => [.. Enumerable.Range(0, count).Select(center)];
}
