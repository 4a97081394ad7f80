using System.Collections.Immutable;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Tables;

/// <summary>What a set of polars says of its tables: <c>set.toml</c> beside them, with the thickness of each.</summary>
/// <param name="Thicknesses">In the order of the thickness; those that are wrong are left out, and reported.</param>
internal sealed record SetFile(ImmutableArray<TableThickness> Thicknesses, InputFile Input, bool IsSound)
{
    public const string Name = "set.toml";

    private const string Key = "thickness_ratio";

    public static SetFile Parse(InputText input, Findings findings)
    {
        var thicknesses = new List<TableThickness>();
        var isSound = false;
        if (TomlText.Parse(input, findings) is { } top)
        {
            isSound = true;
            foreach (var entry in top.Entries)
                if (entry.Name != Key)
                    Refuse(entry.Key, $"unknown key '{entry.Name}'; a set has [{Key}], with the thickness over chord of each table");
                else if (entry.Value is not TomlValue.Table table)
                    Refuse(entry.Value.At, $"{Key} is {entry.Value.Found}; write [{Key}] and below it a line a table: tip-18 = 0.18");
                else
                    Read(table);
        }
        thicknesses.Sort((a, b) => a.ThicknessRatio.CompareTo(b.ThicknessRatio));
        for (var i = 1; i < thicknesses.Count; i++)
            if (thicknesses[i].ThicknessRatio == thicknesses[i - 1].ThicknessRatio)
                Refuse(thicknesses[i].At, $"'{thicknesses[i - 1].Section}' and '{thicknesses[i].Section}' are both "
                    + $"{CanonicalText.Of(thicknesses[i].ThicknessRatio)} thick; between tables of one thickness nothing can be interpolated");
        return new SetFile(
            [.. thicknesses], new InputFile(input.File, input.Sha256, $"thickness of {thicknesses.Count} tables"), isSound);

        void Read(TomlValue.Table table)
        {
            foreach (var (section, key, value) in table.Entries)
                if (value is not TomlValue.Number { Value: > 0 and <= 1 } number)
                    Refuse(value.At, $"thickness_ratio of '{section}' is {value.Found}; " + (value is TomlValue.Text
                        ? "give the thickness over chord as a number, without quotes"
                        : ThicknessText.WhatWouldDo((value as TomlValue.Number)?.Value ?? double.NaN)));
                else
                    thicknesses.Add(new TableThickness(section, number.Value, key));
        }

        void Refuse(Place at, string text)
        {
            isSound = false;
            findings.Error(at, text);
        }
    }
}

/// <param name="Section">Name of the table, without its ending.</param>
/// <param name="ThicknessRatio">Above 0 to 1.</param>
internal sealed record TableThickness(string Section, double ThicknessRatio, Place At);
