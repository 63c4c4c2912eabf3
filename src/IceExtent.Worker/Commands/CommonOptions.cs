using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Commands;

/// <summary>Arguments and options that several commands share.</summary>
internal static class CommonOptions
{
    public static Option<DateOnly?> Day(string name, string description) => new(name)
    {
        Description = description,
        HelpName = "YYYY-MM-DD",
        CustomParser = result =>
        {
            string written = result.Tokens.Count == 0 ? string.Empty : result.Tokens[0].Value;
            if (DateOnly.TryParseExact(written, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day))
            {
                return day;
            }

            result.AddError(OptionCheck.Message(name, written.Length == 0 ? "nothing" : written, "a date such as 1984-12-25"));
            return null;
        },
    };

    /// <summary>Refuses a period that ends before it begins.</summary>
    /// <exception cref="ConfigurationException">IE1012.</exception>
    public static void CheckPeriod(DateOnly? from, DateOnly? to)
    {
        if (from is { } first && to is { } last && last < first)
        {
            throw new ConfigurationException([new("IE1012", "command line", "--to before --from", "a period of at least one day", "Swap the two dates.")]);
        }
    }

    public static Option<int> Workers() =>
        Count("--workers", "How many days are processed at a time; results do not depend on it.", _ => Environment.ProcessorCount, 256);

    /// <summary>A whole number from 1 to a most; without a default it must be given.</summary>
    public static Option<int> Count(string name, string description, Func<ArgumentResult, int>? byDefault, int most)
    {
        Option<int> option = new(name) { Description = description, HelpName = "N" };
        if (byDefault is not null)
        {
            option.DefaultValueFactory = byDefault;
        }

        option.Validators.Add(result =>
        {
            if (result.Tokens.Count == 1 && !(int.TryParse(result.Tokens[0].Value, CultureInfo.InvariantCulture, out int count) && count >= 1 && count <= most))
            {
                result.AddError(OptionCheck.Message(name, result.Tokens[0].Value, $"1 to {most}"));
            }
        });
        return option;
    }

    public static Option<bool> Json() => new("--json") { Description = "Write the result as JSON." };
}
