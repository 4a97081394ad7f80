using System.Collections.Immutable;

namespace BladeLoads.Rotor.Energy;

/// <summary>Where a machine stands: its wind, and what comes between the energy of its curve and the energy sold.</summary>
/// <param name="Shape">Weibull shape of the climates of other mean wind speeds that are tabled beside the site's own, 1 or more.</param>
/// <param name="Availability">Share of time in which the machine can run, above 0 to 1.</param>
/// <param name="Losses">By name, each a share of the energy that those before it leave, 0 to 1.</param>
public sealed record Site(WindClimate Climate, double Shape, double Availability, ImmutableArray<(string Name, double Share)> Losses)
{
    /// <summary>What availability and losses leave of a year's energy, 0 to 1: losses follow on one another, so that shares multiply.</summary>
    public double ShareLeft => Losses.Aggregate(Availability, (left, loss) => left * (1 - loss.Share));
}
