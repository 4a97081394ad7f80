using System.Globalization;
using System.Text;

namespace BladeLoads.EndToEnd.InProcess;

/// <summary>
/// A study that is edited at random, written into a folder, and the identity of each case in the edits' own terms: two cases of one
/// identity have one result, whatever their names, titles, comments and order. The program's fingerprints have no part in it.
/// </summary>
internal sealed class EditedStudy
{
    private static readonly string[] Densities = ["1.225", "1.05", "1.1"];
    private static readonly string[] Pitches = ["0", "1", "-1.5"];
    private static readonly string[] Names = ["clean", "thin-air", "slow", "fast", "other", "late"];

    private readonly Random _random;
    private readonly string _folder;
    private readonly Dictionary<string, EditedCase> _cases = new(StringComparer.Ordinal);
    private readonly Dictionary<string, int> _lift = new(StringComparer.Ordinal) { ["clean/root"] = 0, ["clean/tip"] = 0, ["soiled/root"] = 1, ["soiled/tip"] = 1 };
    private int _chord;
    private int _reading;   // ways of writing the same

    public EditedStudy(string folder, int seed)
    {
        (_folder, _random) = (folder, new Random(seed));
        foreach (var name in Names[..3])
            _cases[name] = new EditedCase($"Title of {name}", 0, 0, false, false);
        _cases["thin-air"] = _cases["thin-air"] with { Density = 1 };
        _cases["slow"] = _cases["slow"] with { Pitch = 1, Soiled = true };
        Write();
    }

    public IReadOnlyCollection<string> CaseNames => _cases.Keys;

    /// <summary>Every value that determines the case's result, as the edits know them.</summary>
    public string Identity(string name)
    {
        var c = _cases[name];
        var set = c.Soiled ? "soiled" : "clean";
        return $"density {c.Density} pitch {c.Pitch} buhl {c.Buhl} lift {_lift[set + "/root"]} {_lift[set + "/tip"]} chord {_chord}";
    }

    /// <summary>One to three edits.</summary>
    /// <returns>What they were, to be told when something goes wrong.</returns>
    public string Edit()
    {
        var edits = Enumerable.Range(0, _random.Next(1, 4)).Select(_ => EditOnce()).ToList();
        Write();
        return string.Join("; ", edits);
    }

    private string EditOnce()
    {
        var name = _cases.Keys.Order(StringComparer.Ordinal).ElementAt(_random.Next(_cases.Count));
        var chosen = _cases[name];
        switch (_random.Next(11))
        {
            case 0:
                _cases[name] = chosen with { Density = _random.Next(Densities.Length) };
                return $"density of {name}";
            case 1:
                _cases[name] = chosen with { Pitch = _random.Next(Pitches.Length) };
                return $"pitch of {name}";
            case 2:
                _cases[name] = chosen with { Buhl = !chosen.Buhl };
                return $"heavy loading of {name}";
            case 3:
                _cases[name] = chosen with { Soiled = !chosen.Soiled };
                return $"polars of {name}";
            case 4:
                _cases[name] = chosen with { Title = $"Title {_random.Next(3)}" };
                return $"title of {name}";
            case 5:
                var table = _lift.Keys.Order(StringComparer.Ordinal).ElementAt(_random.Next(_lift.Count));
                _lift[table] = _random.Next(3);
                return $"lift of {table}";
            case 6:
                _chord = _random.Next(2);
                return "chord";
            case 7 when Names.Except(_cases.Keys).Order(StringComparer.Ordinal).ToList() is [.., var free]:
                _cases.Remove(name);
                _cases[free] = chosen;
                return $"{name} renamed to {free}";
            case 8 when Names.Except(_cases.Keys).Order(StringComparer.Ordinal).ToList() is [var free, ..]:
                _cases[free] = chosen with { Density = _random.Next(Densities.Length) };
                return $"{free} copied from {name}";
            case 9 when _cases.Count > 1:
                var other = _cases.Keys.Order(StringComparer.Ordinal).First(n => n != name);
                (_cases[name], _cases[other]) = (_cases[other], chosen);
                return $"{name} and {other} exchanged";
            default:
                _reading++;
                return "written otherwise";
        }
    }

    private void Write()
    {
        Directory.CreateDirectory(_folder);
        var cases = Path.Join(_folder, "cases");
        if (Directory.Exists(cases))
            Directory.Delete(cases, recursive: true);
        Directory.CreateDirectory(cases);
        Put("study.toml", """
            blade = "blades/beck.csv"
            [rotor]
            blade_count = 3
            [wind]
            speeds_m_s = [6, 9]
            [control]
            strategy = "fixed-speed"
            rotor_speed_rpm = 34
            [model]
            elements = 5

            """);
        foreach (var (name, c) in _cases)
            Put($"cases/{name}.toml", Spelled(
            [
                $"title = \"{c.Title}\"", $"polars = \"../polars/{(c.Soiled ? "soiled" : "clean")}\"",
                $"air.density_kg_m3 = {Densities[c.Density]}{(_reading % 2 == 1 && c.Density != 0 ? "0" : "")}",
                $"control.pitch_deg = {Pitches[c.Pitch]}", $"model.heavy_loading = \"{(c.Buhl ? "buhl-2005" : "glauert-1935")}\"",
            ]));
        var swap = _reading % 3 == 2;
        Put("blades/beck.csv", (swap ? "# the same in another order\nsection,radius_m,chord_m,twist_deg\n" : "radius_m,chord_m,twist_deg,section\n")
            + string.Concat(new[] { ("1", "1.4", "14", "root"), ("12", _chord == 0 ? "1.0" : "1.1", "3", "root"), ("20", "0.4", "0", "tip") }
                .Select(r => swap ? $"{r.Item4}, {r.Item1}.0 ,{r.Item2},{r.Item3}\n" : $"{r.Item1},{r.Item2},{r.Item3},{r.Item4}\n")));
        foreach (var (table, lift) in _lift)
            Put($"polars/{table}.csv", Polar(lift, swap));
        Put("polars/clean/nobody-names-me.csv", $"alpha_deg,cl,cd\n-10,{_reading},0\n0,0,0\n10,1,0\n");
    }

    private string Spelled(string[] lines)
    {
        // Dotted keys must follow those of the top; among themselves their order is free.
        var ordered = _reading % 2 == 0 ? lines : [.. lines[..2].Reverse(), .. lines[2..].Reverse()];
        return string.Concat(ordered.Select(line => _reading % 3 == 1 ? $"# comment {_reading}\n  {line}   # and more\n" : line + "\n"));
    }

    private static string Polar(int lift, bool withMoments)
    {
        var text = new StringBuilder(withMoments ? "alpha_deg,cl,cd,cm\n" : "alpha_deg,cl,cd\n");
        foreach (var (alpha, cl, cd) in new[] { (-180, 0, 0.02), (-20, -0.8, 0.2), (0, 0.3, 0.01), (12, 1.3 + 0.05 * lift, 0.02), (30, 0.9, 0.4), (180, 0.0, 0.02) })
            text.Append(CultureInfo.InvariantCulture, $"{alpha},{cl},{cd}{(withMoments ? ",-0.05" : "")}\n");
        return text.ToString();
    }

    private void Put(string file, string text)
    {
        var path = Path.Join(_folder, file);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        if (!File.Exists(path) || File.ReadAllText(path) != text || _reading % 5 == 4)
            File.WriteAllText(path, text);
    }

    private sealed record EditedCase(string Title, int Density, int Pitch, bool Buhl, bool Soiled);
}
