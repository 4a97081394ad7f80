using System.Globalization;
using BenchmarkDotNet.Running;
using BladeLoads.Benchmarks;

CultureInfo.DefaultThreadCurrentCulture = CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;

// Without `grid` the measurements of BenchmarkDotNet; with it a grid of operating points, to be timed beside another program.
if (args is ["grid", ..])
    return OperatingGrid.Solve(args[1..]);
BenchmarkSwitcher.FromAssembly(typeof(OperatingGrid).Assembly).Run(args.Length == 0 ? ["--filter", "*"] : args);
return 0;
