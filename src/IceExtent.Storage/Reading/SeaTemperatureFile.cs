using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Reading.NetCdf;

namespace IceExtent.Storage.Reading;

/// <summary>Reads a climatology of sea-surface temperature: the mean of each month of the year.</summary>
/// <remarks>
/// The file is a [CF] NetCDF-4 file with coordinates in m or km, a grid mapping and twelve planes
/// <c>sea_surface_temperature</c>, January first, in the unit that <c>units</c> names: K or degrees Celsius. A cell without a
/// value says nothing.
/// </remarks>
public static class SeaTemperatureFile
{
    /// <summary>The name of the variable; also its [CF] standard name.</summary>
    public const string VariableName = "sea_surface_temperature";

    private const double ZeroCelsiusKelvins = 273.15;
    private const float LowestKelvins = 260f; // Colder and warmer seas do not exist: the unit must be another.
    private const float HighestKelvins = 320f;

    private static readonly MonthPlanes Planes = new(
        VariableName,
        FormattableString.Invariant($"twelve planes {VariableName} from {LowestKelvins} to {HighestKelvins} K, with units K or degC"),
        "Put the climatology on the run's grid as docs/DATA.md says, or leave warm_water_file out.",
        OtherGridCode: "IE2231",
        UnreadableCode: "IE2232",
        NoPlanesCode: "IE2233");

    /// <summary>Reads one file and compares it with a limit.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it must be on.</param>
    /// <param name="limitKelvins">In K.</param>
    /// <returns>For each month from January whether a cell is warmer than the limit; false where nothing is known. Shape: one value a cell.</returns>
    /// <exception cref="FaultException">
    /// IE2231: another grid. IE2232: not readable. IE2233: no temperatures in it. IE2224: not twelve months, or an empty one.
    /// </exception>
    public static bool[][] ReadWarmerThan(string path, Grid grid, double limitKelvins) => Planes.Read(path, grid, (variable, values) =>
    {
        double zero = ZeroOf(variable);
        bool[] warm = new bool[values.Length];
        for (int cell = 0; cell < warm.Length; cell++)
        {
            float kelvins = (float)(values[cell] + zero);
            if (kelvins is < LowestKelvins or > HighestKelvins)
            {
                throw Planes.NoPlanes(
                    variable, FormattableString.Invariant($"a temperature of {kelvins:F2} K in row {cell / grid.Columns}, column {cell % grid.Columns}"));
            }

            warm[cell] = kelvins > (float)limitKelvins; // NaN is never warmer.
        }

        return warm;
    });

    private static double ZeroOf(FileVariable variable) => variable.Attributes.Text("units") switch
    {
        "K" or "kelvin" or "Kelvin" => 0.0,
        "degC" or "deg_C" or "degree_C" or "degrees_C" or "Celsius" or "celsius" or "degree_Celsius" or "degrees_Celsius" or "°C" => ZeroCelsiusKelvins,
        null => throw Planes.NoPlanes(variable, "no attribute units"),
        var unit => throw Planes.NoPlanes(variable, $"the unit '{unit}'"),
    };
}
