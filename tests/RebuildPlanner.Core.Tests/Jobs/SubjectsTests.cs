using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Jobs;

public class SubjectsTests
{
    [Fact]
    public void Every_derived_figure_is_found_under_its_own_word()
    {
        string[] words =
        [
            "compression ratio", "trapped ratio", "cranking pressure", "piston to head", "chamber spread", "ratio spread", "bore clearance",
            "taper", "out-of-round", "gasket overhang",
        ];

        Assert.Equal(Enum.GetValues<Derived>().Length, words.Length);
        Assert.Equal(Enum.GetValues<Derived>().Cast<Derived?>(), words.Select(word => Subjects.Find(word)?.Derived));
        Assert.All(Enum.GetValues<Derived>(), derived => Assert.Equal(derived, Subjects.Of(derived).Derived));
    }

    [Fact]
    public void Measured_lengths_may_be_limited_and_volumes_may_not()
    {
        Assert.Equal(What.PistonToValve, Subjects.Find("piston to valve")!.What);
        Assert.Equal(What.HeadHeight, Subjects.Find("head height")!.What);
        Assert.Null(Subjects.Find("chamber"));
        Assert.Null(Subjects.Find("crown"));
        Assert.Null(Subjects.Find("chamber opening area"));
        Assert.Null(QuantityText.Read("5809 mm2", Subjects.Find("gasket opening")!.Rule, out _));
    }

    [Fact]
    public void No_word_stands_for_two_subjects() =>
        Assert.Equal(Subjects.All.Count, Subjects.All.Select(subject => subject.Word).Distinct().Count());

    [Theory]
    [InlineData("compression ratio", "10.5")]
    [InlineData("piston to head", "0.90 mm")]
    [InlineData("piston to head", "0 mm")]
    [InlineData("cranking pressure", "190 psi")]
    [InlineData("chamber spread", "0.5 cc")]
    [InlineData("out-of-round", "0.5 thou")]
    [InlineData("deck", "0.10 mm below")]
    [InlineData("liner protrusion", "0.02 mm")]
    public void Bounds_are_written_as_the_figure_is(string word, string bound)
    {
        Assert.NotNull(QuantityText.Read(bound, Subjects.Find(word)!.Rule, out string? problem));
        Assert.Null(problem);
    }

    [Theory]
    [InlineData("piston to head", 0.99)]
    [InlineData("piston to valve", 0.99)]
    [InlineData("wall", 0.99)]
    [InlineData("compression ratio", 0.95)]
    [InlineData("head height", 0.95)]
    public void What_can_destroy_an_engine_asks_for_more_belief(string word, double level) =>
        Assert.Equal(level, Subjects.DefaultLevel(Subjects.Find(word)!));
}
