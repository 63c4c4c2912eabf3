using System.Globalization;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>Reads places from comma-separated text with a header.</summary>
internal static class PlaceTable
{
    private const string NameColumn = "name";
    private const string TitleColumn = "title";
    private const string LatitudeColumn = "latitude";
    private const string LongitudeColumn = "longitude";
    private const string RadiusColumn = "radius_km";

    private static readonly string[] Needed = [NameColumn, LatitudeColumn, LongitudeColumn, RadiusColumn];

    /// <summary>Reads every line.</summary>
    /// <param name="path">The file.</param>
    /// <param name="faults">Receives every fault: IE1001, IE1502, IE1503, IE1506, IE1512, IE1513.</param>
    /// <returns>The places of the lines without faults, in the order of the file.</returns>
    public static IReadOnlyList<DrawnPlace> Read(string path, ICollection<Fault> faults)
    {
        int before = faults.Count;
        if (TextFile.Read(path, "a table of places", faults) is not { } text)
        {
            return [];
        }

        IReadOnlyList<IReadOnlyList<CsvField>> records = new CsvText(text, path).Read(faults);
        if (records.Count < 2)
        {
            if (faults.Count == before)
            {
                faults.Add(new("IE1502", path, "no place", $"a header ({string.Join(',', Needed)}) and a line a place", "Leave the file out of the run file, or put something into it."));
            }

            return [];
        }

        return Columns(records[0], path, faults) is { } columns
            ? [.. records.Skip(1).Select(record => new Line(path, columns, record, faults).Place()).OfType<DrawnPlace>()]
            : [];
    }

    private static Dictionary<string, int>? Columns(IReadOnlyList<CsvField> header, string path, ICollection<Fault> faults)
    {
        Dictionary<string, int> columns = new(StringComparer.Ordinal);
        for (int column = 0; column < header.Count; column++)
        {
            columns.TryAdd(header[column].Text, column);
        }

        string[] missing = [.. Needed.Where(name => !columns.ContainsKey(name))];
        if (missing.Length == 0)
        {
            return columns;
        }

        faults.Add(new(
            "IE1512", $"{path}, line {header[0].Line}, column 1", $"a header without {string.Join(", ", missing)}",
            $"the columns {string.Join(", ", Needed)}, and {TitleColumn} if wanted",
            header.Count == 1 && header[0].Text.Contains(';', StringComparison.Ordinal) ? "Separate the fields by commas." : "Name the columns in the first line."));
        return null;
    }

    // One line after the header.
    private sealed class Line(string path, Dictionary<string, int> columns, IReadOnlyList<CsvField> record, ICollection<Fault> faults)
    {
        public DrawnPlace? Place()
        {
            int before = faults.Count;
            CsvField name = Field(NameColumn);
            string where = $"{At(name)} ({name.Text})";
            if (PlainNames.FaultOf(name.Text, name.Text.Length > 0 ? where : At(name)) is { } badName)
            {
                faults.Add(badName);
            }

            double? latitude = Number(LatitudeColumn);
            double? longitude = Number(LongitudeColumn);
            double? radius = Number(RadiusColumn);
            if (latitude is { } y && longitude is { } x && PlaceRules.FaultOf(new GeoPosition(y, x), $"{At(Field(LatitudeColumn))} ({name.Text})") is { } outside)
            {
                faults.Add(outside);
            }

            if (radius is { } kilometers && PlaceRules.FaultOfReach(kilometers, $"{At(Field(RadiusColumn))} ({name.Text})", RadiusColumn) is { } badRadius)
            {
                faults.Add(badRadius);
            }

            string title = columns.ContainsKey(TitleColumn) ? Field(TitleColumn).Text : string.Empty;
            return faults.Count > before ? null : new(where, new(
                name.Text, title.Length > 0 ? title : name.Text, [[new(latitude!.Value, longitude!.Value)]], 1_000.0 * radius!.Value));
        }

        // A field that the line is too short for is an empty one at its end.
        private CsvField Field(string column) => columns[column] < record.Count
            ? record[columns[column]]
            : new(string.Empty, record[^1].Line, record[^1].Column + record[^1].Text.Length);

        private double? Number(string column)
        {
            CsvField field = Field(column);
            if (double.TryParse(field.Text, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number))
            {
                return number;
            }

            faults.Add(new("IE1512", At(field), field.Text.Length == 0 ? $"no {column}" : $"the {column} \"{field.Text}\"", "a number with a point before its decimals", "Correct the field."));
            return null;
        }

        private string At(CsvField field) => string.Create(CultureInfo.InvariantCulture, $"{path}, line {field.Line}, column {field.Column}");
    }
}
