using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Blades;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>A blade table as read.</summary>
/// <param name="Blade">Null when an error keeps the table from being used.</param>
/// <param name="Sections">Every section named, with the place of its first row; those of a table with errors too.</param>
/// <param name="Thicknesses">Of the rows that give one, in their order, beside a section or in its place.</param>
/// <param name="Canonical">The parsed values.</param>
internal sealed record BladeTable(
    Blade? Blade, ImmutableArray<(string Name, Place At)> Sections, ImmutableArray<RowThickness> Thicknesses, CanonicalTable Canonical,
    InputFile Input)
{
    private static readonly ImmutableArray<Column> Columns =
    [
        new("radius_m", true), new("chord_m", true), new("twist_deg", true), new("section", false),
        new("thickness_ratio", false), new("mass_kg_per_m", false),
    ];

    public static BladeTable Parse(InputText input, Findings findings)
    {
        using var rows = new CsvRows(input, findings);
        var stations = new List<BladeStation>();
        var lines = new List<string>();
        var sections = new List<(string Name, Place At)>();
        var thicknesses = new List<RowThickness>();
        var known = new HashSet<string>(StringComparer.Ordinal);
        var cells = new List<(Place Chord, Place Twist)>();
        if (!rows.ReadHeader(Columns))
        {
            // The names alone are still good for finding what is wrong in the polar tables.
            while (rows.Has("section") && rows.Read())
                if (rows.Text("section") is var name && SafeName.Problem(name) is null && known.Add(name))
                    sections.Add((name, rows.Cell("section")));
        }
        else if (HasShapes(rows, input.File))
        {
            if (rows.Has("mass_kg_per_m"))
                findings.Doubt(new InputFinding(input.File, rows.Line, rows.Cell("mass_kg_per_m").Column,
                    "mass_kg_per_m is not used yet; moments are aerodynamic only"));
            var previous = (Radius: 0.0, Line: 0);
            var byThickness = !rows.Has("section");
            while (rows.Read())
            {
                var radius = Positive(rows, "radius_m");
                if (radius <= previous.Radius)
                    rows.Error("radius_m",
                        Rising.Problem("radius_m", previous, radius, rows.Line, "radii must rise from root to tip"));
                if (radius > Limits.Radius)
                    rows.Error("radius_m", $"radius_m is {CanonicalText.Of(radius)}; "
                        + $"it must be at most {CanonicalText.Of(Limits.Radius)}, in metres");
                var chord = Positive(rows, "chord_m");
                var twist = rows.Number("twist_deg");
                if (Math.Abs(twist) > 180)
                    rows.Error("twist_deg", $"twist_deg is {CanonicalText.Of(twist)}; give an angle from -180 to 180");
                var section = byThickness ? null : SectionOf(rows);
                var thickness = ThicknessOf(rows, byThickness);
                CheckMass(rows);
                if (!double.IsNaN(thickness))
                    thicknesses.Add(new RowThickness(section, thickness, rows.Cell("thickness_ratio")));
                if (!double.IsNaN(radius))
                    previous = (radius, rows.Line);
                if (section is not null && known.Add(section))
                    sections.Add((section, rows.Cell("section")));
                stations.Add(byThickness
                    ? BladeStation.OfThickness(radius, chord, double.DegreesToRadians(twist), thickness)
                    : new BladeStation(radius, chord, double.DegreesToRadians(twist), section ?? ""));
                cells.Add((rows.Cell("chord_m"), rows.Cell("twist_deg")));
                lines.Add($"{CanonicalText.Of([radius, chord, twist])},{section}{(byThickness ? "," + CanonicalText.Of(thickness) : "")}");
            }
            if (!rows.HasErrors && stations.Count < 2)
                rows.Error(new Place(input.File, 0, 0),
                    $"has {(stations.Count == 0 ? "no row" : "one row")}; a blade needs two or more, root first");
        }
        var blade = rows.HasErrors ? null : Blade.FromStations(stations);
        if (blade is not null)
            UnlikelyBlade.Doubt(blade, cells, findings);
        return new BladeTable(
            blade, [.. sections], [.. thicknesses], Fingerprint.OfTable("blade", input.File, () => lines),
            new InputFile(input.File, input.Sha256, Contents(blade, sections.Count)));
    }

    private static string Contents(Blade? blade, int sections) => blade is null ? "blade table with errors" : string.Create(
        CultureInfo.InvariantCulture,
        $"{blade.Stations.Length} rows from {CanonicalText.Of(blade.HubRadius)} to {CanonicalText.Of(blade.TipRadius)} m, "
        + $"{(blade.IsByThickness ? "sections by thickness" : sections == 1 ? "1 section" : $"{sections} sections")}");

    private static bool HasShapes(CsvRows rows, string file)
    {
        if (rows.Has("section") || rows.Has("thickness_ratio"))
            return true;
        rows.Error(new Place(file, rows.Line, 1), "no column 'section'; name the section of each row, or give its thickness_ratio");
        return false;
    }

    private static string? SectionOf(CsvRows rows)
    {
        var section = rows.Text("section");
        if (section.Length == 0)
            rows.Error("section", rows.Has("thickness_ratio") && rows.Text("thickness_ratio").Length > 0
                ? "section is empty; name one in every row, or leave the column out and thickness_ratio serves"
                : "section is empty; name a section");
        else if (SafeName.Problem(section) is { } problem)
            rows.Error("section",
                $"section {VisibleText.Quote(section)} {problem}; a section's name is also that of its polar file");
        else
            return section;
        return null;
    }

    private static double Positive(CsvRows rows, string column)
    {
        var value = rows.Number(column);
        if (!(value <= 0))
            return value;
        rows.Error(column, $"{column} is {CanonicalText.Of(value)}; it must be above 0");
        return double.NaN;
    }

    // NaN where the row gives none, or a wrong one.
    private static double ThicknessOf(CsvRows rows, bool isNeeded)
    {
        if (!rows.Has("thickness_ratio") || (rows.Text("thickness_ratio").Length == 0 && !isNeeded))
            return double.NaN;
        var thickness = rows.Number("thickness_ratio");
        if (!(thickness is <= 0 or > 1))
            return thickness;
        rows.Error("thickness_ratio", $"thickness_ratio is {CanonicalText.Of(thickness)}; {ThicknessText.WhatWouldDo(thickness)}");
        return double.NaN;
    }

    private static void CheckMass(CsvRows rows)
    {
        if (rows.Has("mass_kg_per_m") && rows.Number("mass_kg_per_m") is < 0 and var mass)
            rows.Error("mass_kg_per_m", $"mass_kg_per_m is {CanonicalText.Of(mass)}; it must be 0 or more");
    }
}

/// <summary>A thickness over chord that a row of a blade table gives.</summary>
/// <param name="Section">The section that the row names; null where the thickness serves.</param>
internal sealed record RowThickness(string? Section, double ThicknessRatio, Place At);
