using System.Globalization;
using System.Text;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>A field of a table in text, with its place. Line and column count from 1.</summary>
internal readonly record struct CsvField(string Text, int Line, int Column);

/// <summary>Splits comma-separated text as [RFC4180] has it: fields in double quotes may hold commas, line ends and doubled quotes.</summary>
internal sealed class CsvText(string text, string path)
{
    private int at;
    private int line = 1;
    private int lineStart;

    /// <summary>The records that are not empty lines. Blanks round fields without quotes are dropped.</summary>
    /// <param name="faults">Receives IE1512 at the first place that cannot be read; what was read before it is returned.</param>
    public IReadOnlyList<IReadOnlyList<CsvField>> Read(ICollection<Fault> faults)
    {
        List<IReadOnlyList<CsvField>> records = [];
        while (at < text.Length)
        {
            List<CsvField> record = [];
            bool more = true;
            while (more)
            {
                if (ReadField(faults) is not { } field)
                {
                    return records;
                }

                record.Add(field);
                more = at < text.Length && text[at] == ',';
                at += more ? 1 : 0;
            }

            PassLineEnd();
            if (record.Count > 1 || record[0].Text.Length > 0)
            {
                records.Add(record);
            }
        }

        return records;
    }

    private int Column => at - lineStart + 1;

    private CsvField? ReadField(ICollection<Fault> faults)
    {
        while (at < text.Length && text[at] is ' ' or '\t')
        {
            at++;
        }

        (int startLine, int startColumn) = (line, Column);
        if (at < text.Length && text[at] == '"')
        {
            return ReadQuoted(startLine, startColumn, faults) is { } quoted ? new(quoted, startLine, startColumn) : null;
        }

        int start = at;
        while (at < text.Length && text[at] is not (',' or '\r' or '\n'))
        {
            at++;
        }

        return new(text[start..at].TrimEnd(), startLine, startColumn);
    }

    private string? ReadQuoted(int startLine, int startColumn, ICollection<Fault> faults)
    {
        StringBuilder content = new();
        at++;
        while (at < text.Length)
        {
            char sign = text[at];
            if (sign == '"' && at + 1 < text.Length && text[at + 1] == '"')
            {
                content.Append('"');
                at += 2;
                continue;
            }

            at++;
            if (sign == '"')
            {
                return AfterQuote(faults) ? content.ToString() : null;
            }

            content.Append(sign);
            if (sign == '\n')
            {
                (line, lineStart) = (line + 1, at);
            }
        }

        faults.Add(Fault(startLine, startColumn, "a double quote that is never closed", "closed quotes"));
        return null;
    }

    private bool AfterQuote(ICollection<Fault> faults)
    {
        while (at < text.Length && text[at] is ' ' or '\t')
        {
            at++;
        }

        if (at >= text.Length || text[at] is ',' or '\r' or '\n')
        {
            return true;
        }

        faults.Add(Fault(line, Column, "text after a closing quote", "a comma or the end of the line; a quote inside a field is written twice"));
        return false;
    }

    private void PassLineEnd()
    {
        at += at < text.Length && text[at] == '\r' ? 1 : 0;
        at += at < text.Length && text[at] == '\n' ? 1 : 0;
        (line, lineStart) = (line + 1, at);
    }

    private Fault Fault(int faultLine, int column, string found, string allowed) => new(
        "IE1512", string.Create(CultureInfo.InvariantCulture, $"{path}, line {faultLine}, column {column}"), found, allowed, "Correct the line.");
}
