using System.Globalization;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>Builds small jobs as a machinist would write them, and computes them by the road the program takes.</summary>
internal static class Workbench
{
    /// <summary>A single, fully stated as received: swept 400 cm³ or so, ratio near ten. Elements replace the defaults by name.</summary>
    public static Job Single(params string[] elements) => Engine(1, elements);

    /// <summary>An engine of n cylinders in line, fully given as received.</summary>
    public static Job Engine(int cylinders, params string[] elements)
    {
        List<string> all =
        [
            "\"format\": \"rebuild-planner-job\"", "\"version\": 1", "\"job\": { \"number\": \"T-1\" }",
            "\"engine\": { \"cylinders\": " + cylinders.ToString(CultureInfo.InvariantCulture)
                + ", \"stroke\": \"78 mm ± 0.04 mm\", \"rodLength\": \"132 mm ± 0.05 mm\" }",
            """
            "given": [
              { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "value": "36 cc ± 0.3 cc" },
              { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "gasket opening", "value": "82.5 mm ± 0.2 mm" },
              { "what": "deck", "value": "0.2 mm ± 0.03 mm below" }, { "what": "crown", "value": "1.0 cc ± 0.2 cc dish" },
              { "what": "top land height", "value": "5 mm ± 0.4 mm" }, { "what": "top land diameter", "value": "80.5 mm ± 0.05 mm" } ]
            """,
        ];
        foreach (string element in elements)
        {
            string name = element.TrimStart().Split(':')[0];
            all.RemoveAll(other => other.TrimStart().StartsWith(name, StringComparison.Ordinal));
            all.Add(element);
        }

        return Read("{" + string.Join(",\n", all) + "}");
    }

    /// <summary>Reads a job that must be without fault.</summary>
    public static Job Read(string json) => JobText.Read(json);

    /// <summary>One output of the first cylinder, coherent unit, or null.</summary>
    public static double? Value(Job job, Stage stage, Output output, int cylinder = 0) =>
        new StageFigures(new StageModel(job, stage)).Of(output, cylinder)?.Value;

    /// <summary>The figure that counts.</summary>
    public static Figure? Find(Job job, Stage stage, Core.Measuring.What what, int cylinder = 0) =>
        new StageModel(job, stage).Search.Find(what, cylinder);
}
