using System.CommandLine;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Cases;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Commands.Polar;

/// <summary><c>bladeloads polar augment</c>: tables as they serve at one place of a turning rotor.</summary>
internal static class PolarAugmentCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var set = new NewSetOptions("augment");
        var method = WordOption.Define("--method", "by whose relation (docs/theory.md, 1.6)", SectionMethod.Augmentations);
        method.Required = true;
        var chordRatio = NumberOption.Define("--chord-ratio", "chord over radius, c/r, where the table is to serve", "ratio", 0.001, 10, "0.25");
        var radiusRatio = NumberOption.Define("--radius-ratio", "radius over tip radius, r/R, there", "ratio", 0.001, 1, "0.3");
        var blade = new Option<string>("--blade") { Description = "a blade table that gives both ratios at --radius", HelpName = "blade.csv" };
        var radius = NumberOption.Define("--radius", "where on that blade, m", "radius", 0.001, 1000, "12.5");
        var tipSpeedRatio = NumberOption.Define("--tip-speed-ratio", "at which the rotor turns there; du-selig-1998 needs it", "ratio", 0.01, 100, "7.5");
        var command = new Command(
            "augment",
            "Augments polar tables for rotation, as they serve at one place of a rotor and one tip-speed ratio. A case does it element by "
            + "element, by its own key: [sections] augment.")
        {
            set.Source, set.Folder, method, chordRatio, radiusRatio, blade, radius, tipSpeedRatio, set.Only, set.Replace,
        };
        command.SetAction(parsed =>
        {
            var augmentation = parsed.GetRequiredValue(method)!.Value;
            var turning = TipSpeedRatio(augmentation, parsed.GetValue(tipSpeedRatio));
            var place = (parsed.GetValue(chordRatio), parsed.GetValue(radiusRatio), parsed.GetValue(blade), parsed.GetValue(radius)) switch
            {
                ({ } chord, { } share, null, null) => (chord, share),
                (null, null, { } path, { } at) => OnBlade(path, at, surroundings),
                _ => throw new WrongUseException("say where the table is to serve: either --chord-ratio and --radius-ratio, or --blade and --radius"),
            };
            if (place is not var (c, r))
                return ExitCode.NothingCouldRun;
            var asked = new AugmentationAsked(augmentation, c, r, turning);
            CheckFactors(asked);
            return set.Of(parsed).Make((table, file) => AugmentedTable.Of(table, file, asked), surroundings);
        });
        return command;
    }

    private static double TipSpeedRatio(Augmentation method, double? given) => (method, given) switch
    {
        (Augmentation.DuSelig1998, null)
            => throw new WrongUseException("du-selig-1998 depends on how fast the rotor turns; give --tip-speed-ratio"),
        (Augmentation.Snel1993, not null)
            => throw new WrongUseException("snel-1993 does not depend on how fast the rotor turns; leave --tip-speed-ratio out"),
        _ => given ?? double.NaN,
    };

    // Null, and told, where the blade cannot be read.
    private static (double ChordRatio, double RadiusRatio)? OnBlade(string path, double radius, Surroundings surroundings)
    {
        if (GivenBlade.Read(path, surroundings) is not { } blade)
            return null;
        if (radius < blade.HubRadius || radius > blade.TipRadius)
            throw new WrongUseException(string.Create(CultureInfo.InvariantCulture,
                $"--radius is {radius}, and the blade of {path} reaches from {blade.HubRadius} to {blade.TipRadius} m"));
        return (blade.ChordAt(radius) / radius, radius / blade.TipRadius);
    }

    private static void CheckFactors(AugmentationAsked asked)
    {
        if (asked.RadiusRatio > RotationalAugmentation.LargestRadiusRatio)
            throw new WrongUseException(string.Create(CultureInfo.InvariantCulture,
                $"the radius is {Brief(asked.RadiusRatio)} of the tip radius; nothing is augmented beyond {RotationalAugmentation.LargestRadiusRatio}"));
        if (asked.Factors.IsNone)
            throw new WrongUseException($"with c/r {Brief(asked.ChordRatio)} and r/R {Brief(asked.RadiusRatio)} nothing would be augmented");
    }
}
