using System.Security.Cryptography;
using System.Text;
using IceExtent.Retrieval;
using IceExtent.Worker.Configuration;

namespace IceExtent.Worker.Running;

/// <summary>One number for everything that decides the numbers of an archive, apart from the input files.</summary>
internal static class ConfigurationDigest
{
    /// <summary>SHA-256 over the configuration files, the run's own settings and the program's version, in hexadecimal.</summary>
    public static string Of(RunSettings settings)
    {
        using IncrementalHash hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (string path in settings.ConfigPaths.Concat(settings.Sources.Select(source => source.SensorPath)))
        {
            hash.AppendData(SHA256.HashData(File.ReadAllBytes(path)));
        }

        hash.AppendData(Encoding.UTF8.GetBytes(string.Join('\n', SettingsText(settings))));
        return Convert.ToHexStringLower(hash.GetHashAndReset());
    }

    private static IEnumerable<string> SettingsText(RunSettings settings)
    {
        yield return ProgramVersion.Text;
        yield return settings.Grid.Name;
        yield return settings.Notice ?? string.Empty;
        yield return FormattableString.Invariant(
            $"{settings.Rules.IceFraction:R} {settings.Rules.PackFraction:R} {settings.LandLimitFraction:R} {settings.ErrorLengths.FarMeters:R} {settings.ErrorLengths.FootprintMeters:R} {settings.ErrorLengths.MissedIceMeters:R} {settings.ErrorLengths.EdgeFactor:R} {settings.Smearing.Range:R} {settings.Smearing.Curvature:R}");
        yield return FormattableString.Invariant($"{settings.LeastNeighbours} {settings.Rules.PolarGap} {settings.LeastRimShare:R}");
        yield return settings.DayFilling is { } rules ? FormattableString.Invariant($"{rules} {settings.FillMissingDays}") : string.Empty;
        yield return CoastText(settings.Coast);
        yield return settings.Weather.Text; // The bytes of its files are counted above.
        if (settings.TiePoints.NeedsSamples(settings.Methods))
        {
            yield return settings.TiePoints.ToString(); // Records print their numbers in full and without culture.
        }

        if (settings.Melt.Signals)
        {
            yield return "melt signals";
        }

        foreach (RunSource source in settings.Sources)
        {
            string channels = string.Join(' ', source.Description.Channels.OrderBy(pair => pair.Key).Select(pair => $"{ChannelNames.NameOf(pair.Key)}={pair.Value}"));
            yield return FormattableString.Invariant($"{source.Sensor.Name} {source.Status} {channels} {source.Description.Raw}")
                + FormattableString.Invariant($" {source.Period.First:yyyy-MM-dd} {source.Period.Last:yyyy-MM-dd} {SourceOffsetText.Of(source)}");
        }
    }

    // Only what the chosen correction uses: the rest decides no number.
    private static string CoastText(CoastSettings coast) => coast.Correction switch
    {
        CoastCorrection.Off => string.Empty,
        CoastCorrection.Brightness => FormattableString.Invariant($"{coast.Correction} {coast.Brightness}"),
        CoastCorrection.Concentration => $"{coast.Correction} {ConcentrationText(coast)}",
        _ => FormattableString.Invariant($"{coast.Correction} {coast.Brightness} {ConcentrationText(coast)}"),
    };

    private static string ConcentrationText(CoastSettings coast) => coast.MinimumFraction is null
        ? FormattableString.Invariant($"{coast.Spill}")
        : FormattableString.Invariant($"{coast.Minimum}"); // The file's bytes are counted above.
}
