using System.Collections.Immutable;

namespace BladeLoads.Rotor.Energy;

/// <summary>A year of a power curve: at its site, and in climates of other mean wind speeds.</summary>
/// <param name="MissingBins">m/s: bins whose power is not known; no energy stands for such a curve.</param>
/// <param name="Rows">The site first, then mean wind speeds of 4 to 11 m/s.</param>
public sealed record EnergyYield(ImmutableArray<double> MissingBins, ImmutableArray<EnergyRow> Rows)
{
    private const int LowestMean = 4, HighestMean = 11; // iec61400-12-1, m/s

    /// <param name="steady">Null where a curve has no wind speed of operation: its energy is 0.</param>
    /// <param name="turbulence">Null to leave the energy with turbulence out.</param>
    /// <param name="ratedPower">Electrical, W; null where the machine has none, and then no capacity factor.</param>
    public static EnergyYield Of(SteadyPower? steady, Site site, TurbulenceIntensity? turbulence, double? ratedPower)
    {
        var (speeds, powers) = steady?.Bins() ?? ([], []);
        double[]? means = steady is null || turbulence is null ? null
            : [.. speeds.Select(v => TurbulentPower.Mean(steady, v, turbulence.At(v)))];
        ImmutableArray<double> missing = [.. speeds.Where((_, i) => double.IsNaN(powers[i]))];
        EnergyRow Row(WindClimate climate) => new(
            climate, YearOf(speeds, powers, climate, site, ratedPower),
            means is null ? null : YearOf(speeds, means, climate, site, ratedPower));
        var others = Enumerable.Range(LowestMean, HighestMean - LowestMean + 1).Select(mean => new WindClimate.Weibull(mean, site.Shape));
        return new EnergyYield(missing, [Row(site.Climate), .. others.Select(Row)]);
    }

    private static YearOfEnergy? YearOf(double[] speeds, double[] powers, WindClimate climate, Site site, double? ratedPower)
    {
        if (powers.Any(double.IsNaN))
            return null;
        var gross = speeds.Length == 0 ? 0 : AnnualEnergy.OfBins(speeds, powers, climate);
        var net = gross * site.ShareLeft;
        return new YearOfEnergy(gross, net, ratedPower is { } rated ? net / (rated * AnnualEnergy.SecondsOfAYear) : null);
    }
}

/// <summary>A year in one climate.</summary>
/// <param name="Steady">Of the steady curve; null where a bin is missing.</param>
/// <param name="Turbulent">Of the mean curve in turbulence; null without turbulence, and where a bin is missing.</param>
public sealed record EnergyRow(WindClimate Climate, YearOfEnergy? Steady, YearOfEnergy? Turbulent);

/// <summary>Energies of a year.</summary>
/// <param name="Gross">J.</param>
/// <param name="Net">J, after availability and losses.</param>
/// <param name="CapacityFactor">Net energy over that of rated power all the year; null without a rated power.</param>
public sealed record YearOfEnergy(double Gross, double Net, double? CapacityFactor)
{
    /// <summary>s: how long rated power takes to make the net energy; null without a rated power.</summary>
    public double? FullLoadTime => CapacityFactor * AnnualEnergy.SecondsOfAYear;
}
