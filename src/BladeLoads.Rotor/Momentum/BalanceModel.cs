namespace BladeLoads.Rotor.Momentum;

/// <summary>How a rotor is divided and what counts in the momentum balance of an annulus.</summary>
/// <param name="Elements">Number of blade elements, 1 or more.</param>
public sealed record BalanceModel(
    int Elements, ElementSpacing Spacing, bool TipLoss, bool HubLoss, HeavyLoading HeavyLoading, BalanceWith BalanceWith);

/// <summary>Where the edges of the blade elements lie: closer together at root and tip, or all of one length.</summary>
public enum ElementSpacing { Cosine, Uniform }

/// <summary>The relation between thrust and axial induction where simple momentum theory no longer holds.</summary>
public enum HeavyLoading { Glauert1935, Buhl2005 }

/// <summary>The section forces that count in the axial balance.</summary>
public enum BalanceWith { LiftAndDrag, Lift }
