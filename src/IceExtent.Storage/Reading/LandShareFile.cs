using IceExtent.Grids;
using IceExtent.Storage.Faults;
using PureHDF;
using PureHDF.VOL.Native;

namespace IceExtent.Storage.Reading;

/// <summary>Reads how much of every cell is land.</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates <c>y</c> and <c>x</c> in m, a grid mapping and a plane
/// <c>land_area_fraction</c> of unsigned bytes (with <c>scale_factor</c>), or of 32-bit or 64-bit reals. Rows and
/// columns may run either way. A cell without a value counts as land: no ocean is known to be there.
/// </remarks>
public static class LandShareFile
{
    /// <summary>The name of the plane; also its [CF] standard name.</summary>
    public const string VariableName = "land_area_fraction";

    private const string Rebuild = "Write the file for this grid with scripts/build-land.sh, or name the right one as land in the grid file.";

    /// <summary>Reads one file.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <exception cref="FaultException">IE2201: another grid. IE2202: not readable. IE2203: no plane of shares in it.</exception>
    public static LandShare Read(string path, Grid grid)
    {
        ArgumentException.ThrowIfNullOrEmpty(path);
        ArgumentNullException.ThrowIfNull(grid);
        try
        {
            using FileStream stream = File.OpenRead(path);
            using NativeFile file = H5File.Open(stream);
            return Read(path, file, grid);
        }
        catch (Exception cause) when (cause is not (FaultException or OutOfMemoryException))
        {
            // The library throws bare exceptions on damaged files, so their kind says nothing.
            throw new FaultException(
                new(
                    "IE2202", path, $"a land file that cannot be read ({cause.Message.TrimEnd('.')})",
                    "a CF NetCDF-4 file of land shares", Rebuild),
                cause);
        }
    }

    private static LandShare Read(string path, NativeFile file, Grid grid)
    {
        if (Array.Find([VariableName, "x", "y"], name => !file.LinkExists(name)) is { } missing)
        {
            throw NoShares(path, $"no variable {missing}");
        }

        IH5Dataset plane = file.Dataset(VariableName);
        if (plane.Space.Dimensions is not [ulong rows, ulong columns])
        {
            throw NoShares(path, $"a variable {VariableName} of {plane.Space.Dimensions.Length} dimensions, not y and x");
        }

        GridMatch match = GridComparison.CompareShape(grid, checked((int)rows), checked((int)columns));
        if (match is GridMatch.Same)
        {
            match = GridComparison.Compare(
                grid, file.Dataset("x").Read<double[]>(), file.Dataset("y").Read<double[]>(), Mapping(file, plane));
        }

        return match switch
        {
            GridMatch.Same same => new(Arrange(Shares(path, plane), grid, same)),
            GridMatch.Different different => throw new FaultException(GridFaults.Mismatch(path, grid, different, Rebuild)),
            _ => throw new InvalidOperationException("A grid match is the same or different."),
        };
    }

    private static float[] Shares(string path, IH5Dataset plane)
    {
        double scale = Number(plane, "scale_factor") ?? 1.0;
        double offset = Number(plane, "add_offset") ?? 0.0;
        (H5DataTypeClass kind, int size) = (plane.Type.Class, plane.Type.Size);
        float[] shares = (kind, size) switch
        {
            (H5DataTypeClass.FixedPoint, 1) => Unpacked(plane.Read<byte[]>(), Fill<byte>(plane), scale, offset),
            (H5DataTypeClass.FloatingPoint, 4) => Unpacked(plane.Read<float[]>(), Fill<float>(plane), scale, offset),
            (H5DataTypeClass.FloatingPoint, 8) => Unpacked(plane.Read<double[]>(), Fill<double>(plane), scale, offset),
            _ => throw NoShares(path, $"a variable {VariableName} of {8 * size}-bit numbers of the kind {kind}"),
        };
        int bad = Array.FindIndex(shares, share => share is < 0f or > 1f);
        return bad < 0
            ? shares
            : throw NoShares(path, FormattableString.Invariant($"a land share of {shares[bad]} in cell {bad}"));
    }

    private static float[] Unpacked<T>(T[] stored, T? fill, double scale, double offset)
        where T : struct, System.Numerics.INumber<T> =>
        Array.ConvertAll(
            stored,
            value => T.IsNaN(value) || value == fill ? 1f : (float)((double.CreateChecked(value) * scale) + offset));

    private static T? Fill<T>(IH5Dataset plane)
        where T : struct =>
        plane.AttributeExists("_FillValue") ? plane.Attribute("_FillValue").Read<T[]>()[0] : null;

    private static float[] Arrange(float[] stored, Grid grid, GridMatch.Same same)
    {
        for (int row = 0; same.FlipX && row < grid.Rows; row++)
        {
            stored.AsSpan(row * grid.Columns, grid.Columns).Reverse();
        }

        if (same.FlipY)
        {
            float[] turned = new float[stored.Length];
            for (int row = 0; row < grid.Rows; row++)
            {
                stored.AsSpan((grid.Rows - 1 - row) * grid.Columns, grid.Columns).CopyTo(turned.AsSpan(row * grid.Columns));
            }

            return turned;
        }

        return stored;
    }

    // Null where the file does not say: coordinates alone then have to fit.
    private static GridMapping? Mapping(NativeFile file, IH5Dataset plane)
    {
        if (Text(plane, "grid_mapping") is not { } name || !file.LinkExists(name))
        {
            return null;
        }

        IH5Dataset variable = file.Dataset(name);
        Dictionary<string, double> numbers = [];
        foreach (IH5Attribute attribute in variable.Attributes())
        {
            if (Number(attribute) is { } number)
            {
                numbers[attribute.Name] = number;
            }
        }

        return Text(variable, "grid_mapping_name") is { } kind ? new(kind, numbers) : null;
    }

    private static double? Number(IH5Dataset variable, string name) =>
        variable.AttributeExists(name) ? Number(variable.Attribute(name)) : null;

    private static double? Number(IH5Attribute attribute) => (attribute.Type.Class, attribute.Type.Size) switch
    {
        (H5DataTypeClass.FloatingPoint, 4) => attribute.Read<float[]>()[0],
        (H5DataTypeClass.FloatingPoint, 8) => attribute.Read<double[]>()[0],
        (H5DataTypeClass.FixedPoint, 2) => attribute.Read<short[]>()[0],
        (H5DataTypeClass.FixedPoint, 4) => attribute.Read<int[]>()[0],
        (H5DataTypeClass.FixedPoint, 8) => attribute.Read<long[]>()[0],
        _ => null,
    };

    private static string? Text(IH5Dataset variable, string name) =>
        variable.AttributeExists(name) ? variable.Attribute(name).Read<string[]>()[0].TrimEnd('\0') : null;

    private static FaultException NoShares(string path, string found) => new(new(
        "IE2203", path, found, $"a plane {VariableName} of bytes or reals from 0 (sea) to 1 (land), with coordinates", Rebuild));
}
