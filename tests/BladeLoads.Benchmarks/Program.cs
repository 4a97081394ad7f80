using System.Globalization;
using BenchmarkDotNet.Running;
using BladeLoads.Benchmarks;

CultureInfo.DefaultThreadCurrentCulture = CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;

// Without a word of its own the measurements of BenchmarkDotNet; `grid` is to be timed beside another program, and `publishing` takes a
// disk, which BenchmarkDotNet would measure as memory.
if (args is ["grid", ..])
    return OperatingGrid.Solve(args[1..]);
if (args is ["publishing", ..])
    return PublishingCases.Measure(args[1..]);
BenchmarkSwitcher.FromAssembly(typeof(OperatingGrid).Assembly).Run(args.Length == 0 ? ["--filter", "*"] : args);
return 0;
