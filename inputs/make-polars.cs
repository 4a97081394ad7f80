// Makes the polar tables of the demo study: dotnet run inputs/make-polars.cs
//
// The sections and all their data are invented. The formula gives plausible orders of magnitude and no more; no table here
// stands for a section that exists. Running it again gives the same bytes.
//
// a    angle of attack; all angles in radians inside, in degrees in tables
// x    a - a0, angle from zero lift
// Re   Reynolds number
//
// attached   lift  slope sin x
//            drag  cd0 (1 + (cl - 0.5)^2)
//            cd0 = 2 x 0.074 Re^-0.2 x laminar share x (1 + 2 t + 60 t^4) + bluntness
//                  turbulent plate of two sides (Prandtl), reduced for the laminar part of the surface, with the customary
//                  allowance for thickness t; the last term is the wake of a thick trailing edge
//            t counts as 0.5 where it is more
// separated  normal force  cn = sin a / (0.222 + (1/cd90 - 0.222) abs(sin a))
//                          a plate across the flow, cd90 at 90 degrees (the form of Hoerner's relation)
//            lift  cn cos a
//            drag  cn sin a + 2 cd0 cos^2 a
// between    f attached + (1 - f) separated, with f = 1 / (1 + exp((abs(x) - stall) / width))
//            stall = stall at Re 3e6 + gain ln(Re / 3e6); for x < 0 it is 0.7 of that
//            a small width is a sharp stall

using System.Globalization;
using System.Text;

Section[] sections =
[
    //  name         t     a0    slope  stall  width  gain  cd90  bluntness
    new("tarn-root", 0.80, 0.0,  1.2,   12.0,  4.0,   0.30, 0.90, 0.250),
    new("tarn-40",   0.40, -3.2, 5.4,   15.0,  2.6,   0.80, 1.30, 0.004),
    new("tarn-30",   0.30, -3.8, 6.0,   15.5,  1.9,   0.80, 1.30, 0.001),
    new("tarn-24",   0.24, -3.9, 6.2,   16.2,  1.5,   0.75, 1.30, 0.000),
    new("tarn-18",   0.18, -3.6, 6.3,   16.0,  1.0,   0.70, 1.30, 0.000),
];

PolarSet[] sets =
[
    new("clean", "smooth blades of the large rotors", sections, [0.3e6, 3e6, 15e6],
        LaminarShare: 0.62, SlopeFactor: 1.00, StallLossDeg: 0.0, WidthFactor: 1.0),
    new("soiled", "the blades of the large rotors after a summer of insects and dust", sections, [0.3e6, 3e6, 15e6],
        LaminarShare: 1.05, SlopeFactor: 0.96, StallLossDeg: 2.0, WidthFactor: 1.2),
    new("small", "the blades of the 10 m rotor", [sections[0], sections[2], sections[3], sections[4]], [0.075e6, 0.5e6, 1.5e6],
        LaminarShare: 0.75, SlopeFactor: 0.98, StallLossDeg: -3.0, WidthFactor: 2.6),
];

var folder = Path.Combine(FolderOfThisFile(), "tarn-valley", "polars");
foreach (var set in sets)
    foreach (var section in set.Sections)
    {
        Directory.CreateDirectory(Path.Combine(folder, set.Name));
        File.WriteAllText(Path.Combine(folder, set.Name, section.Name + ".csv"), Table(set, section));
    }

static string Table(PolarSet set, Section section)
{
    var text = new StringBuilder();
    text.Append(CultureInfo.InvariantCulture, $"""
        # {section.Name}, set '{set.Name}': {set.Purpose}.
        # Invented data of an invented section. Made by inputs/make-polars.cs; the formula stands at its top.
        # thickness {section.Thickness}, zero lift at {section.ZeroLiftDeg} deg, slope {section.Slope * set.SlopeFactor:0.###} per rad
        reynolds,alpha_deg,cl,cd

        """);
    foreach (var reynolds in set.ReynoldsNumbers)
        foreach (var alphaDeg in AnglesDeg())
        {
            var (cl, cd) = Coefficients(set, section, reynolds, double.DegreesToRadians(alphaDeg));
            // Five decimals, and never a minus before zero.
            text.Append(CultureInfo.InvariantCulture, $"{reynolds:0},{alphaDeg},{Math.Round(cl, 5) + 0.0:0.00000},{Math.Round(cd, 5):0.00000}\n");
        }
    return text.ToString();
}

static (double Cl, double Cd) Coefficients(PolarSet set, Section section, double reynolds, double a)
{
    var t = section.Thickness;
    var cd0 = 2 * 0.074 * Math.Pow(reynolds, -0.2) * set.LaminarShare * (1 + 2 * t + 60 * Math.Pow(Math.Min(t, 0.5), 4))
        + section.Bluntness;
    var x = a - double.DegreesToRadians(section.ZeroLiftDeg);

    var clAttached = section.Slope * set.SlopeFactor * Math.Sin(x);
    var cdAttached = cd0 * (1 + Math.Pow(clAttached - 0.5, 2));

    var cn = Math.Sin(a) / (0.222 + (1 / section.DragAcross - 0.222) * Math.Abs(Math.Sin(a)));
    var clSeparated = cn * Math.Cos(a);
    var cdSeparated = cn * Math.Sin(a) + 2 * cd0 * Math.Pow(Math.Cos(a), 2);

    var stallDeg = section.StallDeg + section.StallGainDeg * Math.Log(reynolds / 3e6) - set.StallLossDeg;
    var stall = double.DegreesToRadians(x < 0 ? 0.7 * stallDeg : stallDeg);
    var width = double.DegreesToRadians(section.StallWidthDeg * set.WidthFactor);
    var f = 1 / (1 + Math.Exp((Math.Abs(x) - stall) / width));

    return (f * clAttached + (1 - f) * clSeparated, f * cdAttached + (1 - f) * cdSeparated);
}

static IEnumerable<int> AnglesDeg()
{
    for (var a = -180; a < -30; a += 10) yield return a;
    for (var a = -30; a < -20; a += 2) yield return a;
    for (var a = -20; a < 30; a += 1) yield return a;
    for (var a = 30; a < 60; a += 5) yield return a;
    for (var a = 60; a <= 180; a += 10) yield return a;
}

static string FolderOfThisFile([System.Runtime.CompilerServices.CallerFilePath] string path = "") => Path.GetDirectoryName(path)!;

record Section(
    string Name, double Thickness, double ZeroLiftDeg, double Slope, double StallDeg, double StallWidthDeg, double StallGainDeg,
    double DragAcross, double Bluntness);

record PolarSet(
    string Name, string Purpose, Section[] Sections, double[] ReynoldsNumbers,
    double LaminarShare, double SlopeFactor, double StallLossDeg, double WidthFactor);
