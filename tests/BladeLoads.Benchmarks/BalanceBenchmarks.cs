using BenchmarkDotNet.Attributes;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Momentum.Lanes;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Benchmarks;

/// <summary>The balances of one rotor at one operating point: element by element, and eight at a time.</summary>
[MemoryDiagnoser]
public class BalanceBenchmarks
{
    private Annulus[] _annuli = [];
    private Balance[] _balances = [];

    [Params(0, 12)]
    public double PitchDeg { get; set; }

    [GlobalSetup]
    public void Prepare()
    {
        var model = new RotorModel(DemoStudy.Case("baseline"));
        model.Solve(new OperatingPoint(9, 8 * 9 / model.SweptRadius, double.DegreesToRadians(PitchDeg)));
        _annuli = model.Annuli.ToArray();
        _balances = new Balance[_annuli.Length];
    }

    [Benchmark(Baseline = true)]
    public void ElementByElement()
    {
        for (var i = 0; i < _annuli.Length; i++)
            _balances[i] = MomentumBalance.Solve(_annuli[i]);
    }

    [Benchmark]
    public void EightAtATime() => BalanceLanes.Solve(_annuli, _balances);
}
