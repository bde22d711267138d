namespace RebuildPlanner.Core.Cylinders;

/// <summary>The plain yes-or-no facts that decide which formula a cylinder takes; they are settled before any uncertain figure is read.</summary>
/// <param name="TravelMeasured">Piston travel was measured, so it is not computed from the stroke.</param>
/// <param name="OffsetPin">The pin is offset.</param>
/// <param name="WholeChamber">The whole chamber was filled, so it is the clearance volume.</param>
/// <param name="TopLand">Top land height and diameter are known.</param>
/// <param name="Closing">The closing that traps the charge is known, and the rod with it.</param>
/// <param name="TwoStroke">The exhaust port's closing traps the charge.</param>
public readonly record struct CylinderForm(
    bool TravelMeasured, bool OffsetPin, bool WholeChamber, bool TopLand, bool Closing, bool TwoStroke);
