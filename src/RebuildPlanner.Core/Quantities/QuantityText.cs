namespace RebuildPlanner.Core.Quantities;

/// <summary>The one strict grammar for what a workshop writes.</summary>
public static class QuantityText
{
    /// <summary>Reads a written quantity under the rule of its place.</summary>
    /// <param name="text">What was typed.</param>
    /// <param name="rule">What may stand here.</param>
    /// <param name="problem">Where it cannot be read: what is wrong and what would be right; else null.</param>
    /// <returns>The quantity, or null.</returns>
    public static Quantity? Read(string text, QuantityRule rule, out string? problem) => throw new NotImplementedException();
}
