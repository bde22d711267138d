using System.Diagnostics;

namespace RebuildPlanner.Benchmarks;

/// <summary>Times two processes by turns, so that a busy spell of the machine falls on both, and takes the median of each.</summary>
internal static class ByTurns
{
    /// <summary>The medians, ms.</summary>
    /// <param name="warm">Runs that do not count.</param>
    /// <param name="runs">Runs that do.</param>
    public static (double First, double Second) Medians(int warm, int runs, Func<double> first, Func<double> second)
    {
        List<double> firstMs = [], secondMs = [];
        for (int run = -warm; run < runs; run++)
        {
            double one = first(), other = second();
            if (run >= 0)
            {
                firstMs.Add(one);
                secondMs.Add(other);
            }
        }

        return (Median(firstMs), Median(secondMs));
    }

    /// <summary>How long a whole process takes, ms.</summary>
    public static double Milliseconds(string program, params string[] arguments)
    {
        long start = Stopwatch.GetTimestamp();
        (int code, string _, string error) = Tool.Run(program, arguments);
        double time = Stopwatch.GetElapsedTime(start).TotalMilliseconds;

        // 1 is a verdict outside: an answer like any other.
        return code is 0 or 1 ? time : throw new InvalidOperationException($"{program} ended with {code}.\n{error}");
    }

    /// <summary>The median.</summary>
    public static double Median(IEnumerable<double> times)
    {
        double[] sorted = [.. times.Order()];
        return sorted.Length % 2 == 1 ? sorted[sorted.Length / 2] : 0.5 * (sorted[(sorted.Length / 2) - 1] + sorted[sorted.Length / 2]);
    }
}
