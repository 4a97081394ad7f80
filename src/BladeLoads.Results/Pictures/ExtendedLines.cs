using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Results.Pictures;

/// <summary>What an extension added to tables, as lines of a picture.</summary>
public static class ExtendedLines
{
    public const string Label = "extended, Viterna and Corrigan 1982";

    /// <param name="tabulated">As in the file.</param>
    /// <param name="prepared">As rotors are solved with it, a polar for each of <paramref name="tabulated"/>.</param>
    public static ImmutableArray<PolarLine> Of(Section tabulated, Section prepared)
        => [.. tabulated.Polars.Zip(prepared.Polars)
            .Select(pair => (Polar: pair.Second, Added: AddedTo(pair.First, pair.Second)))
            .Where(line => !line.Added.IsEmpty)
            .Select(line => new PolarLine(line.Polar, LineKind.Extended, Label) { Parts = line.Added })];

    /// <summary>The angles beyond the rows that both have, rad.</summary>
    internal static ImmutableArray<(double From, double To)> AddedTo(Polar polar, Polar extended)
    {
        var kept = new HashSet<(double, double, double)>(polar.Angles.Select((angle, i) => (angle, polar.Lift[i], polar.Drag[i])));
        var shared = extended.Angles.Where((angle, i) => kept.Contains((angle, extended.Lift[i], extended.Drag[i]))).ToList();
        if (shared.Count == 0)
            return [(extended.Angles[0], extended.Angles[^1])];
        return [.. new[] { (From: extended.Angles[0], To: shared[0]), (From: shared[^1], To: extended.Angles[^1]) }.Where(part => part.To > part.From)];
    }
}
