using System.Text.Json.Serialization;
using BladeLoads.Rotor.Energy;

namespace BladeLoads.Results.Receipts;

/// <summary>The year of a case at its site; SI units. A figure is null where a bin of the curve is missing.</summary>
/// <param name="AnnualEnergy">J, after availability and losses, from the steady curve.</param>
/// <param name="CapacityFactor">Null without a rated power, too.</param>
/// <param name="TurbulentAnnualEnergy">The same in turbulence; null without turbulence, too.</param>
public sealed record EnergySummary(
    [property: JsonPropertyName("annual_energy_J")] double? AnnualEnergy,
    double? CapacityFactor,
    [property: JsonPropertyName("turbulent_annual_energy_J")] double? TurbulentAnnualEnergy,
    double? TurbulentCapacityFactor)
{
    public static EnergySummary Of(EnergyYield energy)
    {
        var site = energy.Rows[0];
        return new EnergySummary(site.Steady?.Net, site.Steady?.CapacityFactor, site.Turbulent?.Net, site.Turbulent?.CapacityFactor);
    }
}

/// <summary>The tip-speed ratio and fine pitch of a variable-speed machine, and whether either was searched for.</summary>
/// <param name="FinePitch">rad.</param>
/// <param name="PowerCoefficient">There, at the wind speed of the search; null where an element is unbalanced.</param>
public sealed record BestPoint(
    double TipSpeedRatio, [property: JsonPropertyName("fine_pitch_rad")] double FinePitch, double? PowerCoefficient, bool Searched);
