using System.Collections.Immutable;
using MathNet.Numerics;

namespace BladeLoads.Rotor.Energy;

/// <summary>How often the wind blows how fast at a site, at hub height. A closed set: Weibull, histogram.</summary>
public abstract record WindClimate
{
    private WindClimate() { }

    /// <summary>Share of time with a wind speed up to this, 0 to 1.</summary>
    /// <param name="windSpeed">m/s.</param>
    public abstract double Cumulative(double windSpeed);

    /// <summary>m/s.</summary>
    public abstract double Mean { get; }

    /// <summary><c>F = 1 - exp(-(V/A)^k)</c>, with the scale A that gives the mean; k = 2 is Rayleigh's distribution.</summary>
    /// <param name="MeanWindSpeed">m/s, above 0.</param>
    /// <param name="Shape">k, 1 or more.</param>
    /// <remarks>Source: key iec61400-12-1 in docs/sources.md for k = 2; other shapes are our extension of it.</remarks>
    public sealed record Weibull(double MeanWindSpeed, double Shape) : WindClimate
    {
        public override double Mean => MeanWindSpeed;

        public override double Cumulative(double windSpeed)
        {
            if (windSpeed <= 0)
                return 0;
            var scale = MeanWindSpeed / SpecialFunctions.Gamma(1 + (1 / Shape));
            return 1 - Math.Exp(-Math.Pow(windSpeed / scale, Shape));
        }
    }

    /// <summary>A measured histogram; within a bin every wind speed is as frequent as any other.</summary>
    /// <param name="Edges">m/s, rising, one more than there are shares.</param>
    /// <param name="Shares">Shares of time, 0 or above, 1 in sum.</param>
    public sealed record Histogram(ImmutableArray<double> Edges, ImmutableArray<double> Shares) : WindClimate
    {
        public override double Mean => Shares.Select((share, i) => share * (Edges[i] + Edges[i + 1]) / 2).Sum();

        public override double Cumulative(double windSpeed)
        {
            var sum = 0.0;
            for (var i = 0; i < Shares.Length; i++)
            {
                if (windSpeed <= Edges[i])
                    return sum;
                if (windSpeed < Edges[i + 1])
                    return sum + (Shares[i] * (windSpeed - Edges[i]) / (Edges[i + 1] - Edges[i]));
                sum += Shares[i];
            }
            return 1;
        }
    }
}
