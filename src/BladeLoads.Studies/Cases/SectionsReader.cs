using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads [sections]: what is done to the tables of a case before they serve.</summary>
internal static class SectionsReader
{
    private const string Extend = "sections.extend", AspectRatio = "sections.aspect_ratio", Join = "sections.join";
    private const string Augment = "sections.augment";

    /// <summary>Null where polars are not extended, or an error keeps it from being known.</summary>
    /// <param name="blade">Null where it is not known.</param>
    public static SectionExtension? ReadExtension(CaseValues values, Blade? blade)
    {
        // Noted only where they are asked for: what a case does not ask for does not tell it from those made before there was such a key.
        var method = values.Has(Extend) ? values.CheckedChoice(Extend, SectionMethod.Viterna, SectionMethod.None) : CaseDefaults.Extend;
        var aspectRatio = values.Has(AspectRatio) ? values.Check(AspectRatio, Bounds.AboveZero) : blade?.AspectRatio ?? double.NaN;
        var join = values.Has(Join) ? values.CheckedChoice(Join, "stall", "end") : CaseDefaults.Join;
        if (!values.Has(Extend))
            foreach (var path in new[] { AspectRatio, Join })
                if (values.Find(path) is { } entry && !values.IsStartingValue(entry))
                    values.Doubt(path, $"is {entry.Value.Found}, but nothing is extended; give extend = \"{SectionMethod.Viterna}\", or leave it out");
        if (method is not SectionMethod.Viterna)
            return null;
        values.Note(Extend, method);
        values.Note(AspectRatio, CanonicalText.Of(aspectRatio));
        values.Note(Join, join ?? "");
        return aspectRatio > 0 && join is not null
            ? new SectionExtension(aspectRatio, join == "stall" ? ExtensionJoin.Stall : ExtensionJoin.End)
            : null;
    }

    public static Augmentation ReadAugmentation(CaseValues values)
    {
        var method = values.Has(Augment) ? values.CheckedChoice(Augment, SectionMethod.Snel, SectionMethod.DuSelig, SectionMethod.None) : CaseDefaults.Augment;
        if (method is null || !SectionMethod.Augmentations.TryGetValue(method, out var augmentation))
            return Augmentation.None;
        values.Note(Augment, method);
        return augmentation;
    }

    /// <summary>Refuses tables that cannot take what the case asks for, and doubts those that take it badly.</summary>
    public static void CheckTables(CaseValues values, BladeSections sections, Augmentation augmentation, Findings findings)
    {
        foreach (var at in sections.NotExtended)
            values.RefuseValue(Extend, $"is '{SectionMethod.Viterna}', but the rows from {at.File}:{CanonicalText.Of(at.Line)} on have no angle between 0 and 90 deg "
                + "to extend from; add rows up to stall, or leave extend out");
        if (augmentation == Augmentation.None)
            return;
        foreach (var table in sections.Tables)
        {
            foreach (var doubt in table.NotAugmented)
                findings.Doubt(doubt);
            if (table.Augmented is { } note)
                values.RefuseValue(Augment, $"is {values.Find(Augment)!.Value.Found}, but {table.Input.File}:{CanonicalText.Of(note.Line)} says that "
                    + $"its table is augmented already: {VisibleText.Quote(note.Text)}; leave augment out, or give the table as it was before");
        }
    }
}
