using System.CommandLine;

namespace BladeLoads.Commands.Polar;

/// <summary><c>bladeloads polar</c>: what is done to section tables before a case uses them; a subcommand each in a file of its own.</summary>
internal static class PolarCommand
{
    public static Command Define(Surroundings surroundings) => new(
        "polar",
        "Checks, makes, changes and draws polar tables: lift and drag of blade sections. What is read stays as it is; what is written says in its "
        + "head how it was made.")
    {
        PolarReadCommand.Define(surroundings), PolarCheckCommand.Define(surroundings), PolarExtendCommand.Define(surroundings),
        PolarAugmentCommand.Define(surroundings), PolarScaleCommand.Define(surroundings), PolarDrawCommand.Define(surroundings),
    };
}
