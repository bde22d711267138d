using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>Moves shapes on paper.</summary>
internal static class Placing
{
    /// <summary>The shape moved to the right and down, mm.</summary>
    public static Shape At(Shape shape, double rightMm, double downMm)
    {
        Spot Moved(Spot spot) => new(spot.XMm + rightMm, spot.YMm + downMm);
        return shape switch
        {
            Line line => line with { From = Moved(line.From), To = Moved(line.To) },
            Polygon polygon => polygon with { Corners = [.. polygon.Corners.Select(Moved)] },
            Circle circle => circle with { Centre = Moved(circle.Centre) },
            Label label => label with { At = Moved(label.At) },
            _ => shape,
        };
    }
}
