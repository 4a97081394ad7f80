using BenchmarkDotNet.Attributes;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Benchmarks;

/// <summary>Whole cases of the demo study, without reading and writing.</summary>
[MemoryDiagnoser]
public class CaseBenchmarks
{
    private RotorCase _case = null!;

    [Params("baseline", "large", "stall-10m-slow")]
    public string Name { get; set; } = "";

    [GlobalSetup]
    public void Prepare() => _case = DemoStudy.Case(Name);

    [Benchmark]
    public PowerCurve SolveCase() => CaseSolver.Solve(_case, CancellationToken.None);
}
