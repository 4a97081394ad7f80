using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary>
/// Eight annuli side by side: the quantities of <see cref="Annulus"/> that a residual needs, one lane an annulus. Coefficients are looked
/// up annulus by annulus, because every one has its own table.
/// </summary>
internal readonly ref struct AnnulusLanes
{
    public const int Count = 8;

    private readonly ReadOnlySpan<Annulus> _annuli;

    /// <param name="annuli">Eight, all with one heavy-loading relation and one way of balancing.</param>
    public AnnulusLanes(ReadOnlySpan<Annulus> annuli)
    {
        _annuli = annuli;
        HeavyLoading = annuli[0].HeavyLoading;
        DragInBalance = Vector512.Create(annuli[0].DragInBalance);
        Span<double> lanes = stackalloc double[4 * Count];
        for (var i = 0; i < Count; i++)
        {
            ref readonly var annulus = ref annuli[i];
            lanes[i] = annulus.Solidity / 4;
            lanes[Count + i] = annulus.SpeedRatio;
            lanes[(2 * Count) + i] = annulus.TipExponent;
            lanes[(3 * Count) + i] = annulus.HubExponent;
        }
        QuarterSolidity = Vector512.Create<double>(lanes);
        SpeedRatio = Vector512.Create<double>(lanes[Count..]);
        TipExponent = Vector512.Create<double>(lanes[(2 * Count)..]);
        HubExponent = Vector512.Create<double>(lanes[(3 * Count)..]);
    }

    public HeavyLoading HeavyLoading { get; }

    public Vector512<double> QuarterSolidity { get; }

    public Vector512<double> SpeedRatio { get; }

    public Vector512<double> TipExponent { get; }

    public Vector512<double> HubExponent { get; }

    public Vector512<double> DragInBalance { get; }

    public ref readonly Annulus this[int lane] => ref _annuli[lane];

    /// <summary>Lift and drag coefficients, one lane an annulus.</summary>
    public (Vector512<double> Lift, Vector512<double> Drag) CoefficientsAt(Vector512<double> inflowAngle)
    {
        Span<double> angle = stackalloc double[Count];
        Span<double> lift = stackalloc double[Count];
        Span<double> drag = stackalloc double[Count];
        inflowAngle.CopyTo(angle);
        for (var i = 0; i < Count; i++)
        {
            ref readonly var annulus = ref _annuli[i];
            (lift[i], drag[i]) = annulus.CoefficientsAt(annulus.AngleOfAttack(angle[i]));
        }
        return (Vector512.Create<double>(lift), Vector512.Create<double>(drag));
    }
}
