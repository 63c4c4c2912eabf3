using IceExtent.Grids;

namespace IceExtent.Scenes.Demo;

/// <summary>What an invented place is.</summary>
public enum PlaceKind
{
    /// <summary>The whole sea, or a large part of it.</summary>
    Sea,

    /// <summary>A water with land on three sides.</summary>
    Gulf,

    /// <summary>A narrow water between two lands.</summary>
    Strait,

    /// <summary>One island or a group.</summary>
    Island,

    /// <summary>A point of land.</summary>
    Cape,

    /// <summary>A town with a harbor. It lies on the cell of water in front of it.</summary>
    Harbor,
}

/// <summary>A named place of the invented sea.</summary>
/// <param name="Key">The name in files, such as <c>port-trunnel</c>.</param>
/// <param name="Name">The name for people.</param>
/// <param name="Kind">What it is.</param>
/// <param name="Position">Where it is: the middle of a cell.</param>
public sealed record InventedPlace(string Key, string Name, PlaceKind Kind, GeoPosition Position);

/// <summary>The named places of the invented sea. No name is that of a real place.</summary>
public static class InventedPlaces
{
    /// <summary>Every place, waters first, harbors last.</summary>
    public static IReadOnlyList<InventedPlace> All { get; } =
    [
        At("tessivar-sea", "Tessivar Sea", PlaceKind.Sea, -12.5, 312.5),
        At("ferrundel-basin", "Ferrundel Basin", PlaceKind.Sea, 1312.5, -1387.5),
        At("gulf-of-umbraske", "Gulf of Umbraske", PlaceKind.Gulf, -1387.5, -987.5),
        At("kivalde-bay", "Kivalde Bay", PlaceKind.Gulf, -1587.5, -187.5),
        At("sound-of-ondalesk", "Sound of Ondalesk", PlaceKind.Gulf, -1337.5, 1687.5),
        At("drosmer-strait", "Drosmer Strait", PlaceKind.Strait, -137.5, -1512.5),
        At("hessivane-channel", "Hessivane Channel", PlaceKind.Strait, 1712.5, 912.5),
        At("obrellan", "Obrellan", PlaceKind.Island, -262.5, -862.5),
        At("pellavane-islands", "Pellavane Islands", PlaceKind.Island, 637.5, 787.5),
        At("cape-yarrosk", "Cape Yarrosk", PlaceKind.Cape, 1187.5, -312.5),
        At("port-trunnel", "Port Trunnel", PlaceKind.Harbor, -312.5, -1637.5),
        At("ulvessa", "Ulvessa", PlaceKind.Harbor, -687.5, -1187.5),
        At("brennock", "Brennock", PlaceKind.Harbor, -1312.5, -1437.5),
        At("maskelune", "Maskelune", PlaceKind.Harbor, -1812.5, -112.5),
        At("skarrod", "Skarrod", PlaceKind.Harbor, -1537.5, 1687.5),
        At("lommerin", "Lommerin", PlaceKind.Harbor, -112.5, 1712.5),
        At("quissom", "Quissom", PlaceKind.Harbor, 712.5, 637.5),
        At("ilmosk", "Ilmosk", PlaceKind.Harbor, 1612.5, 312.5),
        At("orvelby", "Orvelby", PlaceKind.Harbor, 312.5, -1737.5),
    ];

    private static InventedPlace At(string key, string name, PlaceKind kind, double xKilometers, double yKilometers) =>
        new(key, name, kind, InventedSea.Grid.Projection.Inverse(new(1000.0 * xKilometers, 1000.0 * yKilometers)));
}
