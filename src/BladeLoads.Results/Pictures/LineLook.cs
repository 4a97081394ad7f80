using System.Collections.Immutable;

namespace BladeLoads.Results.Pictures;

/// <summary>How a line is drawn.</summary>
/// <param name="Colour">0xRRGGBB</param>
/// <param name="Dashes">Lengths of dash and gap in turn, px; empty for a solid line.</param>
/// <param name="Mark">Which shape marks its rows; null for none.</param>
/// <param name="Width">px</param>
internal sealed record LineLook(uint Colour, ImmutableArray<float> Dashes, int? Mark, float Width)
{
    public const int Marks = 7;

    // Rising Reynolds numbers from dark to light, in hues that readers without red or green tell apart too; in grey print the lightness
    // and the dashes remain. The two worked-out kinds have hues that this scale does not reach (Okabe and Ito's vermilion and a purple).
    private static readonly uint[] Scale = [0x0B1E5B, 0x1F5FA8, 0x1B98B0, 0x3FB37F, 0xA9A81C];
    private const uint Vermilion = 0xD55E00;
    private static readonly uint[] Purples = [0x7A1F68, 0xA2338A, 0xC25FAB, 0xD98CC8];
    private const uint Grey = 0x909090;
    private const double Paleness = 0.62;

    private static readonly ImmutableArray<float>[] Patterns = [[], [9, 2.5f], [7, 2, 1.5f, 2], [4, 2, 1.2f, 2, 1.2f, 2]];
    private static readonly ImmutableArray<float>[] AugmentedPatterns = [[6, 2], [3.5f, 2], [1.5f, 1.8f], [6, 2, 1.5f, 2]];

    /// <summary>A table's own line: one of so many Reynolds numbers.</summary>
    public static LineLook Tabulated(int index, int count)
        => new(Shade(count == 1 ? 0.25 : (double)index / (count - 1)), Patterns[index % Patterns.Length], index % Marks, 1.1f);

    /// <summary>Without marks, which are for rows of tables.</summary>
    public static LineLook Extended { get; } = new(Vermilion, [4, 2.5f], null, 1.2f);

    /// <summary>The n-th different label among the augmented lines.</summary>
    public static LineLook Augmented(int label)
        => new(Purples[label % Purples.Length], AugmentedPatterns[label % AugmentedPatterns.Length], null, 1.3f);

    /// <summary>A broad pale line, on which an unchanged line runs in the middle; in the colour of the line that it was, if that is known.</summary>
    public static LineLook Earlier(LineLook? now) => new(Pale(now?.Colour ?? Grey), [], null, 3.4f);

    private static uint Pale(uint colour) => Mixed(colour, 0xFFFFFF, Paleness);

    private static uint Shade(double place)
    {
        var at = place * (Scale.Length - 1);
        var lower = Math.Min((int)at, Scale.Length - 2);
        return Mixed(Scale[lower], Scale[lower + 1], at - lower);
    }

    private static uint Mixed(uint one, uint other, double share)
    {
        var result = 0u;
        foreach (var shift in (int[])[16, 8, 0])
        {
            var (a, b) = ((one >> shift) & 0xFF, (other >> shift) & 0xFF);
            result |= (uint)Math.Round(a + (share * ((double)b - a))) << shift;
        }
        return result;
    }
}
