using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Stacks;

/// <summary>How much one doubt moves a figure, and on which measured thing it acts.</summary>
/// <param name="Source">The source's index in the model.</param>
/// <param name="Coefficient">Change of the figure for a unit of the source.</param>
/// <param name="What">What the doubt counts under in shares: a limit of error counts under the figure it acts on.</param>
public readonly record struct Term(int Source, double Coefficient, What What);
