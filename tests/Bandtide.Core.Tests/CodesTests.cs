namespace Bandtide.Core.Tests;

public sealed class CodesTests
{
    [Theory]
    [InlineData("bc-49m")]
    [InlineData("ab")]
    [InlineData("0-")]
    [InlineData("abcdefghijklmnopqrstuvwx")]
    public void Two_to_twenty_four_lower_case_letters_digits_and_hyphens_are_a_code(string text) => Assert.True(Codes.IsValid(text));

    [Theory]
    [InlineData(null)]
    [InlineData("")]
    [InlineData("a")]
    [InlineData("abcdefghijklmnopqrstuvwxy")]
    [InlineData("BC-49m")]
    [InlineData("bc_49m")]
    [InlineData(" bc-49m")]
    [InlineData("bc-49m\n")]
    [InlineData("bä-49m")]
    [InlineData("bc-４９m")]
    public void Anything_else_is_not(string? text) => Assert.False(Codes.IsValid(text));
}
