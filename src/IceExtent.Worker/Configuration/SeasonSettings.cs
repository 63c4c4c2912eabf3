using IceExtent.Statistics.Seasons;
using IceExtent.Worker.Seasons;

namespace IceExtent.Worker.Configuration;

/// <summary>How a run finds season dates.</summary>
/// <param name="Scheme">The rules of cells and places.</param>
/// <param name="Regions">The rules of a region's area.</param>
/// <param name="LeastTrendYears">A trend needs so many years.</param>
/// <param name="LeastPlaceShare">A day of a place counts with a value on so much of its cells' area. Unit: 1.</param>
/// <param name="LeastAreaShare">A day of a region's ice area counts with a value on so much of its ocean. Unit: 1.</param>
/// <param name="LeastKnownShare">Years are compared of which so much is known. Unit: 1.</param>
/// <param name="Paths">The files that decide dates: the scheme's.</param>
/// <param name="MeltOnset">Which method gives melt onset.</param>
internal sealed record SeasonSettings(SeasonScheme Scheme, RegionSeasonRules Regions, int LeastTrendYears, double LeastPlaceShare, double LeastAreaShare, double LeastKnownShare, IReadOnlyList<string> Paths, MeltOnsetMethod MeltOnset)
{
    /// <summary>How melt is found, or null where the run keeps no signals of it.</summary>
    public MeltChoice? Melt { get; init; }

    /// <summary>The days that an ice year of a record needs.</summary>
    public IceYearSpan SpanOf(IceYear year, DateOnly recordFirst, DateOnly recordLast) => IceYearSpan.Of(year, Scheme, Melt?.Rules, recordFirst, recordLast);
}
