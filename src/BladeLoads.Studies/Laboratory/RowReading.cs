namespace BladeLoads.Studies.Laboratory;

/// <summary>What a line came to that has a value a column.</summary>
internal enum RowKind
{
    Row,

    /// <summary>Of a section that is not asked for.</summary>
    OtherSection,

    /// <summary>A value is missing, and such rows are left out.</summary>
    Incomplete,

    /// <summary>No number where one must be.</summary>
    Broken,
}

/// <summary>
/// A line read as a row, with what was seen in it: that counts only where the row is taken, as lines are read too to tell what they are.
/// </summary>
/// <param name="Row">Its numbers; of no other kind than <see cref="RowKind.Row"/>.</param>
internal readonly record struct RowReading(RowKind Kind, ForeignRow Row)
{
    /// <summary>The section it names, asked for or not; null where no column names any.</summary>
    public (string Name, Place At)? Section { get; init; }

    /// <summary>A minus sign of typesetters was read.</summary>
    public bool HasForeignMinus { get; init; }

    /// <summary>Its angle bears a degree sign.</summary>
    public bool HasDegreeSign { get; init; }

    /// <summary>A number has a decimal point or an exponent, or a decimal comma in quotes: commas between the cells are separators.</summary>
    public bool ShowsItsDecimals { get; init; }
}
