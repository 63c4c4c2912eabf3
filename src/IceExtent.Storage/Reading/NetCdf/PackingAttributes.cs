using System.Globalization;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Reads from a variable's attributes what its stored numbers mean. Source: [CF] sections 2.5 and 8.1.</summary>
/// <remarks>
/// <c>scale_factor</c> and <c>add_offset</c> may be stored in any numeric type; a 32-bit real is read as the
/// shortest decimal it stands for, so that 0.1 means a tenth. <c>_FillValue</c>, <c>missing_value</c> and the
/// <c>valid_…</c> attributes count in stored numbers. One exception, by [NUG]: where stored integers are scaled to
/// reals, valid limits that are themselves reals count in K. Without <c>_FillValue</c> the default fill value of
/// the type is missing too, except in single bytes.
/// </remarks>
internal static class PackingAttributes
{
    /// <summary>The encoding of a variable.</summary>
    /// <exception cref="Faults.FaultException">IE2106: its numbers cannot be read. IE2111: an attribute makes no sense.</exception>
    public static KelvinEncoding Of(FileVariable variable)
    {
        StoredNumber stored = variable.Number ?? throw NetCdfFaults.Type(variable, NumberTypes.NameOf(variable.Dataset.Type));
        StoredNumber number = variable.Attributes.Text("_Unsigned") is { } unsigned
            ? StoredNumbers.WithSign(stored, signed: !unsigned.Equals("true", StringComparison.OrdinalIgnoreCase))
            : stored;

        double scale = Factor(variable, "scale_factor", 1.0);
        double offset = Factor(variable, "add_offset", 0.0);
        if (scale == 0.0)
        {
            throw NetCdfFaults.Packing(variable, "scale_factor 0", "a number other than 0");
        }

        (double lowest, double highest) = Limits(variable, number, scale, offset);
        return new(number, scale, offset)
        {
            Lowest = lowest,
            Highest = highest,
            Missing = Missing(variable, number),
        };
    }

    private static double Factor(FileVariable variable, string name, double otherwise)
    {
        if (!variable.Attributes.Has(name))
        {
            return otherwise;
        }

        AttributeNumbers? numbers = variable.Attributes.Numbers(name);
        return numbers?.Values is [var value] && double.IsFinite(value)
            ? numbers.Number == StoredNumber.RealFourBytes ? ShortestDecimal((float)value) : value
            : throw NetCdfFaults.Packing(
                variable,
                numbers is null ? $"{name} that is no number" : $"{name} {Show(numbers.Values)}",
                "one finite number");
    }

    private static double ShortestDecimal(float value) =>
        double.Parse(value.ToString("R", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private static double[] Missing(FileVariable variable, StoredNumber number)
    {
        AttributeNumbers? fill = Marks(variable, "_FillValue");
        AttributeNumbers? missing = Marks(variable, "missing_value");
        IEnumerable<double> marks = fill is null ? DefaultFill(number) : AsStored(fill, number);
        return [.. marks.Concat(missing is null ? [] : AsStored(missing, number)).Where(mark => !double.IsNaN(mark)).Distinct()];
    }

    private static AttributeNumbers? Marks(FileVariable variable, string name) =>
        !variable.Attributes.Has(name)
            ? null
            : variable.Attributes.Numbers(name)
                ?? throw NetCdfFaults.Packing(variable, $"{name} that is no number", "one or more numbers");

    // Source: [NUG], the default fill values of netcdf.h.
    private static double[] DefaultFill(StoredNumber number) => number switch
    {
        StoredNumber.SignedTwoBytes => [-32_767],
        StoredNumber.UnsignedTwoBytes => [65_535],
        StoredNumber.SignedFourBytes => [-2_147_483_647],
        StoredNumber.UnsignedFourBytes => [4_294_967_295],
        StoredNumber.SignedEightBytes => [-9_223_372_036_854_775_806],
        StoredNumber.UnsignedEightBytes => [18_446_744_073_709_551_614],
        StoredNumber.RealFourBytes => [9.969_209_968_386_869e36f],
        StoredNumber.RealEightBytes => [9.969_209_968_386_869e36],
        _ => [],
    };

    private static (double Lowest, double Highest) Limits(
        FileVariable variable, StoredNumber number, double scale, double offset)
    {
        (double lowest, double highest) = (double.MinValue, double.MaxValue);
        if (LimitsOf(variable, "valid_range", 2) is { } range)
        {
            double[] both = InStoredNumbers(range, variable, number, scale, offset);
            (lowest, highest) = (both[0], both[1]);
        }

        if (LimitsOf(variable, "valid_min", 1) is { } least)
        {
            lowest = InStoredNumbers(least, variable, number, scale, offset)[0];
        }

        if (LimitsOf(variable, "valid_max", 1) is { } most)
        {
            highest = InStoredNumbers(most, variable, number, scale, offset)[0];
        }

        // A negative scale turns limits in K round.
        return lowest <= highest ? (lowest, highest) : (highest, lowest);
    }

    private static AttributeNumbers? LimitsOf(FileVariable variable, string name, int count)
    {
        AttributeNumbers? numbers = Marks(variable, name);
        return numbers is null || (numbers.Values.Length == count && !numbers.Values.Any(double.IsNaN))
            ? numbers
            : throw NetCdfFaults.Packing(
                variable, $"{name} {Show(numbers.Values)}", count == 1 ? "one number" : $"{count} numbers");
    }

    private static double[] InStoredNumbers(
        AttributeNumbers limits, FileVariable variable, StoredNumber number, double scale, double offset)
    {
        bool scaled = variable.Attributes.Has("scale_factor") || variable.Attributes.Has("add_offset");
        return scaled && StoredNumbers.IsWhole(number) && !StoredNumbers.IsWhole(limits.Number)
            ? Array.ConvertAll(limits.Values, kelvins => (kelvins - offset) / scale)
            : AsStored(limits, number);
    }

    // An attribute in the variable's own signed type stands for the unsigned number of the same bits, and the other
    // way round; one in double precision stands for the variable's nearest 32-bit real.
    private static double[] AsStored(AttributeNumbers marks, StoredNumber number)
    {
        if (number == StoredNumber.RealFourBytes)
        {
            return Array.ConvertAll(marks.Values, mark => (double)(float)mark);
        }

        double patterns = Math.Pow(2.0, 8 * StoredNumbers.BytesOf(number));
        bool signed = StoredNumbers.WithSign(number, signed: true) == number;
        return !StoredNumbers.IsWhole(number)
            ? marks.Values
            : Array.ConvertAll(marks.Values, mark => (signed, mark) switch
            {
                (false, < 0.0) => mark + patterns,
                (true, _) when mark >= patterns / 2.0 && mark < patterns => mark - patterns,
                _ => mark,
            });
    }

    private static string Show(double[] values) =>
        string.Join(", ", values.Select(value => value.ToString("R", CultureInfo.InvariantCulture)));
}
