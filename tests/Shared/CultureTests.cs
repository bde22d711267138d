using System.Globalization;

namespace RebuildPlanner.Tests.Shared;

public class CultureTests
{
    // Without this the comma-decimal pass could run under the invariant culture and prove nothing.
    [Fact]
    public void The_run_has_the_decimal_mark_it_claims_to_have()
    {
        string expected = Environment.GetEnvironmentVariable("COMMA_DECIMAL_PASS") == "1" ? "1,5" : "1.5";

        Assert.Equal(expected, 1.5.ToString(CultureInfo.CurrentCulture));
    }
}
