using FrameGen.Output;
using FrameGen.Output.Folders;
using Xunit;

namespace FrameGen.Tests.Output.Folders;

public sealed class OutputFolderTests : IDisposable
{
    private static readonly IReadOnlyList<OutputFile> First = ScratchFolder.Papers(("a.csv", "one"), ("sub/b.dxf", "two"));
    private static readonly IReadOnlyList<OutputFile> Second = ScratchFolder.Papers(("a.csv", "ONE"), ("sub/c.dxf", "three"));

    private readonly ScratchFolder _scratch = new();

    public void Dispose() => _scratch.Dispose();

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Replaces_the_folder_whole_and_leaves_nothing_beside_it(bool exchange)
    {
        Assert.True(Folder(exchange).Write(First, replace: false).Changed);
        Assert.Equal(["out/a.csv=one", "out/sub/b.dxf=two"], _scratch.Listing());
        WriteResult second = Folder(exchange).Write(Second, replace: false);
        Assert.Equal((true, null), (second.Changed, second.Leftover));
        Assert.Equal(["out/a.csv=ONE", "out/sub/c.dxf=three"], _scratch.Listing());
        Assert.Equal(["out"], Directory.GetFileSystemEntries(_scratch.Path).Select(f => Path.GetFileName(f)).ToArray());
    }

    [Fact]
    public void The_same_bytes_again_change_nothing()
    {
        Folder().Write(First, replace: false);
        Assert.False(Folder().Write(First, replace: false).Changed);
        File.Delete(_scratch["out/a.csv"]);
        Assert.True(Folder().Write(First, replace: false).Changed);
        Assert.True(File.Exists(_scratch["out/a.csv"]));
    }

    [Fact]
    public void Refuses_files_that_no_build_wrote_or_that_were_changed_and_names_them()
    {
        Folder().Write(First, replace: false);
        _scratch.Write("out/notes.txt", "mine");
        _scratch.Write("out/sub/b.dxf", "edited");
        string[] before = _scratch.Listing();
        OutputRefusedException refusal = Assert.Throws<OutputRefusedException>(() => Folder().Write(Second, replace: false));
        Assert.Equal(["sub/b.dxf", "notes.txt"], refusal.Files);
        Assert.Equal(before, _scratch.Listing());
    }

    [Fact]
    public void Refuses_a_folder_of_the_user_s_own()
    {
        _scratch.Write("out/thesis.txt", "mine");
        Assert.Equal(["thesis.txt"], Assert.Throws<OutputRefusedException>(() => Folder().Write(First, replace: false)).Files);
        Assert.Equal(["out/thesis.txt=mine"], _scratch.Listing());
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Replace_moves_them_beside_the_folder_with_a_number_where_the_name_is_taken(bool exchange)
    {
        for (int i = 1; i <= 2; i++)
        {
            _scratch.Write("out/deep/er/notes.txt", $"mine {i}");
            Folder(exchange).Write(i == 1 ? First : Second, replace: true);
        }

        Assert.Equal(
            ["out.kept/deep/er/notes-2.txt=mine 2", "out.kept/deep/er/notes.txt=mine 1", "out/a.csv=ONE", "out/sub/c.dxf=three"],
            _scratch.Listing());
    }

    [Fact]
    public void Links_are_moved_and_never_followed()
    {
        _scratch.Write("elsewhere/precious.txt", "mine");
        Folder().Write(First, replace: false);
        Directory.CreateSymbolicLink(_scratch["out/link"], _scratch["elsewhere"]);
        File.Delete(_scratch["out/a.csv"]);
        File.CreateSymbolicLink(_scratch["out/a.csv"], _scratch["elsewhere/precious.txt"]);
        Assert.Equal(["a.csv", "link"], Assert.Throws<OutputRefusedException>(() => Folder().Write(Second, replace: false)).Files.Order(StringComparer.Ordinal).ToArray());
        Folder().Write(Second, replace: true);
        Assert.Equal("mine", File.ReadAllText(_scratch["elsewhere/precious.txt"]));
        Assert.Equal(_scratch["elsewhere"], new DirectoryInfo(_scratch["out.kept/link"]).LinkTarget);
        Assert.Null(new FileInfo(_scratch["out/a.csv"]).LinkTarget);
    }

    [Fact]
    public void A_link_or_a_file_in_the_folder_s_place_is_refused()
    {
        Directory.CreateDirectory(_scratch["real"]);
        Directory.CreateSymbolicLink(_scratch["out"], _scratch["real"]);
        Assert.Throws<OutputRefusedException>(() => Folder());
        Assert.Throws<OutputRefusedException>(() => new OutputFolder(_scratch["out"] + "/"));
        File.WriteAllText(_scratch["file"], "x");
        Assert.Throws<OutputRefusedException>(() => new OutputFolder(_scratch["file"]));
        Assert.Throws<OutputRefusedException>(() => new OutputFolder(_scratch["file/deep/er"]));
        Assert.Throws<OutputRefusedException>(() => new OutputFolder("/"));
    }

    [Fact]
    public void Nothing_is_kept_through_a_link()
    {
        Directory.CreateDirectory(_scratch["real"]);
        Directory.CreateSymbolicLink(_scratch["out.kept"], _scratch["real"]);
        _scratch.Write("out/notes.txt", "mine");
        Assert.Throws<IOException>(() => Folder().Write(First, replace: true));
        Assert.Equal("mine", File.ReadAllText(_scratch["out/notes.txt"]));
    }

    [Theory]
    [InlineData("../escape.txt")]
    [InlineData("/etc/escape.txt")]
    [InlineData("a//b")]
    [InlineData("a/./b")]
    [InlineData("")]
    public void A_path_can_t_leave_the_folder(string path)
    {
        Assert.Throws<ArgumentException>(() => Folder().Write([OutputFile.FromText(path, "x")], replace: false));
        Assert.Empty(Directory.GetFileSystemEntries(_scratch.Path));
    }

    [Fact]
    public void A_build_that_died_while_writing_leaves_nothing_for_ever()
    {
        Folder().Write(First, replace: false);
        _scratch.Write(".out.framegen-part/a.csv", "half");
        Folder().Write(Second, replace: false);
        Assert.Equal(["out/a.csv=ONE", "out/sub/c.dxf=three"], _scratch.Listing());
    }

    [Fact]
    public void A_build_that_died_before_the_swap_leaves_the_old_papers()
    {
        Folder().Write(First, replace: false);
        new OutputFolder(_scratch["other"]).Write(Second, replace: false);
        Directory.Move(_scratch["other"], _scratch[".out.framegen-new"]);
        Folder().Recover();
        Assert.Equal(["out/a.csv=one", "out/sub/b.dxf=two"], _scratch.Listing());
    }

    [Fact]
    public void A_build_that_died_between_two_renames_is_completed()
    {
        Folder().Write(First, replace: false);
        Directory.Move(_scratch["out"], _scratch[".out.framegen-old"]);
        new OutputFolder(_scratch["other"]).Write(Second, replace: false);
        Directory.Move(_scratch["other"], _scratch[".out.framegen-new"]);
        Folder().Recover();
        Assert.Equal(["out/a.csv=ONE", "out/sub/c.dxf=three"], _scratch.Listing());
    }

    [Fact]
    public void A_build_that_died_with_the_old_papers_aside_puts_them_back()
    {
        Folder().Write(First, replace: false);
        Directory.Move(_scratch["out"], _scratch[".out.framegen-old"]);
        Folder().Recover();
        Assert.Equal(["out/a.csv=one", "out/sub/b.dxf=two"], _scratch.Listing());
    }

    [Fact]
    public void A_user_s_file_among_old_papers_is_kept()
    {
        Folder().Write(First, replace: false);
        new OutputFolder(_scratch["other"]).Write(Second, replace: false);
        Directory.Move(_scratch["other"], _scratch[".out.framegen-old"]);
        _scratch.Write(".out.framegen-old/notes.txt", "mine");
        Folder().Recover();
        Assert.Equal(["out.kept/notes.txt=mine", "out/a.csv=one", "out/sub/b.dxf=two"], _scratch.Listing());
    }

    [Fact]
    public async Task A_build_waits_for_another_one()
    {
        Folder().Write(First, replace: false);
        Task<WriteResult> second;
        using (new FileStream(_scratch[".out.framegen-lock"], FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None, 1, FileOptions.DeleteOnClose))
        {
            second = Task.Run(() => Folder().Write(Second, replace: false), TestContext.Current.CancellationToken);
            await Task.Delay(250, TestContext.Current.CancellationToken);
            Assert.False(second.IsCompleted);
        }

        Assert.True((await second).Changed);
        Assert.Equal(["out/a.csv=ONE", "out/sub/c.dxf=three"], _scratch.Listing());
    }

    private OutputFolder Folder(bool exchange = true) => new(_scratch["out"], exchange);
}
