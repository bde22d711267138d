namespace RebuildPlanner.Sheets.Drawing;

/// <summary>A figure: drawn once as plain shapes, then put on paper or written as SVG.</summary>
/// <param name="WidthMm">Width on paper, mm.</param>
/// <param name="HeightMm">Height on paper, mm.</param>
/// <param name="Title">What it shows, a few words.</param>
/// <param name="Alternative">What it says, in words, for who cannot see it.</param>
/// <param name="Shapes">The shapes, the hindmost first.</param>
public sealed record Picture(double WidthMm, double HeightMm, string Title, string Alternative, IReadOnlyList<Shape> Shapes);
