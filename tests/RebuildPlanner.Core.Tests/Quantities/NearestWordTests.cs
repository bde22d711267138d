using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

public class NearestWordTests
{
    private static readonly string[] Known = ["bore", "stroke", "chamber", "crown", "crown fill", "guide", "stem", "rock"];

    [Theory]
    [InlineData("strok", "stroke")]
    [InlineData("storke", "stroke")]
    [InlineData("chanber", "chamber")]
    [InlineData("crownfill", "crown fill")]
    [InlineData("Bore", "bore")]
    [InlineData("steem", "stem")]
    public void Finds_the_word_meant(string typed, string meant) => Assert.Equal(meant, NearestWord.Of(typed, Known));

    [Theory]
    [InlineData("piston")]
    [InlineData("x")]
    [InlineData("")]
    public void Says_nothing_when_nothing_is_near(string typed) => Assert.Null(NearestWord.Of(typed, Known));

    [Fact]
    public void A_swap_of_neighbours_is_one_slip_and_beats_two_changes() =>
        Assert.Equal("abdc", NearestWord.Of("badc", ["bbdd", "abdc"]));

    [Fact]
    public void The_first_of_equals_is_taken() => Assert.Equal("cat", NearestWord.Of("bat", ["cat", "hat"]));

    [Fact]
    public void One_letter_is_never_taken_for_another() => Assert.Null(NearestWord.Of("x", ["C", "F", "K"]));
}
