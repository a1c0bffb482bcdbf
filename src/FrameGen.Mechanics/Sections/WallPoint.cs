namespace FrameGen.Mechanics.Sections;

/// <summary>A place on the skin of a tube in its first quadrant (y ≥ 0, z ≥ 0), and how it changes along the wall.</summary>
/// <param name="Y">Local y, mm.</param>
/// <param name="Z">Local z, mm.</param>
/// <param name="Qy">Shear stress in the wall per newton of Vy, 1/mm²; its size.</param>
/// <param name="Qz">Shear stress in the wall per newton of Vz, 1/mm²; its size.</param>
/// <param name="SlopeY">dY/du, u the place along its piece of the wall.</param>
/// <param name="SlopeZ">dZ/du.</param>
/// <param name="SlopeQy">dQy/du.</param>
/// <param name="SlopeQz">dQz/du.</param>
internal readonly record struct WallPoint(
    double Y, double Z, double Qy, double Qz, double SlopeY, double SlopeZ, double SlopeQy, double SlopeQz);
