using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

internal sealed class SectionTable
{
    public static SectionTable Prepare(ImmutableArray<Polar> polars) => new();
}
