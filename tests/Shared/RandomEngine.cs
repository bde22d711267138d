using System.Globalization;
using CsCheck;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Tests.Shared;

/// <summary>Engines of two cylinders with figures anywhere a workshop meets them, for laws that must hold whatever the numbers.</summary>
/// <param name="Bore">mm.</param>
/// <param name="Stroke">mm.</param>
/// <param name="Chambers">Of each cylinder, cc.</param>
/// <param name="Deck">mm, below &gt; 0.</param>
/// <param name="Crown">cc, dish &gt; 0.</param>
/// <param name="Offset">Pin offset, mm.</param>
/// <param name="Scatter">Of the repeats, cc.</param>
internal sealed record RandomEngine(double Bore, double Stroke, double[] Chambers, double Deck, double Crown, double Offset, double Scatter)
{
    public static readonly Gen<RandomEngine> Gen = CsCheck.Gen.Select(
        CsCheck.Gen.Double[65, 110], CsCheck.Gen.Double[60, 110], CsCheck.Gen.Double[35, 80].Array[2], CsCheck.Gen.Double[-0.6, 0.8],
        CsCheck.Gen.Double[-6, 8], CsCheck.Gen.Double[-1, 1], CsCheck.Gen.Double[0.05, 0.4],
        (bore, stroke, chambers, deck, crown, offset, scatter) => new RandomEngine(
            Math.Round(bore, 3), Math.Round(stroke, 2), [.. chambers.Select(cc => Math.Round(cc, 1))], Math.Round(deck, 2), Math.Round(crown, 1),
            Math.Round(offset, 1), Math.Round(scatter, 1) + 0.1));

    /// <summary>The job, with every length times a factor and every volume times its cube, written in mm or in inch.</summary>
    public Job Job(double scale = 1, bool inch = false)
    {
        string Length(double mm, double limit = 0)
        {
            double perUnit = inch ? 25.4 : 1;
            string unit = inch ? "in" : "mm";
            return limit == 0 ? $"{Text(mm * scale / perUnit)} {unit}" : $"{Text(mm * scale / perUnit)} {unit} ± {Text(limit * scale / perUnit)} {unit}";
        }

        string Volume(double cc, double limit = 0)
        {
            double cube = scale * scale * scale / (inch ? 16.387064 : 1);
            string unit = inch ? "cu in" : "cc";
            return limit == 0 ? $"{Text(cc * cube)} {unit}" : $"{Text(cc * cube)} {unit} ± {Text(limit * cube)} {unit}";
        }

        string Signed(string text, double value, string plus, string minus) => $"{text} {(value >= 0 ? plus : minus)}";

        string chambers = string.Join(", ", Chambers.SelectMany((cc, index) => new[] { cc, cc + Scatter, cc - Scatter }.Select(reading =>
            $$""" { "what": "chamber", "cylinder": "{{index + 1}}", "value": "{{Volume(reading)}}", "gauge": "bur", "stage": "as received" } """)));
        string bores = string.Join(", ", new[] { "top", "bottom" }.SelectMany(at => Enumerable.Range(1, 2).Select(cylinder =>
            $$""" { "what": "bore", "cylinder": "{{cylinder}}", "at": "{{at}}", "axis": "thrust", "value": "{{Length(at == "top" ? Bore : Bore - 0.01)}}", "gauge": "bg", "stage": "as received" } """)));
        return JobText.Read(
            $$"""
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "R" },
              "engine": { "cylinders": 2, "stroke": "{{Length(Stroke, 0.05)}}", "rodLength": "{{Length(1.7 * Stroke, 0.1)}}", "pinOffset": "{{Length(Offset, 0.1)}}",
                "cam": { "inletCloses": "50 deg ± 1 deg ABDC" }, "altitude": "0 m" },
              "gauges": [ { "id": "bur", "kind": "burette", "resolution": "{{Volume(0.2)}}", "limitOfError": "{{Volume(0.1)}}" },
                { "id": "bg", "kind": "bore gauge", "resolution": "{{Length(0.002)}}", "limitOfError": "{{Length(0.005)}}" } ],
              "readings": [ {{chambers}}, {{bores}} ],
              "given": [ { "what": "gasket thickness", "value": "{{Length(1.1, 0.04)}}" }, { "what": "gasket opening", "value": "{{Length(Bore + 1.5, 0.2)}}" },
                { "what": "deck", "value": "{{Signed(Length(Math.Abs(Deck), 0.03), Deck, "below", "proud")}}" },
                { "what": "crown", "value": "{{Signed(Volume(Math.Abs(Crown), 0.2), Crown, "dish", "dome")}}" },
                { "what": "top land height", "value": "{{Length(5, 0.5)}}" }, { "what": "top land diameter", "value": "{{Length(Bore - 0.5, 0.05)}}" } ] }
            """);
    }

    // Fifteen digits, which is what the grammar reads and more than a law's tolerance needs.
    private static string Text(double value) => ((decimal)value).ToString("0.#############", CultureInfo.InvariantCulture);
}
