namespace IceExtent.Storage.Writing;

/// <summary>Keys of the metadata of season tables and grids.</summary>
public static class SeasonMetadata
{
    /// <summary>The digest of everything that decides dates beside the days themselves.</summary>
    public const string DigestKey = "season_digest";

    /// <summary>The first and the last day of the record, or of as much of it as a year depends on.</summary>
    public const string RecordKey = "record";

    /// <summary>The name of the scheme.</summary>
    public const string SchemeKey = "scheme";

    /// <summary>Where the scheme is published.</summary>
    public const string SchemeSourceKey = "scheme_source";

    /// <summary>What ice years begin with.</summary>
    public const string BeginsKey = "ice_year_begins_with";

    /// <summary>Years that begin with ice.</summary>
    public const string Ice = "ice";

    /// <summary>Years that begin with open water.</summary>
    public const string Water = "water";
}
