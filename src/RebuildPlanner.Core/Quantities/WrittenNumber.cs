namespace RebuildPlanner.Core.Quantities;

/// <summary>A number as typed, without its unit.</summary>
/// <param name="Text">The characters, minus sign included.</param>
/// <param name="Value">Its value, exact for a decimal number.</param>
/// <param name="Step">The worth of one step in its last digit, or one part of its fraction.</param>
internal readonly record struct WrittenNumber(string Text, decimal Value, decimal Step);
