using IceExtent.TestKit;
using IceExtent.Worker;

namespace IceExtent.EndToEnd.Tests;

/// <summary>Region files that cannot be used, through the whole program: each is told with its file, its feature and its place.</summary>
public sealed class BadRegionTests : IDisposable
{
    private const string Box = "[[[0, 85], [80, 85], [80, 90], [0, 90], [0, 85]]]";
    private readonly TinyRun run = new();

    public BadRegionTests()
    {
        run.WriteDay(new(1990, 3, 1), _ => 0.5);
        run.WriteRunFile("regions = [\"set.geojson\"]");
    }

    public static TheoryData<string, string, string> BadFiles() => new()
    {
        { "IE1501", "{ \"type\": \"FeatureCollection\",\n  \"features\": [ }", "line 2, column 17" },
        { "IE1501", "{ \"type\": \"Topology\" }", "Topology" },
        { "IE1501", "[1, 2]", "JSON without a type" },
        { "IE1501", "{ \"type\": \"FeatureCollection\", \"features\": [{ \"type\": \"Polygon\" }] }", "feature 1" },
        { "IE1502", "{ \"type\": \"FeatureCollection\", \"features\": [] }", "no feature" },
        { "IE1503", Collection("{ }", "Polygon", Box), "feature 1: found no property name" },
        { "IE1503", Collection("{ \"name\": 7 }", "Polygon", Box), "no text" },
        { "IE1503", Collection("{ \"name\": \"kara sea\" }", "Polygon", Box), "kara sea" },
        { "IE1503", Collection("{ \"name\": \"hemisphere\" }", "Polygon", Box), "hemisphere" },
        { "IE1505", Named("LineString", "[[0, 85], [80, 85]]"), "feature 1 (a): found the geometry LineString" },
        { "IE1505", Named("Polygon", "[[[0, 85], [80, 85], [80, 90], [0, 90]]]"), "an open ring, ring 1: it starts at longitude 0, latitude 85 and ends at 0, 90" },
        { "IE1505", Named("Polygon", "[[[0, 85], [80, 85], [0, 85]]]"), "a ring of 3 positions, ring 1" },
        { "IE1505", Named("Polygon", "[[[0, 85], [80, \"x\"], [80, 90], [0, 85]]]"), "no position, ring 1, position 2" },
        { "IE1505", Named("MultiPolygon", "[]"), "no list of coordinates" },
        { "IE1505", Named("Polygon", "[[[0, 90], [80, 90], [40, 90], [0, 90]]]"), "less than three places" },
        { "IE1506", Named("Polygon", "[[[85, 170], [85, 175], [88, 175], [85, 170]]]"), "ring 1, position 1: found longitude 85, latitude 170" },
        { "IE1506", Named("Polygon", "[[[85, 170], [85, 175], [88, 175], [85, 170]]]"), "latitude before longitude" },
        { "IE1506", Named("Polygon", "[[[200000, 85], [1, 85], [1, 88], [200000, 85]]]"), "in longitude and latitude, in degrees" },
        { "IE1507", Named("Polygon", "[[[0, 80], [10, 88], [10, 80], [0, 88], [0, 80]]]"), "feature 1 (a): found a ring that crosses or touches itself at longitude 5, latitude 84" },
        { "IE1508", Named("Polygon", "[[[0, 80], [100, 80], [100, 90], [0, 90], [0, 80]]]"), "100 degrees of longitude after it at longitude 0, latitude 80" },
        { "IE1509", Named("Polygon", "[[[0, -80], [80, -80], [80, -90], [0, -90], [0, -80]]]"), "grid of the other hemisphere" },
        { "IE1509", Named("Polygon", "[[[89.8, 10], [89.9, 10], [89.9, 60], [89.8, 60], [89.8, 10]]]"), "exchanged" },
        { "IE1509", Named("Polygon", "[[[-88, 89.45], [-88, 89.55], [-92, 89.55], [-92, 89.45], [-88, 89.45]]]"), "land alone" },
        { "IE1001", null!, "set.geojson" },
    };

    public void Dispose() => run.Dispose();

    [Theory]
    [MemberData(nameof(BadFiles))]
    public async Task Run_BadRegionFile_IsRefusedBeforeAnyDay(string code, string text, string told)
    {
        if (text is not null)
        {
            run.Write("set.geojson", text);
        }

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Equal(ExitCode.Configuration, ended.ExitCode);
        Assert.Contains($"{code} {run.PathOf("set.geojson")}", ended.Messages, StringComparison.Ordinal);
        Assert.Contains(told, ended.Messages, StringComparison.Ordinal);
        Assert.False(Directory.Exists(run.PathOf("out")));
    }

    [Fact]
    public async Task Run_OneNameInTwoSets_IsToldWithBothPlaces()
    {
        run.WriteRunFile("regions = [\"set.geojson\", \"other.json\"]");
        run.Write("set.geojson", Named("Polygon", Box));
        run.Write("other.json", Named("Polygon", Box));

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains($"IE1504 {run.PathOf("other.json")}, feature 1 (a): found the name a a second time; the first is {run.PathOf("set.geojson")}, feature 1 (a)", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_TwoFaultsInOneFile_TellsBoth()
    {
        run.Write("set.geojson", """
            { "type": "FeatureCollection", "features": [
              { "type": "Feature", "properties": { "name": "a b" }, "geometry": { "type": "Point", "coordinates": [0, 0] } },
              { "type": "Feature", "properties": { "name": "c" }, "geometry": null }
            ] }
            """);

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("IE1503", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("the geometry Point", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("feature 2 (c): found no geometry", ended.Messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Run_UnknownSet_NamesTheShippedOnes()
    {
        run.WriteRunFile("regions = [\"northern-sea\"]");

        ProgramRun ended = await ProgramRun.OfAsync("run", run.RunFile);

        Assert.Contains("IE1007", ended.Messages, StringComparison.Ordinal);
        Assert.Contains("Did you mean northern-seas?", ended.Messages, StringComparison.Ordinal);
    }

    private static string Named(string type, string coordinates) => Collection("{ \"name\": \"a\" }", type, coordinates);

    private static string Collection(string properties, string type, string coordinates) => $$"""
        { "type": "FeatureCollection", "features": [
          { "type": "Feature", "properties": {{properties}}, "geometry": { "type": "{{type}}", "coordinates": {{coordinates}} } } ] }
        """;
}
