using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using IceExtent.Retrieval;

namespace IceExtent.Storage.Reading.RawGrids;

/// <summary>Tells the day and the channel of a headerless file by its name.</summary>
/// <remarks>
/// In a date format <c>yyyy</c>, <c>yy</c> (1970 to 2069), <c>MM</c>, <c>dd</c> and <c>DDD</c> (day of the year) count; <c>HH</c>,
/// <c>mm</c> and <c>ss</c> are digits that are passed over; other signs stand for themselves. <c>{date}</c> alone
/// is yyyyMMdd. A part may stand twice and must then say the same.
/// </remarks>
internal sealed partial class RawNamePattern
{
    private const string ChannelGroup = "channel";
    private const string YearGroup = "year";
    private const string ShortYearGroup = "shortYear";
    private const string MonthGroup = "month";
    private const string DayGroup = "day";
    private const string OrdinalGroup = "ordinal";

    private readonly Regex names;
    private readonly IReadOnlyDictionary<string, Channel> channels;
    private readonly Channel? onlyChannel;

    private RawNamePattern(Regex names, IReadOnlyDictionary<string, Channel> channels, Channel? onlyChannel) =>
        (this.names, this.channels, this.onlyChannel) = (names, channels, onlyChannel);

    /// <summary>Understands a pattern.</summary>
    /// <param name="pattern">The pattern as the run file writes it.</param>
    /// <param name="channels">The channels and what they are called in names.</param>
    /// <exception cref="Faults.FaultException">IE2120: the pattern does not tell the day and the channel.</exception>
    public static RawNamePattern Parse(string pattern, IReadOnlyDictionary<Channel, string> channels)
    {
        Dictionary<string, Channel> byName = new(StringComparer.Ordinal);
        foreach ((Channel channel, string name) in channels)
        {
            if (!byName.TryAdd(name, channel))
            {
                throw RawFaults.Pattern(pattern, $"the name {name} for two channels");
            }
        }

        HashSet<string> groups = [];
        StringBuilder text = new();
        int at = 0;
        foreach (Match part in Parts.Matches(pattern))
        {
            text.Append(Regex.Escape(pattern[at..part.Index]));
            at = part.Index + part.Length;
            string format = part.Groups["format"].Success ? part.Groups["format"].Value : "yyyyMMdd";
            text.Append(part.Value == "{channel}"
                ? Group(ChannelGroup, string.Join('|', byName.Keys.OrderByDescending(name => name.Length).Select(Regex.Escape)), groups)
                : DateFormat(format, pattern, groups));
        }

        text.Append(Regex.Escape(pattern[at..]));
        CheckComplete(pattern, groups, channels.Count);
        return new(
            new($"^{text}$", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture),
            byName,
            groups.Contains(ChannelGroup) ? null : channels.Keys.Single());
    }

    /// <summary>The day and the channel of a file; null where its name does not fit or the date does not exist.</summary>
    public (DateOnly Date, Channel Channel)? Read(string fileName)
    {
        Match match = names.Match(fileName);
        return match.Success && DateOf(match) is { } date
            ? (date, onlyChannel ?? channels[match.Groups[ChannelGroup].Value])
            : null;
    }

    /// <summary>The name that a file of another channel would have beside this one.</summary>
    public string NameOfOther(string fileName, string otherChannel)
    {
        Group channel = names.Match(fileName).Groups[ChannelGroup];
        return channel.Success
            ? fileName[..channel.Index] + otherChannel + fileName[(channel.Index + channel.Length)..]
            : fileName;
    }

    [GeneratedRegex(@"\{channel\}|\{date(?::(?<format>[^{}]+))?\}", RegexOptions.CultureInvariant)]
    private static partial Regex Parts { get; }

    [GeneratedRegex("yyyy|yy|MM|dd|DDD|HH|mm|ss|[^a-zA-Z]|(?<wrong>.)", RegexOptions.CultureInvariant)]
    private static partial Regex DateParts { get; }

    private static string DateFormat(string format, string pattern, HashSet<string> groups)
    {
        StringBuilder text = new();
        foreach (Match part in DateParts.Matches(format))
        {
            text.Append(part.Value switch
            {
                "yyyy" => Group(YearGroup, "[0-9]{4}", groups),
                "yy" => Group(ShortYearGroup, "[0-9]{2}", groups),
                "MM" => Group(MonthGroup, "[0-9]{2}", groups),
                "dd" => Group(DayGroup, "[0-9]{2}", groups),
                "DDD" => Group(OrdinalGroup, "[0-9]{3}", groups),
                "HH" or "mm" or "ss" => "[0-9]{2}",
                _ when part.Groups["wrong"].Success => throw RawFaults.Pattern(pattern, $"{part.Value} in the date format {format}"),
                var sign => Regex.Escape(sign),
            });
        }

        return text.ToString();
    }

    private static string Group(string name, string expression, HashSet<string> groups) =>
        groups.Add(name) ? $"(?<{name}>{expression})" : $@"\k<{name}>";

    private static void CheckComplete(string pattern, HashSet<string> groups, int channels)
    {
        bool year = groups.Contains(YearGroup) || groups.Contains(ShortYearGroup);
        bool day = groups.Contains(OrdinalGroup) || (groups.Contains(MonthGroup) && groups.Contains(DayGroup));
        if (!year || !day)
        {
            throw RawFaults.Pattern(pattern, "no whole date");
        }

        if (!groups.Contains(ChannelGroup) && channels != 1)
        {
            throw RawFaults.Pattern(pattern, $"no {{channel}} for {channels} channels");
        }
    }

    private static DateOnly? DateOf(Match match)
    {
        int year = Number(match, YearGroup) ?? (Number(match, ShortYearGroup) is < 70 and var after2000
            ? 2000 + after2000
            : 1900 + Number(match, ShortYearGroup)!.Value);
        if (year < 1)
        {
            return null;
        }

        if (Number(match, OrdinalGroup) is { } ordinal)
        {
            DateOnly first = new(year, 1, 1);
            return ordinal >= 1 && ordinal <= (DateTime.IsLeapYear(year) ? 366 : 365) ? first.AddDays(ordinal - 1) : null;
        }

        (int month, int day) = (Number(match, MonthGroup)!.Value, Number(match, DayGroup)!.Value);
        return month is >= 1 and <= 12 && day >= 1 && day <= DateTime.DaysInMonth(year, month)
            ? new DateOnly(year, month, day)
            : null;
    }

    private static int? Number(Match match, string group) =>
        match.Groups[group].Success ? int.Parse(match.Groups[group].ValueSpan, CultureInfo.InvariantCulture) : null;
}
