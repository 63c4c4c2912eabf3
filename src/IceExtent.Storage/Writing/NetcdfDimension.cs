using System.Globalization;
using PureHDF;

namespace IceExtent.Storage.Writing;

/// <summary>One dimension of a netCDF-4 file: an HDF5 dimension scale that variables refer to.</summary>
/// <param name="Name">The dimension's name.</param>
/// <param name="Length">Its length.</param>
/// <param name="Scale">The data set that stands for it.</param>
/// <remarks>Source: [NetCDF4] "Dimensions have HDF5 Dimension Scales"; [HDF5-DS] for <c>CLASS</c> and <c>NAME</c>.</remarks>
internal sealed record NetcdfDimension(string Name, int Length, H5Dataset Scale)
{
    /// <summary>A dimension with a coordinate variable.</summary>
    /// <param name="text">The text attributes of the file.</param>
    /// <param name="id">Counts the file's dimensions from 0, in the order they are shown.</param>
    /// <param name="name">The name of the dimension and of its variable.</param>
    /// <param name="values">One value a step.</param>
    public static NetcdfDimension WithCoordinate(NetcdfText text, int id, string name, double[] values) =>
        Of(text, id, name, values.Length, new H5Dataset(values), label: name);

    /// <summary>A dimension without values, such as the two ends of a time bound.</summary>
    /// <param name="text">The text attributes of the file.</param>
    /// <param name="id">Counts the file's dimensions from 0, in the order they are shown.</param>
    /// <param name="name">The name of the dimension.</param>
    /// <param name="length">Its length.</param>
    public static NetcdfDimension Bare(NetcdfText text, int id, string name, int length) =>
        Of(
            text, id, name, length, new H5Dataset(new float[length]),
            // The wording by which netCDF knows such a dimension, with the length in ten places.
            label: string.Create(CultureInfo.InvariantCulture, $"This is a netCDF dimension but not a netCDF variable.{length,10}"));

    /// <summary>Says which dimensions a variable has.</summary>
    /// <param name="variable">The variable; not itself a dimension scale.</param>
    /// <param name="dimensions">Slowest first.</param>
    public static void Attach(H5Dataset variable, IReadOnlyList<NetcdfDimension> dimensions)
    {
        ArgumentNullException.ThrowIfNull(variable);
        variable.Attributes["DIMENSION_LIST"] =
            dimensions.Select(dimension => new H5ObjectReference[] { new(dimension.Scale) }).ToArray();
    }

    private static NetcdfDimension Of(NetcdfText text, int id, string name, int length, H5Dataset scale, string label)
    {
        scale.Attributes["CLASS"] = text.TerminatedOf("DIMENSION_SCALE");
        scale.Attributes["NAME"] = text.TerminatedOf(label);
        scale.Attributes["_Netcdf4Dimid"] = id;
        return new(name, length, scale);
    }
}
