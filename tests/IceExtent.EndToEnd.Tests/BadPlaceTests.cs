using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Place files that cannot be used, through the whole program: each is told with its file, its line or feature and its place.</summary>
public sealed class BadPlaceTests : IDisposable
{
    private const string Header = "name,title,latitude,longitude,radius_km\n";
    private readonly TinyRun run = new();

    public BadPlaceTests() => run.WriteDay(new(1990, 3, 1), _ => 0.5);

    public static TheoryData<string, string, string> BadTables() => new()
    {
        { "IE1502", Header, "no place" },
        { "IE1502", "", "no place" },
        { "IE1512", "name,latitude,longitude\na,1,2\n", "line 1, column 1: found a header without radius_km" },
        { "IE1512", "name;title;latitude;longitude;radius_km\na;b;89;0;30\n", "Separate the fields by commas" },
        { "IE1512", Header + "a,A,\"89,5\",0,30\n", "line 2, column 5: found the latitude \"89,5\"" },
        { "IE1512", Header + "a,A,89.9,0\n", "no radius_km" },
        { "IE1512", Header + "a,A,89.9,NaN,30\n", "line 2, column 10" },
        { "IE1512", Header + "\"a,A,89.9,0,30\n", "line 2, column 1: found a double quote that is never closed" },
        { "IE1512", Header + "\"a\"b,A,89.9,0,30\n", "line 2, column 4: found text after a closing quote" },
        { "IE1503", Header + ",A,89.9,0,30\n", "line 2, column 1: found the name \"\"" },
        { "IE1503", Header + "a b,A,89.9,0,30\n", "the name \"a b\"" },
        { "IE1504", Header + "a,A,89.9,0,30\na,B,89.9,90,30\n", "line 3, column 1 (a): found the name a a second time; the first is" },
        { "IE1506", Header + "a,A,-179.5,89.9,30\n", "line 2, column 5 (a): found longitude 89.9, latitude -179.5" },
        { "IE1506", Header + "a,A,-179.5,89.9,30\n", "seem to be exchanged" },
        { "IE1513", Header + "a,A,89.9,0,0.5\n", "line 2, column 12 (a): found radius_km = 0.5; allowed: 1 to 500 km" },
        { "IE1510", Header + "a,A,70,0,30\n", "within 30 km; the center of the nearest is 2" },
        { "IE1510", Header + "inland,A,89.552,-90,10\n", "line 2, column 1 (inland)" },
        { "IE1510", Header + "a,A,-70,0,30\n", "that the grid is that of the place's hemisphere" },
        { "IE1001", null!, "a table of places" },
    };

    public static TheoryData<string, string, string> BadShapes() => new()
    {
        { "IE1501", "name,title", "line 1, column 2" },
        { "IE1505", Feature("\"reach_km\": 30", "Polygon", "[[[0, 85], [80, 85], [80, 90], [0, 85]]]"), "Point, LineString, MultiLineString" },
        { "IE1505", Feature("\"reach_km\": 30", "LineString", "[[0, 89.9]]"), "a line of one position" },
        { "IE1506", Feature("\"radius_km\": 30", "Point", "[89.9, 120]"), "latitude before longitude" },
        { "IE1508", Feature("\"reach_km\": 30", "LineString", "[[0, 89.9], [120, 89.9]]"), "an edge of 120 degrees" },
        { "IE1513", Feature("\"radius_km\": 30", "LineString", "[[0, 89.9], [20, 89.9]]"), "no number in the property reach_km" },
        { "IE1513", Feature("\"reach_km\": 3000", "LineString", "[[0, 89.9], [20, 89.9]]"), "reach_km = 3000" },

        // From the pole out to 53 km along the meridian of 90 W: the last 15 km lie on the land of column 0, the rest off the grid is none.
        { "IE1511", Feature("\"reach_km\": 30", "LineString", "[[-90, 89.9], [-90, 89.45]]"), "of the route over land cells or off the grid, first at longitude -90.000, latitude 89.6" },
    };

    public void Dispose() => run.Dispose();

    [Theory]
    [MemberData(nameof(BadTables))]
    public Task Run_BadTable_IsRefusedBeforeAnyDay(string code, string text, string told) => RefusedAsync("places.csv", code, text, told);

    [Theory]
    [MemberData(nameof(BadShapes))]
    public Task Run_BadShapes_AreRefusedBeforeAnyDay(string code, string text, string told) => RefusedAsync("places.geojson", code, text, told);

    [Fact]
    public async Task Run_RouteOverLand_IsAllowedWhereTheRunFileSaysSo()
    {
        run.WriteRunFile("places = \"places.geojson\"\nroutes.most_land_share = 0.9");
        run.Write("places.geojson", Feature("\"reach_km\": 30", "LineString", "[[-90, 89.9], [-90, 89.45]]"));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Done, ended.ExitCode);
    }

    [Fact]
    public async Task Run_OtherEnding_IsRefused()
    {
        run.WriteRunFile("places = \"places.xlsx\"");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("IE1007", ended.Messages, StringComparison.Ordinal);
        Assert.Contains(".csv, .geojson, .json", ended.Messages, StringComparison.Ordinal);
    }

    private async Task RefusedAsync(string file, string code, string? text, string told)
    {
        run.WriteRunFile($"places = [\"{file}\"]");
        if (text is not null)
        {
            File.WriteAllText(run.PathOf(file), text);
        }

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains($"{code} {run.PathOf(file)}", ended.Messages, StringComparison.Ordinal);
        Assert.Contains(told, ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    private static string Feature(string properties, string type, string coordinates) =>
        $$"""{ "type": "Feature", "properties": { "name": "a", {{properties}} }, "geometry": { "type": "{{type}}", "coordinates": {{coordinates}} } }""";
}
