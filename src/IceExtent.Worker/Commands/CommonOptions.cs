using System.CommandLine;
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

    public static Option<int> Workers()
    {
        Option<int> option = new("--workers")
        {
            Description = "How many days are processed at a time; results do not depend on it.",
            HelpName = "N",
            DefaultValueFactory = _ => Environment.ProcessorCount,
        };
        option.Validators.Add(result =>
        {
            if (result.Tokens.Count == 1 && (!int.TryParse(result.Tokens[0].Value, CultureInfo.InvariantCulture, out int workers) || workers is < 1 or > 256))
            {
                result.AddError(OptionCheck.Message("--workers", result.Tokens[0].Value, "1 to 256"));
            }
        });
        return option;
    }

    public static Option<bool> Json() => new("--json") { Description = "Write the result as JSON." };
}
