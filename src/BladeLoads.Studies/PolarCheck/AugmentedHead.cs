namespace BladeLoads.Studies.PolarCheck;

/// <summary>A table whose head says that it is augmented for rotation already: a second time would count the effect twice.</summary>
internal static class AugmentedHead
{
    private const string Word = "augmented";

    public static IEnumerable<PolarDoubt> Doubts(CellPlaces places)
    {
        foreach (var (line, text) in places.Head)
            if (text.TrimStart('#', ' ', '\t').StartsWith(Word, StringComparison.OrdinalIgnoreCase))
            {
                yield return new PolarDoubt(
                    "augmented", places.Finding(line, "", "the table is augmented for rotation, its head says; it holds for one rotor and one radius, "
                        + "and is not to be augmented again"),
                    -1, double.NaN, double.NaN, []);
                yield break;
            }
    }
}
