using System.Globalization;
using System.Text;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Store;

namespace RebuildPlanner.Benchmarks;

/// <summary>A store of many invented jobs, each a four with a hundred readings.</summary>
internal static class FilledStore
{
    private const int ReadingsAJob = 100;

    private static readonly DateTimeOffset _first = new(2016, 1, 4, 8, 0, 0, TimeSpan.Zero);

    /// <summary>Makes the store; jobs are numbered from 1.</summary>
    public static void Make(string path, int jobs)
    {
        using JobStore store = JobStore.Open(path);
        for (int number = 1; number <= jobs; number++)
        {
            Entry[] entries =
            [
                .. JobEntries.Of(JobFileReader.Read(Encoding.UTF8.GetBytes(Text(number))).Job!)
                    .Select((entry, index) => new Entry($"{number}/{index}", entry.Kind, entry.Body, _first.AddHours(number).AddSeconds(index))),
            ];
            store.Start(entries);
        }
    }

    private static string Text(int number)
    {
        StringBuilder readings = new();
        for (int reading = 0; reading < ReadingsAJob; reading++)
        {
            string at = (reading / 8 % 3) switch { 0 => "top", 1 => "middle", _ => "bottom" }, axis = reading % 2 == 0 ? "thrust" : "along crank";
            readings.Append(
                CultureInfo.InvariantCulture,
                $$"""{ "id": "{{number}}-{{reading}}", "what": "bore", "cylinder": "{{(reading / 2 % 4) + 1}}", "at": "{{at}}", "axis": "{{axis}}", "value": "84.{{reading:D3}} mm", "gauge": "bore gauge", "stage": "as received" },""");
        }

        return $$"""
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "{{number}}", "opened": "2020-01-01", "title": "Engine {{number}}" },
              "customer": { "name": "Customer {{number % 700}}" }, "engine": { "cylinders": 4, "description": "four-cylinder overhead-cam petrol" },
              "gauges": [ { "id": "bore gauge", "kind": "bore gauge", "resolution": "0.001 mm", "limitOfError": "0.002 mm" } ],
              "readings": [ {{readings.ToString().TrimEnd(',')}} ] }
            """;
    }
}
