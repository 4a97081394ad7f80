// Makes the blade tables of the demo study: dotnet run inputs/make-blades.cs
//
// The blades are invented. Their planform follows the optimum rotor with wake rotation (Glauert 1935), made buildable:
//
// inflow angle  phi = 2/3 atan(1 / x),  x = tip-speed ratio times r/R
// chord         8 pi r (1 - cos phi) / (B cl)  at half and at nine tenths of the radius, and a straight line through both;
//               from the shoulder inwards it goes linearly to the round root; the last 4 % is drawn in to a third at the tip
// twist         phi - design angle of attack, held from the shoulder inwards, at most the greatest twist
//
// cl and the design angle of attack are those of the section, between two sections a mean by radius. Running it again gives
// the same bytes.

using System.Globalization;
using System.Text;

var sections = new Dictionary<string, (double AngleDeg, double Lift)>
{
    ["tarn-root"] = (0.0, 0.70),
    ["tarn-40"] = (4.5, 0.70),
    ["tarn-30"] = (5.0, 0.90),
    ["tarn-24"] = (5.5, 1.00),
    ["tarn-18"] = (6.0, 1.05),
};

(double Fraction, string Section)[] large =
    [(0.08, "tarn-root"), (0.22, "tarn-40"), (0.35, "tarn-30"), (0.55, "tarn-24"), (0.75, "tarn-18")];
(double Fraction, string Section)[] small =
    [(0.12, "tarn-root"), (0.25, "tarn-30"), (0.45, "tarn-24"), (0.70, "tarn-18")];

Design[] designs =
[
    new("tarn-44", "2 MW class, three blades", 3, Radius: 44, HubRadius: 1.2, TipSpeedRatio: 8.0, RootDiameter: 1.9, GreatestTwistDeg: 13, large),
    new("tarn-38-two", "1.5 MW class, two blades", 2, Radius: 38, HubRadius: 1.1, TipSpeedRatio: 9.5, RootDiameter: 1.8, GreatestTwistDeg: 12, large),
    new("tarn-75", "6.5 MW class, three blades", 3, Radius: 75, HubRadius: 2.0, TipSpeedRatio: 9.0, RootDiameter: 3.4, GreatestTwistDeg: 12, large),
    new("tarn-5", "10 m rotor, stall-regulated, three blades", 3, Radius: 5, HubRadius: 0.4, TipSpeedRatio: 5.4, RootDiameter: 0.22, GreatestTwistDeg: 14, small),
];

var folder = Path.Combine(FolderOfThisFile(), "tarn-valley", "blades");
Directory.CreateDirectory(folder);
foreach (var design in designs)
    File.WriteAllText(Path.Combine(folder, design.Name + ".csv"), Table(design));

string Table(Design design)
{
    var text = new StringBuilder();
    text.Append(CultureInfo.InvariantCulture, $"""
        # {design.Name}: {design.Purpose}; design tip-speed ratio {design.TipSpeedRatio}.
        # An invented blade. Made by inputs/make-blades.cs; the formula stands at its top.
        radius_m,chord_m,twist_deg,section

        """);
    foreach (var fraction in Fractions(design))
    {
        // Between two sections the reader blends coefficients, so a row carries the section it has reached.
        var section = design.Sections.LastOrDefault(s => s.Fraction <= fraction + 1e-9, design.Sections[0]).Section;
        text.Append(CultureInfo.InvariantCulture,
            $"{fraction * design.Radius:0.000},{Chord(design, fraction):0.0000},{TwistDeg(design, fraction):0.000},{section}\n");
    }
    return text.ToString();
}

static double[] Fractions(Design design)
    => [design.HubRadius / design.Radius, .. design.Sections.Select(s => s.Fraction)
        .Concat([0.15, 0.28, 0.35, 0.45, 0.55, 0.65, 0.75, 0.85, 0.92, 0.96, 0.985, 1.0]).Distinct().Order()];

double Chord(Design design, double fraction)
{
    var shoulder = design.Sections[1].Fraction;
    var inner = OptimumChord(design, 0.5);
    var line = (double f) => inner + (OptimumChord(design, 0.9) - inner) * (f - 0.5) / 0.4;
    var round = design.Sections[0].Fraction;
    if (fraction <= round)
        return design.RootDiameter;
    if (fraction < shoulder)
        return design.RootDiameter + (line(shoulder) - design.RootDiameter) * (fraction - round) / (shoulder - round);
    return line(fraction) * (fraction <= 0.96 ? 1 : 1 - 2.0 / 3 * Math.Pow((fraction - 0.96) / 0.04, 2));
}

double OptimumChord(Design design, double fraction)
    => 8 * Math.PI * fraction * design.Radius * (1 - Math.Cos(InflowAngle(design, fraction)))
        / (design.BladeCount * AtDesign(design, fraction).Lift);

double TwistDeg(Design design, double fraction)
{
    var f = Math.Max(fraction, design.Sections[1].Fraction);
    return Math.Min(design.GreatestTwistDeg, double.RadiansToDegrees(InflowAngle(design, f)) - AtDesign(design, f).AngleDeg);
}

static double InflowAngle(Design design, double fraction) => 2.0 / 3 * Math.Atan(1 / (design.TipSpeedRatio * fraction));

(double AngleDeg, double Lift) AtDesign(Design design, double fraction)
{
    var next = Array.FindIndex(design.Sections, s => s.Fraction > fraction);
    if (next <= 0)
        return sections[design.Sections[next < 0 ? ^1 : 0].Section];
    var (from, to) = (design.Sections[next - 1], design.Sections[next]);
    var w = (fraction - from.Fraction) / (to.Fraction - from.Fraction);
    var (a, b) = (sections[from.Section], sections[to.Section]);
    return (a.AngleDeg + w * (b.AngleDeg - a.AngleDeg), a.Lift + w * (b.Lift - a.Lift));
}

static string FolderOfThisFile([System.Runtime.CompilerServices.CallerFilePath] string path = "") => Path.GetDirectoryName(path)!;

record Design(
    string Name, string Purpose, int BladeCount, double Radius, double HubRadius, double TipSpeedRatio, double RootDiameter,
    double GreatestTwistDeg, (double Fraction, string Section)[] Sections);
