using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

/// <summary>
/// A blade section: its polars at one or several Reynolds numbers. Reynolds numbers are positive and rise strictly; a single polar may
/// leave its Reynolds number open (NaN), and then serves at all of them. Equality is by reference.
/// </summary>
public sealed class Section
{
    private Section(string name, ImmutableArray<Polar> polars, SectionTable table)
        => (Name, Polars, Table) = (name, polars, table);

    public string Name { get; }

    public ImmutableArray<Polar> Polars { get; }

    internal SectionTable Table { get; }

    /// <summary>Which of the polars serve at a Reynolds number, above 0.</summary>
    public ReynoldsPlace PlaceOf(double reynolds) => Table.Place(Math.Log(reynolds));

    /// <param name="name">As blade stations name it.</param>
    /// <param name="polars">One or more, Reynolds numbers rising.</param>
    /// <exception cref="ArgumentException">No polar; or several of which one has no Reynolds number; or they do not rise.</exception>
    public static Section FromPolars(string name, IEnumerable<Polar> polars)
    {
        var all = polars.ToImmutableArray();
        if (all.IsEmpty)
            throw new ArgumentException("a section needs a polar", nameof(polars));
        for (var i = 1; i < all.Length; i++)
            if (!(all[i].Reynolds > all[i - 1].Reynolds))
                throw new ArgumentException("Reynolds numbers must rise from polar to polar", nameof(polars));
        return new Section(name, all, SectionTable.Prepare(all));
    }

    /// <summary>
    /// Lift and drag coefficients as a rotor is solved with them: between rows by a shape-preserving cubic, between Reynolds numbers linear
    /// in the logarithm; beyond the tables the end value or the nearest polar.
    /// </summary>
    /// <param name="angle">Angle of attack, rad, within +-pi.</param>
    /// <param name="reynolds">Above 0; NaN only for a section whose polar leaves its own open.</param>
    public Coefficients At(double angle, double reynolds) => Table.At(angle, Table.Place(Math.Log(reynolds)));
}
