using FrameGen.Output;
using FrameGen.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Output.Folders;

public sealed class FolderStateTests : IDisposable
{
    private readonly ScratchFolder _scratch = new();

    public FolderStateTests() =>
        new OutputFolder(_scratch["out"]).Write(ScratchFolder.Papers(("a.csv", "one"), ("b.csv", "two"), ("sub/c.dxf", "three")), replace: false);

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void Finds_nothing_wrong_with_what_a_build_wrote()
    {
        FolderState state = FolderState.Examine(_scratch["out"]);
        Assert.Equal(["a.csv", "b.csv", Manifest.FileName, "sub/c.dxf"], state.Known);
        Assert.Equal((0, 0, 0), (state.Changed.Count, state.Missing.Count, state.Extra.Count));
    }

    [Fact]
    public void Names_what_is_missing_changed_and_extra()
    {
        File.Delete(_scratch["out/a.csv"]);
        _scratch.Write("out/b.csv", "TWO");
        _scratch.Write("out/sub/d.dxf", "four");
        FolderState state = FolderState.Examine(_scratch["out"]);
        Assert.Equal(["a.csv"], state.Missing);
        Assert.Equal(["b.csv"], state.Changed);
        Assert.Equal(["sub/d.dxf"], state.Extra);
    }

    [Theory]
    [InlineData("")]
    [InlineData("{}")]
    [InlineData("[1")]
    [InlineData("{\"format\": \"framegen-manifest/1\", \"spec\": 3}")]
    [InlineData("{\"format\": \"framegen-manifest/1\", \"spec\": {\"file\": null, \"sha256\": \"\"}, \"tool\": {\"name\": \"\", \"version\": \"\"}, \"files\": []}")]
    public void A_manifest_that_is_none_makes_every_file_a_stranger(string manifest)
    {
        _scratch.Write("out/manifest.json", manifest);
        FolderState state = FolderState.Examine(_scratch["out"]);
        Assert.Null(state.Manifest);
        Assert.Equal([Manifest.FileName], state.Changed);
        Assert.Empty(state.Missing);
        Assert.Equal(["a.csv", "b.csv", "sub/c.dxf"], state.Extra);
    }
}
