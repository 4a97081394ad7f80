using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Momentum;

/// <summary>Annuli over all that a rotor may meet: parked to racing, feathered to stalled, with and without losses and augmentation.</summary>
internal static class RandomAnnuli
{
    public static Annulus One(Random random, SectionTable inner, SectionTable outer)
    {
        var radius = 0.1 + (0.89 * random.NextDouble());
        var tipSpeedRatio = 0.3 * Math.Exp(random.NextDouble() * Math.Log(80));
        var weight = random.Next(2) * random.NextDouble();
        return new Annulus
        {
            Solidity = 0.01 + (0.6 * random.NextDouble() * random.NextDouble()),
            SpeedRatio = 1 / (tipSpeedRatio * radius),
            SectionAngle = double.DegreesToRadians(-15 + (random.NextDouble() * (random.Next(3) == 0 ? 105 : 30))),
            TipExponent = random.Next(4) == 0 ? double.NegativeInfinity : LossFactor.TipExponent(3, radius, 1),
            HubExponent = random.Next(4) == 0 ? double.NegativeInfinity : LossFactor.HubExponent(3, radius, 0.08),
            Inner = inner,
            Outer = outer,
            OuterWeight = weight,
            InnerPlace = inner.Place(Math.Log(1e6)),
            OuterPlace = outer.Place(Math.Log(1e6)),
            Augmentation = random.Next(2) == 0 ? AugmentationFactors.None : new AugmentationFactors(random.NextDouble(), random.Next(2) * random.NextDouble()),
            HeavyLoading = random.Next(2) == 0 ? HeavyLoading.Glauert1935 : HeavyLoading.Buhl2005,
            DragInBalance = random.Next(2),
        };
    }
}
