using System.Globalization;
using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Benchmarks;

/// <summary>An invented vee-eight, measured as thoroughly as a shop would: what both benchmarks compute.</summary>
/// <remarks>
/// Made in code, so that a change of the samples changes no benchmark. Six bore places a cylinder, one of them read three times, three
/// burette fills of every chamber, deck at both pin ends: about the most doubts a real engine brings.
/// </remarks>
internal static class EightCylinderJob
{
    private const int Cylinders = 8;
    private static readonly string[] _depths = ["top", "middle", "bottom"];
    private static readonly string[] _axes = ["thrust", "along crank"];

    /// <summary>The stage everything is measured at.</summary>
    public const Stage Measured = Stage.AsMachined;

    /// <summary>The job file's text.</summary>
    public static string Text()
    {
        StringBuilder readings = new();
        for (int cylinder = 1; cylinder <= Cylinders; cylinder++)
        {
            Bores(readings, cylinder);
            for (int fill = 0; fill < 3; fill++)
            {
                Add(readings, "chamber", cylinder, "", F($"\"from\": \"0.0 cc\", \"to\": \"{63.4 + Wander(cylinder, fill, 0.1):0.0} cc\""), "glass");
            }

            Add(readings, "deck", cylinder, "\"at\": \"front\", ", F($"\"value\": \"{0.21 + Wander(cylinder, 7, 0.01):0.00} mm below\""), "dial");
            Add(readings, "deck", cylinder, "\"at\": \"rear\", ", F($"\"value\": \"{0.24 + Wander(cylinder, 8, 0.01):0.00} mm below\""), "dial");
        }

        return Frame.Replace("READINGS", readings.ToString().TrimEnd(',', '\n'), StringComparison.Ordinal);
    }

    /// <summary>The job.</summary>
    public static Job Read()
    {
        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(Encoding.UTF8.GetBytes(Text()));
        return job ?? throw new InvalidOperationException(string.Join('\n', faults));
    }

    private static void Bores(StringBuilder readings, int cylinder)
    {
        for (int depth = 0; depth < _depths.Length; depth++)
        {
            for (int axis = 0; axis < _axes.Length; axis++)
            {
                int repeats = depth == 0 && axis == 0 ? 3 : 1;
                for (int repeat = 0; repeat < repeats; repeat++)
                {
                    double bore = 101.612 - (0.002 * depth) - (0.003 * axis) + Wander(cylinder, (10 * depth) + axis + (3 * repeat), 0.001);
                    string place = $"\"at\": \"{_depths[depth]}\", \"axis\": \"{_axes[axis]}\", \"torquePlate\": true, ";
                    Add(readings, "bore", cylinder, place, F($"\"value\": \"{bore:0.000} mm\""), "bore");
                }
            }
        }
    }

    private static void Add(StringBuilder readings, string what, int cylinder, string place, string value, string gauge) =>
        readings.Append(F(
            $"{{ \"what\": \"{what}\", \"cylinder\": \"{cylinder}\", {place}{value}, \"gauge\": \"{gauge}\", \"temperature\": \"21 C\", "))
            .Append("\"stage\": \"as machined\" },\n");

    /// <summary>−2 to +2 steps, the same in every run.</summary>
    private static double Wander(int cylinder, int reading, double step) => ((((cylinder * 7) + (reading * 11)) % 5) - 2) * step;

    private static string F(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);

    private const string Frame = """
        {
          "format": "rebuild-planner-job",
          "version": 1,
          "job": { "number": "B-8", "title": "Vee-eight for the benchmarks" },
          "engine": {
            "description": "vee-eight, pushrod",
            "layout": "vee",
            "cylinders": 8,
            "veeAngle": "90 deg",
            "banks": [
              { "label": "left", "cylinders": ["1", "3", "5", "7"] },
              { "label": "right", "cylinders": ["2", "4", "6", "8"] }
            ],
            "heads": [
              { "label": "left", "cylinders": ["1", "3", "5", "7"], "metal": "aluminium" },
              { "label": "right", "cylinders": ["2", "4", "6", "8"], "metal": "aluminium" }
            ],
            "blockMetal": "cast iron",
            "stroke": "88.4 mm ± 0.04 mm",
            "rodLength": "144.8 mm ± 0.05 mm",
            "cam": { "place": "block", "drive": "chain", "inletCloses": "62 deg ± 1 deg ABDC", "at": "seat" },
            "altitude": "200 m ± 50 m"
          },
          "gauges": [
            { "id": "mic", "kind": "micrometer", "resolution": "0.001 mm", "limitOfError": "0.003 mm" },
            { "id": "bore", "kind": "bore gauge", "resolution": "0.001 mm", "limitOfError": "0.002 mm", "setWith": "mic" },
            { "id": "dial", "kind": "dial gauge", "resolution": "0.01 mm", "limitOfError": "0.01 mm" },
            { "id": "glass", "kind": "burette", "resolution": "0.1 cc", "limitOfError": "0.1 cc", "glass": "borosilicate" }
          ],
          "readings": [
        READINGS
          ],
          "assumed": [
            { "what": "top land height", "value": "6.0 mm ± 0.4 mm" },
            { "what": "top land diameter", "value": "101.0 mm ± 0.05 mm" }
          ],
          "parts": {
            "pistons": [ { "id": "new", "oversizeBore": "101.6 mm", "crown": "5.0 cc ± 0.2 cc dish", "compressionHeight": "39.6 mm ± 0.03 mm" } ],
            "gaskets": [ { "id": "1.0", "opening": "103.5 mm ± 0.2 mm", "thickness": "1.00 mm ± 0.04 mm" } ]
          },
          "fitted": [ { "stage": "as machined", "piston": "new", "gasket": "1.0" } ],
          "limits": [
            { "what": "compression ratio", "min": "8.6", "max": "9.4" },
            { "what": "piston to head", "min": "1.00 mm" }
          ]
        }
        """;
}
