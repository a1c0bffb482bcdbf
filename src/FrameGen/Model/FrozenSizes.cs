namespace FrameGen.Model;

/// <summary>Where a model's sizes come from when they are pinned, and the model without the pins.</summary>
/// <param name="FileName">Base name of the file that pins them.</param>
/// <param name="Sha256">Of its bytes, lower-case hex.</param>
/// <param name="Tool">Name and version of the program that froze them.</param>
/// <param name="SpecChanged">True where the spec is not what it was then.</param>
/// <param name="ChangedStock">Names of stock lists that are not what they were then.</param>
/// <param name="Marks">The part that each tube was when they were frozen, with its hand, in the file's order.</param>
/// <param name="Free">The same frame with its groups as the spec has them: what would be sized today.</param>
public sealed record FrozenSizes(
    string FileName,
    string Sha256,
    string Tool,
    bool SpecChanged,
    IReadOnlyList<string> ChangedStock,
    IReadOnlyList<(string Tube, string Mark)> Marks,
    FrameModel Free);

/// <summary>A stock list that sizes come from, and what its contents are known by.</summary>
/// <param name="List">Name.</param>
/// <param name="Version">The first characters of a hash of all that it offers.</param>
public sealed record StockVersion(string List, string Version);
