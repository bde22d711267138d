using BenchmarkDotNet.Attributes;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Benchmarks;

/// <summary>The kernel alone, for whoever works on it: <c>--detail</c>.</summary>
[MemoryDiagnoser]
public class FirstOrderDetail
{
    private readonly FirstOrder _firstOrder = new(new StageModel(EightCylinderJob.Read(), EightCylinderJob.Measured).Model);

    /// <summary>Every output, sensitivity, covariance and share of eight cylinders.</summary>
    [Benchmark]
    public void Evaluate() => _firstOrder.Evaluate();
}
