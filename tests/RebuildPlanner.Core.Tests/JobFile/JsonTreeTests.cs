using System.Text;
using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Core.Tests.JobFile;

public class JsonTreeTests
{
    [Theory]
    [InlineData("", 1, "", "the file must be one object")]
    [InlineData("{\n\"a\": }", 2, "a", "after \"a\" a colon and a value were expected")]
    [InlineData("{\n\"a\" 1 }", 2, "", "a field name in double quotes and a colon")]
    [InlineData("{\n\"a\": 1\n\"b\": 2 }", 3, "", "a comma between two fields, or the } of the object opened on line 1")]
    [InlineData("{\n\"a\": [ 1\n2 ] }", 3, "a", "a comma between two values, or the ] of the list opened on line 2")]
    [InlineData("{\n\"a\": [ { \"b\": tru } ] }", 2, "a[0].b", "after \"b\"")]
    [InlineData("{ \"a\": 1 }\n}", 2, "", "nothing but blanks may follow")]
    [InlineData("{ \"a\": \"\\ud800\" }", 1, "a", "half a character")]
    [InlineData("{\n \"a\": 'x' }", 2, "a", "text in double quotes")]
    public void What_is_not_JSON_gives_one_fault_with_its_line_and_what_was_expected(string text, int line, string path, string fragment)
    {
        JsonTree? tree = JsonTreeReader.Read(Encoding.UTF8.GetBytes(text), out Fault? fault);

        Assert.Null(tree);
        Assert.Equal((line, path), (fault!.Line, fault.Path));
        Assert.Contains(fragment, fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Text_that_is_not_UTF8_is_a_fault_on_its_line()
    {
        byte[] text = [.. "{\n\n\"a\": \""u8, 0xC3, 0x28, .. "\" }"u8];

        Assert.Null(JsonTreeReader.Read(text, out Fault? fault));
        Assert.Equal(3, fault!.Line);
        Assert.Contains("UTF-8", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Nesting_beyond_reason_is_a_fault()
    {
        string text = "{ \"a\": " + new string('[', 5000) + new string(']', 5000) + " }";

        Assert.Null(JsonTreeReader.Read(Encoding.UTF8.GetBytes(text), out Fault? fault));
        Assert.Contains("deep", fault!.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_node_knows_its_line_across_comments_and_both_line_ends()
    {
        JsonTree tree = JsonTreeReader.Read("{ // one\r\n\"a\": /* two\nthree */ 1,\n\"b\": [\n2,\n] }"u8, out _)!;

        Assert.Equal([3, 4], tree.Fields.ToArray().Select(field => field.Value!.Spot.Line));
        Assert.Equal((5, "b[0]"), (tree.Fields[1].Value!.Items[0].Spot.Line, tree.Fields[1].Value!.Items[0].Path));
    }

    [Fact]
    public void A_long_text_is_shown_short_and_never_cut_within_a_character()
    {
        string shown = JsonTree.Short(new string('x', 59) + "𝄞" + new string('x', 100));

        Assert.Equal(new string('x', 59) + "…", shown);
    }

    [Fact]
    public void The_length_of_the_file_counts_once()
    {
        // Ten times the file may not be a hundred times the work: counted in bytes allocated, which no busy machine disturbs.
        Assert.InRange(Cost(20_000) / (double)Cost(2_000), 5.0, 15.0);

        static long Cost(int items)
        {
            byte[] text = Encoding.UTF8.GetBytes("{ \"a\": [\n" + string.Join(",\n", Enumerable.Repeat("{ \"b\": \"c\" }", items)) + "\n] }");
            long before = GC.GetAllocatedBytesForCurrentThread();
            Assert.NotNull(JsonTreeReader.Read(text, out _));
            return GC.GetAllocatedBytesForCurrentThread() - before;
        }
    }
}
