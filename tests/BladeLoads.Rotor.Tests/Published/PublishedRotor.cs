using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using MathNet.Numerics.Interpolation;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Rotors as published, and one operating point of a rotor of any kind.</summary>
internal static class PublishedRotor
{
    public const double Degree = Math.PI / 180;
    public const double Rpm = Math.PI / 30;

    /// <summary>What a case file gets that says nothing about the model.</summary>
    public static BalanceModel DefaultModel { get; } =
        new(40, ElementSpacing.Cosine, TipLoss: true, HubLoss: true, HeavyLoading.Glauert1935, BalanceWith.LiftAndDrag);

    public static CurvePoint SolveAt(
        OperatingPoint point, Blade blade, SectionSet sections, int bladeCount, double cone, AirProperties air, BalanceModel model)
        => SolveAt(point, blade, sections, Augmentation.None, bladeCount, cone, air, model);

    public static CurvePoint SolveAt(
        OperatingPoint point, Blade blade, SectionSet sections, Augmentation augmentation, int bladeCount, double cone, AirProperties air,
        BalanceModel model)
    {
        var rotorCase = new RotorCase(blade, sections, augmentation, bladeCount, cone, air, [point.WindSpeed],
            new Control.FixedSpeed(point.RotorSpeed, point.Pitch, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1), model);
        return Assert.Single(CaseSolver.Solve(rotorCase, CancellationToken.None).Points);
    }

    public static Polar ReadPolar(string name)
    {
        var table = PublishedTable.Read(name);
        return Polar.FromRows(double.NaN, [.. table.Column("alpha_deg").Select(angle => angle * Degree)],
            table.Column("cl"), table.Column("cd"));
    }

    public static (Blade Blade, SectionSet Sections) WithNamedSections(string folder)
    {
        var rows = PublishedTable.Read($"{folder}/blade.csv").Rows;
        var stations = rows.Select(row =>
            new BladeStation(row["radius_m"], row["chord_m"], row["twist_deg"] * Degree, row.Text("section"))).ToArray();
        var sections = stations.Select(s => s.Section!).Distinct()
            .Select(name => Section.FromPolars(name, [ReadPolar($"{folder}/polars/{name}.csv")]));
        return (Blade.FromStations(stations), SectionSet.Of(sections));
    }

    /// <summary>A blade whose rows lie between two published sections: each row gets a section of its own, blended by its share.</summary>
    public static (Blade Blade, SectionSet Sections) WithBlendedSections(string folder, string angleColumn)
        => WithBlendedSections(folder, angleColumn, name => ReadPolar($"{folder}/polars/{name}.csv"));

    /// <param name="polarOf">The polar of a section that the rows name, before it is blended.</param>
    public static (Blade Blade, SectionSet Sections) WithBlendedSections(string folder, string angleColumn, Func<string, Polar> polarOf)
    {
        var stations = new List<BladeStation>();
        var sections = new Dictionary<string, Section>(StringComparer.Ordinal);
        foreach (var row in PublishedTable.Read($"{folder}/blade.csv").Rows)
        {
            var (inner, outer, share) = (row.Text("inner_section"), row.Text("outer_section"), row["outer_share"]);
            var name = share == 0 ? inner : $"{inner} {row.Text("outer_share")} {outer}";
            if (!sections.ContainsKey(name))
            {
                var polar = polarOf(inner);
                if (share != 0)
                    polar = Blend(polar, polarOf(outer), share);
                sections.Add(name, Section.FromPolars(name, [polar]));
            }
            stations.Add(new BladeStation(row["radius_m"], row["chord_m"], row[angleColumn] * Degree, name));
        }
        return (Blade.FromStations(stations), SectionSet.Of(sections.Values));
    }

    /// <summary>A blade whose rows give their thickness alone, and its published sections as a family.</summary>
    public static (Blade Blade, SectionSet Sections) ByThickness(string folder, params (string Section, double ThicknessRatio)[] family)
    {
        var stations = PublishedTable.Read($"{folder}/blade.csv").Rows.Select(row => BladeStation.OfThickness(
            row["radius_m"], row["chord_m"], row["twist_deg"] * Degree, row["thickness_ratio"]));
        var members = family.OrderBy(m => m.ThicknessRatio).Select(m => new FamilyMember(
            m.ThicknessRatio, Section.FromPolars(m.Section, [ReadPolar($"{folder}/polars/{m.Section}.csv")])));
        return (Blade.FromStations(stations), SectionSet.Of(SectionFamily.Of(members)));
    }

    /// <summary>On the angles of both tables, where both have values.</summary>
    private static Polar Blend(Polar inner, Polar outer, double share)
    {
        var (first, last) = (Math.Max(inner.Angles[0], outer.Angles[0]), Math.Min(inner.Angles[^1], outer.Angles[^1]));
        // Angles a hair apart are one angle printed twice; both would make a needle of a secant.
        var angles = new List<double>();
        foreach (var angle in inner.Angles.Concat(outer.Angles).Where(angle => angle >= first && angle <= last).Order())
            if (angles.Count == 0 || angle - angles[^1] > 1e-3 * Degree)
                angles.Add(angle);
        double[] Mix(Polar a, Polar b, Func<Polar, IEnumerable<double>> coefficient)
        {
            var (fromA, fromB) = (CubicSpline.InterpolatePchip(a.Angles, coefficient(a)), CubicSpline.InterpolatePchip(b.Angles, coefficient(b)));
            return [.. angles.Select(angle => (1 - share) * fromA.Interpolate(angle) + share * fromB.Interpolate(angle))];
        }
        return Polar.FromRows(double.NaN, [.. angles], Mix(inner, outer, polar => polar.Lift),
            // A drag of 0 at the end of both tables may round to just below it.
            [.. Mix(inner, outer, polar => polar.Drag).Select(drag => Math.Max(0, drag))]);
    }
}
