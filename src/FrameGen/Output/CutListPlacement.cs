using FrameGen.Fabrication;
using FrameGen.Model;

namespace FrameGen.Output;

/// <summary>How a tube takes a part that is drawn for another one.</summary>
/// <param name="Tube">Its name.</param>
/// <param name="Mark">Of the part, with its hand where it has one.</param>
/// <param name="Drawn">Name of the tube that the part is drawn for.</param>
/// <param name="Swapped">True where the drawing's FROM end is at the tube's <c>to</c> node.</param>
/// <param name="Turn">Degrees: clock angle on the tube less that on the drawing (negated where swapped).</param>
public sealed record CutListPlacement(string Tube, string Mark, string Drawn, bool Swapped, string Turn)
{
    internal static IReadOnlyList<CutListPlacement> Of(ShopPackage package)
    {
        FrameModel model = package.Cut.Sized.Model;
        return
        [
            .. from part in package.Parts
               from placed in part.Placed
               where placed.Swapped || placed.Turn != 0
               select new CutListPlacement(
                   model.Tubes[placed.Tube].Name,
                   part.Name,
                   model.Tubes[part.Drawn.Tube].Name,
                   placed.Swapped,
                   FixedDigits.Tenths(double.RadiansToDegrees(placed.Turn))),
        ];
    }
}
