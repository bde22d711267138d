namespace RebuildPlanner.Core.Quantities;

/// <summary>A figure in the working unit of its kind, still decimal; without limits its ends are the value.</summary>
internal readonly record struct Figure(decimal Value, decimal Low, decimal High, decimal Step);
