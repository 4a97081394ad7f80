using BladeLoads.Results.Wording;

namespace BladeLoads.Batch.Tests.Results;

public class PrintableTests
{
    [Theory]
    [InlineData("plain, with æøå and 翼", "plain, with æøå and 翼")]
    [InlineData("\e[2J", @"\u001b[2J")]
    [InlineData("a\nb\rc\td\0", @"a\u000ab\u000dc\u0009d\u0000")]
    [InlineData("\u202Eturned", @"\u202eturned")]
    [InlineData("\u009B31m", @"\u009b31m")]
    [InlineData("\u2028", @"\u2028")]
    [InlineData("whole 😀", "whole 😀")]
    public void What_could_steer_a_terminal_is_shown_as_its_code(string text, string shown) => Assert.Equal(shown, Printable.Of(text));

    [Fact]
    public void Half_a_character_is_shown_as_its_code() => Assert.Equal(@"lone \ud83d", Printable.Of("lone \uD83D"));
}
