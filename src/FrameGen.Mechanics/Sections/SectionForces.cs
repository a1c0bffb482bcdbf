namespace FrameGen.Mechanics.Sections;

/// <summary>
/// Internal forces at one place of a tube: what the part beyond (larger x) does to the part before, in local axes.
/// </summary>
/// <remarks>
/// <para>Over the cut face that looks towards larger x: N = ∫σ dA, Vy = ∫τxy dA, Vz = ∫τxz dA, T = ∫(y τxz − z τxy) dA,
/// My = ∫z σ dA, Mz = −∫y σ dA. So σ = N/A + My z/Iy − Mz y/Iz: a positive My pulls at the top line, a positive Mz presses
/// on the side local y points to.</para>
/// <para>Along the tube, under an even load (px, py, pz): dN/dx = −px, dVy/dx = −py, dVz/dx = −pz, dMy/dx = Vz, dMz/dx = −Vy.</para>
/// </remarks>
/// <param name="N">Axial force, N, tension positive.</param>
/// <param name="Vy">Shear along local y, N.</param>
/// <param name="Vz">Shear along local z, N.</param>
/// <param name="T">Torque about local x, N·mm.</param>
/// <param name="My">Moment about local y, N·mm.</param>
/// <param name="Mz">Moment about local z, N·mm.</param>
public readonly record struct SectionForces(double N, double Vy, double Vz, double T, double My, double Mz);
