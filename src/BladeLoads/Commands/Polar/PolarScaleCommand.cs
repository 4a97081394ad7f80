using System.CommandLine;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Commands.Polar;

/// <summary><c>bladeloads polar scale</c>: soiled or aged sections from clean ones, by stated factors, as a set of their own.</summary>
internal static class PolarScaleCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var set = new NewSetOptions("scale");
        var slope = FactorOption("--lift-slope", "on the slope of lift about no lift", 1.5);
        var largest = FactorOption("--largest-lift", "on the largest lift", 1.5);
        var least = FactorOption("--least-lift", "on the least (most negative) lift; left out, that of --largest-lift", 1.5);
        var drag = FactorOption("--drag-floor", "on the least drag", 10);
        var command = new Command(
            "scale",
            "Makes a set of soiled or aged sections from a clean one, by factors where the flow is attached; deep in stall everything is as it was.")
        {
            set.Source, set.Folder, slope, largest, least, drag, set.Only, set.Replace,
        };
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(slope) is null && parsed.GetValue(largest) is null && parsed.GetValue(least) is null && parsed.GetValue(drag) is null)
                throw new WrongUseException("nothing to scale by; give one or more of --lift-slope, --largest-lift, --least-lift, --drag-floor");
            var factors = new PolarFactors(
                parsed.GetValue(slope) ?? 1, parsed.GetValue(largest) ?? 1, parsed.GetValue(least) ?? parsed.GetValue(largest) ?? 1,
                parsed.GetValue(drag) ?? 1);
            if (Math.Min(factors.LargestLift, factors.LeastLift) < factors.LiftSlope / 2)
                throw new WrongUseException("the factors on largest and least lift must be at least half of that on the lift slope");
            var leastLiftIsAsked = parsed.GetValue(least) is not null;
            return set.Of(parsed).Make((table, file) => ScaledTable.Of(table, file, factors, leastLiftIsAsked), surroundings);
        });
        return command;
    }

    private static Option<double?> FactorOption(string name, string description, double most)
        => NumberOption.Define(name, description, "factor", 0.5, most, "0.95");
}
