namespace RebuildPlanner.Core.Quantities;

/// <summary>In which of its forms a limit was written.</summary>
internal enum LimitForm
{
    None,
    Symmetric,
    UpperLower,
    Range,
}

/// <summary>A number and the unit typed after it; the unit may be left to the next one on the right.</summary>
internal readonly record struct WrittenPart(WrittenNumber Number, string? Unit);

/// <summary>What stands in the text, before anything is asked about its meaning.</summary>
/// <param name="Value">The figure, or the lower end of a range.</param>
/// <param name="Form">The form of the limits.</param>
/// <param name="First">The limit after ±, the one after +, or the upper end of a range.</param>
/// <param name="Second">The limit after the minus sign of <c>+a/-b</c>.</param>
/// <param name="Word">The closing word, or null.</param>
internal sealed record WrittenQuantity(WrittenPart Value, LimitForm Form, WrittenPart First, WrittenPart Second, string? Word);
