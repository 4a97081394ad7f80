using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Wording;
using BladeLoads.Studies.Cases;

namespace BladeLoads.Batch.Plan;

/// <summary>Why a result that is there is not current. Each says itself in one phrase, fit for a terminal.</summary>
public abstract record StaleReason
{
    private StaleReason() { }

    public abstract string Sentence { get; }

    /// <summary>A value that determines the result is another one.</summary>
    public sealed record ValueChanged(string Key, string From, string To) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Key} {Shortened(From)} -> {Shortened(To)}");
    }

    /// <summary>A value that determines the result was not there before.</summary>
    public sealed record ValueAdded(string Key, string To) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Key} is new: {Shortened(To)}");
    }

    /// <summary>A value that determined the result is there no more.</summary>
    public sealed record ValueRemoved(string Key, string From) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Key} is gone, was {Shortened(From)}");
    }

    /// <summary>Values of the air that follow from others, which are told before, are others too.</summary>
    public sealed record AirFollowed(ImmutableArray<ValueChanged> Values) : StaleReason
    {
        public override string Sentence => Printable.Of($"so {string.Join(", ", Values.Select(Phrase))}");

        private static string Phrase(ValueChanged value)
        {
            var (name, unit) = value.Key switch
            {
                DerivedAir.Density => ("density", "kg/m3"),
                DerivedAir.Viscosity => ("viscosity", "Pa s"),
                DerivedAir.SpeedOfSound => ("speed of sound", "m/s"),
                _ => (value.Key, ""),
            };
            var (from, to) = Rounded(value.From, value.To);
            return $"{name} {from} -> {to} {unit}".TrimEnd();
        }

        // To as few digits, from four up, as tell them apart; nobody wrote the others.
        private static (string From, string To) Rounded(string from, string to)
        {
            if (!double.TryParse(from, NumberStyles.Float, CultureInfo.InvariantCulture, out var old)
                || !double.TryParse(to, NumberStyles.Float, CultureInfo.InvariantCulture, out var now))
                return (Shortened(from), Shortened(to));
            for (var digits = 4; digits < 15; digits++)
                if ((Text(old, digits), Text(now, digits)) is var texts && texts.Item1 != texts.Item2)
                    return texts;
            return (from, to);
        }

        private static string Text(double value, int digits) => value.ToString($"G{digits}", CultureInfo.InvariantCulture).Replace('E', 'e');
    }

    /// <summary>A table holds other numbers, and it is known which.</summary>
    /// <param name="Table">Which: <c>polar tarn-30.csv</c>.</param>
    /// <param name="Unit">Of the angle, radius or wind speed by which rows are told: deg, m or m/s.</param>
    public sealed record TableRowsChanged(
        string Table, string Unit, ImmutableArray<RowChange> Rows, ImmutableArray<ReynoldsChange> Reynolds) : StaleReason
    {
        public override string Sentence
            => Printable.Of($"{Table}: {string.Join(", ", Rows.Select(r => r.Sentence(Unit)).Concat(Reynolds.Select(r => r.Sentence)))}");
    }

    /// <summary>A table holds other numbers; what it held is not known any more.</summary>
    /// <param name="Table">Which: <c>polar tarn-30.csv</c>.</param>
    public sealed record TableChanged(string Table) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Table}: table changed");
    }

    /// <summary>A table was not used before.</summary>
    public sealed record TableAdded(string Table) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Table}: table is new");
    }

    /// <summary>A table is used no more.</summary>
    public sealed record TableRemoved(string Table) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Table}: table is gone");
    }

    /// <summary>The physics changed since.</summary>
    public sealed record SolverChanged(int From, int To) : StaleReason
    {
        public override string Sentence => string.Create(CultureInfo.InvariantCulture, $"solver version {From} -> {To}");
    }

    /// <summary>The same values, told in another form by another version of the program.</summary>
    public sealed record FingerprintChanged : StaleReason
    {
        public override string Sentence => "the fingerprint is told in another form";
    }

    /// <summary>There is a result folder, but nothing that says what it was made from.</summary>
    public sealed record ReceiptUnreadable(string Why) : StaleReason
    {
        public override string Sentence => Printable.Of(Why);
    }

    /// <summary>A file of the result is not there.</summary>
    public sealed record FileMissing(string Name) : StaleReason
    {
        public override string Sentence => Printable.Of($"{Name} is not there");
    }

    /// <summary>A file of the result is not as it was written.</summary>
    public sealed record FileSizeChanged(string Name, long From, long To) : StaleReason
    {
        public override string Sentence => Printable.Of(string.Create(
            CultureInfo.InvariantCulture, $"{Name} has {To} bytes, was written with {From}"));
    }

    // A list of wind speeds may be long; the reason stays one line.
    private static string Shortened(string value) => value.Length <= 60 ? value : value[..(char.IsHighSurrogate(value[56]) ? 56 : 57)] + "...";
}
