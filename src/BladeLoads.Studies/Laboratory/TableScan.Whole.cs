using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Laboratory;

/// <remarks>Here: what only all rows together show.</remarks>
internal sealed partial class TableScan
{
    private void CheckWhole()
    {
        if (_sections.Count > 1 && _request.Section is null)
            _errors.Add("", _sections.Values.ElementAt(1),
                $"has rows of sections {VisibleText.Enumerate(_sections.Keys, "")}; say which: --section {_sections.Keys.First()}");
        else if (_request.Section is { } section && !_sections.ContainsKey(section))
            _errors.Add("", new Place(_text.File, 0, 0), _sections.Count == 0
                ? $"no column names sections, so there is no section {VisibleText.Quote(section)}"
                : $"has no section {VisibleText.Quote(section)}; there are {VisibleText.Enumerate(_sections.Keys, "none")}");
        if (Separator == CellSeparator.Comma && _request.DecimalSign is null && !_showsItsDecimals && Rows.Count > 0)
            _errors.Add("", new Place(_text.File, Rows[0].Line, 1),
                "commas stand here and no row has a decimal point, so that they may separate columns or be "
                + "decimal signs; say --decimal point where they separate, or save the table with semicolons");
        if (HasDegreeSigns)
            CheckDegreeSigns();
        if (Rows.Count == 0 && !_errors.Any)
            _errors.Add("", new Place(_text.File, 0, 0), "has no row left");
    }

    // A sign beside one angle alone may be a digit that something happened to.
    private void CheckDegreeSigns()
    {
        var other = _haveDegreeSigns.IndexOf(!_haveDegreeSigns[0]);
        if (other >= 0)
            _errors.Add("alpha", new Place(_text.File, Rows[other].Line, Rows[other].At.Angle), string.Create(CultureInfo.InvariantCulture,
                $"alpha has {(_haveDegreeSigns[other] ? "a" : "no")} degree sign here and {(_haveDegreeSigns[0] ? "one" : "none")} "
                    + $"in line {Rows[0].Line}; give one to all angles or to none"));
        else if (Unit == AngleUnit.Radians)
            _errors.Add("alpha", new Place(_text.File, Rows[0].Line, Rows[0].At.Angle), string.Create(CultureInfo.InvariantCulture,
                $"alpha has a degree sign here and line {UnitLine} names radians; correct one of them"));
        else if (Unit is null)
            (Unit, UnitLine) = (AngleUnit.Degrees, Rows[0].Line);
    }
}
