using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Benchmarks;

/// <summary>First order of eight cylinders against python3-uncertainties on the same model; the figures must agree before a ratio is printed.</summary>
internal static class FirstOrderBenchmark
{
    private const double Wanted = 200.0;

    // Both compute in doubles, in another order: the values differ by rounding, u and covariance by rounding of sums that nearly cancel.
    private const double ValueTolerance = 1e-9, DoubtTolerance = 1e-6;

    private static readonly string[] _pythons = ["/usr/bin/python3", "python3"];

    private const int Rounds = 15, CallsPerRound = 2000;

    /// <summary>Runs it.</summary>
    /// <returns>False where the two disagree.</returns>
    public static bool Run()
    {
        EngineModel model = new StageModel(EightCylinderJob.Read(), EightCylinderJob.Measured).Model;
        FirstOrder ours = new(model);
        Console.WriteLine(Invariant($"first order: {model.Cylinders.Count} cylinders, {model.Sources.Length} sources"));
        double seconds = BestSeconds(ours);
        Console.WriteLine(Invariant($"first order: {BytesPerCall(ours)} bytes allocated by an Evaluate (wanted 0)"));

        JsonElement? answer = Rival(model);
        if (answer is not { } rival)
        {
            Console.WriteLine(Invariant($"first order: ours {seconds * 1e6:0.0} µs"));
            Console.WriteLine("first order: no rival, skipped. It is the package python3-uncertainties, for the system's python3.");
            return true;
        }

        if (Disagreement(ours, model, rival) is { } where)
        {
            Console.WriteLine($"first order: the two disagree, so there is no ratio. {where}");
            return false;
        }

        double theirs = rival.GetProperty("seconds").GetDouble();
        Console.WriteLine(Invariant(
            $"first order: ours {seconds * 1e6:0.0} µs, python3-uncertainties {rival.GetProperty("version").GetString()} {theirs * 1e3:0.00} ms, ratio {theirs / seconds:0} (wanted ≥ {Wanted:0})"));
        return true;
    }

    private static double BestSeconds(FirstOrder firstOrder)
    {
        // The first rounds are compiled, counted and compiled again; the fastest round is the one nothing else disturbed.
        double best = double.PositiveInfinity;
        for (int round = 0; round < Rounds; round++)
        {
            long start = Stopwatch.GetTimestamp();
            for (int call = 0; call < CallsPerRound; call++)
            {
                firstOrder.Evaluate();
            }

            best = Math.Min(best, Stopwatch.GetElapsedTime(start).TotalSeconds / CallsPerRound);
        }

        return best;
    }

    private static long BytesPerCall(FirstOrder firstOrder)
    {
        long before = GC.GetAllocatedBytesForCurrentThread();
        firstOrder.Evaluate();
        return GC.GetAllocatedBytesForCurrentThread() - before;
    }

    private static JsonElement? Rival(EngineModel model)
    {
        string path = Path.GetTempFileName();
        try
        {
            ModelFile.Write(model, path);

            // The Debian package serves the system's own python, which need not be the first on the path.
            return _pythons.Select(python => Ask(python, path)).FirstOrDefault(answer => answer is not null);
        }
        finally
        {
            File.Delete(path);
        }
    }

    private static JsonElement? Ask(string python, string modelPath)
    {
        try
        {
            string script = Path.Combine(AppContext.BaseDirectory, "FirstOrder", "rival_first_order.py");
            JsonElement answer = JsonDocument.Parse(Tool.Output(python, script, modelPath)).RootElement;
            return answer.TryGetProperty("missing", out _) ? null : answer;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            return null;
        }
    }

    private static string? Disagreement(FirstOrder ours, EngineModel model, JsonElement rival)
    {
        string[] names = [.. rival.GetProperty("outputs").EnumerateArray().Select(name => name.GetString()!)];
        for (int cylinder = 0; cylinder < model.Cylinders.Count; cylinder++)
        {
            for (int column = 0; column < names.Length; column++)
            {
                Output output = Enum.Parse<Output>(names[column]);
                double value = Number("values", cylinder, column), u = Number("u", cylinder, column);
                if (Differ(ours.Value(cylinder, output), value, ValueTolerance))
                {
                    return Invariant($"Cylinder {cylinder}, {output}: {ours.Value(cylinder, output):R} against {value:R}.");
                }

                if (Differ(ours.StandardUncertainty(cylinder, output), u, DoubtTolerance))
                {
                    return Invariant($"Cylinder {cylinder}, u of {output}: {ours.StandardUncertainty(cylinder, output):R} against {u:R}.");
                }
            }

            for (int column = 0; column < names.Length; column++)
            {
                Output output = Enum.Parse<Output>(names[column]);
                double scale = ours.StandardUncertainty(cylinder, output) * ours.StandardUncertainty(cylinder, output);
                for (int other = 0; other < model.Cylinders.Count; other++)
                {
                    double theirs = rival.GetProperty("covariance")[column][cylinder][other].GetDouble();
                    if (Math.Abs(ours.Covariance(output, cylinder, other) - theirs) > DoubtTolerance * scale)
                    {
                        return Invariant($"Covariance of {output} between {cylinder} and {other}.");
                    }
                }
            }

            if (SharesDisagree(ours, model, cylinder, rival.GetProperty("shares")[cylinder]))
            {
                return Invariant($"Shares of cylinder {cylinder}.");
            }
        }

        return null;

        double Number(string table, int row, int column) => rival.GetProperty(table)[row][column].GetDouble();
    }

    /// <summary>The rival shares out by source; ours by what is measured. Where a thing has its sources to itself, its share is their sum.</summary>
    private static bool SharesDisagree(FirstOrder ours, EngineModel model, int cylinder, JsonElement bySource)
    {
        ILookup<int, What> whats = Enumerable.Range(0, CylinderFigures<Core.Numerics.Real>.Count)
            .SelectMany(input => model.TermsOf(cylinder, input).ToArray())
            .ToLookup(term => term.Source, term => term.What);
        double variance = ours.Covariance(Output.CompressionRatio, cylinder, cylinder);
        double[] byWhat = new double[FirstOrder.WhatCount];
        HashSet<What> mixed = [];
        for (int source = 0; source < model.Sources.Length; source++)
        {
            double share = bySource[source].GetDouble(), slope = ours.Row(cylinder, Output.CompressionRatio)[source];
            if (Math.Abs((slope * slope * model.Variances[source] / variance) - share) > DoubtTolerance)
            {
                return true;
            }

            What[] distinct = [.. whats[source].Distinct()];
            if (distinct.Length > 1)
            {
                mixed.UnionWith(distinct);
            }
            else if (distinct.Length == 1)
            {
                byWhat[(int)distinct[0]] += share;
            }
        }

        return Enumerable.Range(0, FirstOrder.WhatCount)
            .Any(what => !mixed.Contains((What)what) && Math.Abs(byWhat[what] - ours.Share(cylinder, (What)what)) > DoubtTolerance);
    }

    private static bool Differ(double ours, double theirs, double relative) =>
        !(Math.Abs(ours - theirs) <= relative * Math.Max(Math.Abs(ours), Math.Abs(theirs)));

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
