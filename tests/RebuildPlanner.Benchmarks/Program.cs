using BenchmarkDotNet.Running;
using RebuildPlanner.Benchmarks;

// Ratios are taken within one run, rival and program by turns on one machine: a time of its own says nothing on another one.
string word = args.FirstOrDefault(arg => !arg.StartsWith('-')) ?? "both";
if (word is not ("both" or "first-order" or "process"))
{
    Console.Error.WriteLine($"{word}: there is no such benchmark; write first-order or process, or nothing for both.");
    return 2;
}

if (args.Contains("--detail"))
{
    BenchmarkRunner.Run<FirstOrderDetail>();
    return 0;
}

bool agreed = word == "process" || FirstOrderBenchmark.Run();
if (word is "both" or "process")
{
    ProcessBenchmark.Run();
}

return agreed ? 0 : 1;
