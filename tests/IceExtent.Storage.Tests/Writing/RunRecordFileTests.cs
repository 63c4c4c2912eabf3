using System.Text.Json;
using IceExtent.Grids;
using IceExtent.Storage.Faults;
using IceExtent.Storage.Writing;

namespace IceExtent.Storage.Tests.Writing;

/// <summary>A run record comes back as it was, and its fields have the names that docs/DATA.md gives.</summary>
public sealed class RunRecordFileTests : IDisposable
{
    private static readonly RunRecord Record = new()
    {
        ProgramVersion = "1.2.3",
        Started = new(2024, 1, 2, 3, 4, 5, TimeSpan.Zero),
        Finished = new(2024, 1, 2, 3, 4, 6, TimeSpan.Zero),
        RunFile = new("/data/Öland/run.toml", "00ff"),
        ConfigurationDigest = "0123",
        CommandLine = ["run", "--from", "1988-02-28"],
        Counts = new(DaysDone: 1, Gaps: 1, Rejected: 1, PolarGapFallbacks: 0),
        Days =
        [
            new(new(1988, 2, 28), Hemisphere.North, DayOutcome.Done, [new("any", 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12)], []),
            new(new(1988, 2, 29), Hemisphere.South, DayOutcome.Rejected, [], [new("IE2104", "a.nc", "nothing", "something", "Do it.")]),
        ],
        Faults = [],
        FilesRead = ["a.nc", "b.nc"],
        ExitCode = 1,
    };

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>A record from before gaps and cells could be filled says nothing of it: none were.</summary>
    [Fact]
    public void Read_RecordWithoutFillingCounts_HasNoneFilled()
    {
        RunRecordFile.Write(folder.PathOf("new.json"), Record);
        string old = string.Join('\n', File.ReadAllLines(folder.PathOf("new.json")).Where(line => !line.Contains("fill", StringComparison.Ordinal) && !line.Contains("fallbacks", StringComparison.Ordinal) && !line.Contains("emptied", StringComparison.Ordinal)))
            .Replace("\"rejected\": 1,", "\"rejected\": 1", StringComparison.Ordinal)
            .Replace("\"warm_water\": 11,", "\"warm_water\": 11", StringComparison.Ordinal);
        File.WriteAllText(folder.PathOf("old.json"), old);

        RunRecord back = RunRecordFile.Read(folder.PathOf("old.json"));

        Assert.Equal(Record.Counts, back.Counts);
        Assert.Equal(Record.Days[0].Cells[0] with { Filled = 0, PolarGapFilled = 0, FilledFromDays = 0 }, back.Days[0].Cells[0]);
    }

    [Fact]
    public void Read_WhatWasWritten_WritesTheSameAgain()
    {
        RunRecordFile.Write(folder.PathOf("a.json"), Record);

        RunRecord back = RunRecordFile.Read(folder.PathOf("a.json"));
        RunRecordFile.Write(folder.PathOf("b.json"), back);

        Assert.Equal(File.ReadAllBytes(folder.PathOf("a.json")), File.ReadAllBytes(folder.PathOf("b.json")));
        Assert.Equal(Record.Days[1].Faults[0], back.Days[1].Faults[0]);
        Assert.Equal(Record.Days[0].Cells[0], back.Days[0].Cells[0]);
        Assert.Equal(Record.Started, back.Started);
    }

    // Worked: the record above, by the field list of docs/DATA.md.
    [Fact]
    public void Write_Record_HasTheDocumentedFields()
    {
        RunRecordFile.Write(folder.PathOf("a.json"), Record);

        Assert.Equal(
            """
            {
              "schema_version": 1,
              "program_version": "1.2.3",
              "started": "2024-01-02T03:04:05+00:00",
              "finished": "2024-01-02T03:04:06+00:00",
              "run_file": {
                "path": "/data/Öland/run.toml",
                "sha256": "00ff"
              },
              "configuration_digest": "0123",
              "command_line": [
                "run",
                "--from",
                "1988-02-28"
              ],
              "counts": {
                "days_done": 1,
                "gaps": 1,
                "rejected": 1,
                "polar_gap_fallbacks": 0,
                "tie_point_fallbacks": 0,
                "emptied_days": 0,
                "days_filled": 0
              },
              "days": [
                {
                  "date": "1988-02-28",
                  "hemisphere": "north",
                  "outcome": "done",
                  "cells": [
                    {
                      "method": "any",
                      "out_of_range": 1,
                      "clipped_below": 2,
                      "clipped_above": 3,
                      "screened_37_19": 4,
                      "screened_22_19": 5,
                      "no_solution": 6,
                      "filled": 7,
                      "polar_gap_filled": 8,
                      "coast_corrected": 9,
                      "outside_ice_mask": 10,
                      "warm_water": 11,
                      "filled_from_days": 12
                    }
                  ],
                  "faults": [],
                  "tie_points": "fixed"
                },
                {
                  "date": "1988-02-29",
                  "hemisphere": "south",
                  "outcome": "rejected",
                  "cells": [],
                  "faults": [
                    {
                      "code": "IE2104",
                      "where": "a.nc",
                      "found": "nothing",
                      "allowed": "something",
                      "remedy": "Do it."
                    }
                  ],
                  "tie_points": "fixed"
                }
              ],
              "faults": [],
              "seasons": [],
              "files_read": [
                "a.nc",
                "b.nc"
              ],
              "exit_code": 1
            }

            """,
            File.ReadAllText(folder.PathOf("a.json")));
    }

    [Theory]
    [InlineData("")]
    [InlineData("null")]
    [InlineData("{}")]
    [InlineData("{\"schema_version\": 1}")]
    public void Read_NoRecord_SaysSo(string content)
    {
        File.WriteAllText(folder.PathOf("a.json"), content);

        Fault fault = Assert.Throws<FaultException>(() => RunRecordFile.Read(folder.PathOf("a.json"))).Fault;

        Assert.Equal(("IE3130", folder.PathOf("a.json")), (fault.Code, fault.Where));
    }

    [Fact]
    public void Read_LaterVersion_SaysWhich()
    {
        RunRecordFile.Write(folder.PathOf("a.json"), Record with { SchemaVersion = 2 });

        Fault fault = Assert.Throws<FaultException>(() => RunRecordFile.Read(folder.PathOf("a.json"))).Fault;

        Assert.Equal("IE3130", fault.Code);
        Assert.Contains("schema_version 2", fault.Found, StringComparison.Ordinal);
    }

    [Fact]
    public void Read_NoFile_SaysSo() =>
        Assert.Equal("IE3130", Assert.Throws<FaultException>(() => RunRecordFile.Read(folder.PathOf("none.json"))).Fault.Code);
}
