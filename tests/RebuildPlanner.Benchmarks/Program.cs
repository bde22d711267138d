using BenchmarkDotNet.Running;
using RebuildPlanner.Benchmarks;

// Ratios are taken within one run, rival and program by turns on one machine: a time of its own says nothing on another one.
string word = args.FirstOrDefault(arg => !arg.StartsWith('-')) ?? "all";
if (word is not ("all" or "first-order" or "process" or "sheet" or "store" or "trials"))
{
    Console.Error.WriteLine($"{word}: there is no such benchmark; write first-order, process, sheet, store or trials, or nothing for all.");
    return 2;
}

if (args.Contains("--detail"))
{
    BenchmarkRunner.Run<FirstOrderDetail>();
    return 0;
}

bool agreed = word is not ("all" or "first-order") || FirstOrderBenchmark.Run();
if (word is "all" or "process")
{
    ProcessBenchmark.Run();
}

if (word is "all" or "sheet")
{
    SheetBenchmark.Run();
}

if (word is "all" or "store")
{
    StoreBenchmark.Run();
}

if (word is "all" or "trials")
{
    agreed &= TrialsBenchmark.Run();
}

return agreed ? 0 : 1;
