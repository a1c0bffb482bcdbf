using System.Globalization;
using FrameGen.Fabrication;
using FrameGen.Formats.Drawings;
using FrameGen.Output.Drawings;
using Xunit;

namespace FrameGen.Acceptance.Formats;

/// <summary>PDF files read and rasterised by poppler.</summary>
public class PdfReadBackTests
{
    public static TheoryData<string> Names => DrawnTubes.Names;

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_page_says_what_it_is_and_how_to_print_it(string name)
    {
        DrawnTube tube = DrawnTubes.Named(name);
        (ShopPackage package, Part part) = tube.Build();
        ForeignProgram reader = ForeignProgram.Find("pdftotext");
        using var folder = new ScratchFolder();
        string[] pages = reader.Run("-layout", folder.Write("templates.pdf", TemplatesPdf.Write(package)), "-").TrimEnd('\f', '\n').Split('\f');

        bool isInch = tube.Page is Spec.PageSize.Letter or Spec.PageSize.Tabloid;
        for (int i = 0; i < pages.Length; i++)
        {
            string[] wanted =
            [
                $"page {i + 1} of {pages.Length}", "Print at 100 %, check the ruler", "100 mm", "3f9ac2d1", tube.Title[..20],
                "An aid to design",
            ];
            Assert.All(wanted, w => Assert.Contains(w, pages[i], StringComparison.Ordinal));
            Assert.Equal(isInch, pages[i].Contains("4 in", StringComparison.Ordinal));
            Assert.Equal(tube.Status == Sizing.SizingStatus.Unmet, pages[i].Contains("NOT MEETING TARGETS", StringComparison.Ordinal));
        }

        if (TemplatePieces.Of(package, part).Count == 0)
        {
            Assert.Contains("No end of any part is cut to another", Assert.Single(pages), StringComparison.Ordinal);
        }
        else
        {
            Assert.All(pages, p => Assert.Contains($"{part.Mark} ", p, StringComparison.Ordinal));
        }
    }

    // A4 and letter in points of 1/72 inch: 210 x 297 mm, 8.5 x 11 in.
    [Theory]
    [InlineData("equal tubes at 90 degrees", "841.89 x 595.276 pts (A4)", "1")]
    [InlineData("inches on letter, targets missed", "612 x 792 pts (letter)", "1")]
    [InlineData("square ends", "595.276 x 841.89 pts (A4)", "1")]
    public void Pages_have_their_paper_size(string name, string size, string pages)
    {
        (ShopPackage package, _) = DrawnTubes.Named(name).Build();
        ForeignProgram reader = ForeignProgram.Find("pdfinfo");
        using var folder = new ScratchFolder();
        Dictionary<string, string> info = reader.Run(folder.Write("templates.pdf", TemplatesPdf.Write(package))).Split('\n')
            .Where(l => l.Contains(':', StringComparison.Ordinal))
            .ToDictionary(l => l[..l.IndexOf(':', StringComparison.Ordinal)], l => l[(l.IndexOf(':', StringComparison.Ordinal) + 1)..].Trim(), StringComparer.Ordinal);
        Assert.Equal(size, info["Page size"]);
        Assert.Equal(pages, info["Pages"]);
        Assert.False(info.ContainsKey("CreationDate"));
    }

    /// <summary>At 254 dots an inch, 0.1 mm is one dot.</summary>
    [Theory]
    [InlineData("equal tubes at 90 degrees")]
    [InlineData("inches on letter, targets missed")]
    public void The_ruler_is_100_mm_long(string name)
    {
        GreyPage page = Raster(DrawnTubes.Named(name));

        // The ruler's line: the lowest row that is dark for most of 100 mm. Its ends: the tallest ticks above it.
        int row = Enumerable.Range(0, page.Height).Last(y => page.DarkIn(y, 110, 1110) > 950);
        int[] ticks = [.. Enumerable.Range(0, page.Width).Where(x => Enumerable.Range(5, 40).All(up => page.IsDark(x, row - up)))];
        Assert.Equal(100, (Groups(ticks)[^1] - Groups(ticks)[0]) / 10, 0.1);
    }

    /// <summary>Distances of the printed cut line from the printed datum line, and the printed width, against the saddle's closed form.</summary>
    [Fact]
    public void The_printed_cut_line_is_the_saddle()
    {
        DrawnTube tube = DrawnTubes.Named("equal tubes at 90 degrees") with { To = null };
        Func<double, double> saddle = tube.From!;
        GreyPage page = Raster(tube);

        // Closing edges: columns dark over at least 75 mm. Base edge and datum line: rows dark from edge to edge.
        double[] edges = Groups([.. Enumerable.Range(0, page.Width).Where(x => page.DarkInColumn(x) > 750)]);
        Assert.Equal(2, edges.Length);
        (double left, double right) = (edges[0], edges[1]);
        Assert.Equal(Math.PI * 38.1, (right - left) / 10, 0.1);
        double[] rows = Groups([.. Enumerable.Range(0, page.Height).Where(
            y => page.DarkIn(y, (int)left, (int)right) > (right - left) * 0.97 && page.DarkIn(y, 0, (int)left - 10) == 0)]);
        Assert.Equal(2, rows.Length);
        double datum = rows[1];

        // The datum stands on whole millimetres, as its label says.
        (ShopPackage package, Part part) = tube.Build();
        string label = TemplatePieces.Of(package, part)[0].Drawing.Shapes.OfType<Text>()
            .Single(t => t.Content.StartsWith("DATUM at y ", StringComparison.Ordinal)).Content;
        double datumAt = double.Parse(label.Split(' ')[3], CultureInfo.InvariantCulture);
        Assert.Equal(Math.Round(datumAt), datumAt);

        int looked = 0;
        for (double share = 0.03; share < 0.98; share += 0.02)
        {
            double clock = ((2 * share) - 1) * Math.PI;
            double slope = (saddle(clock + 1e-4) - saddle(clock - 1e-4)) / 2e-4 / 19.05;
            int x = (int)Math.Round(left + (share * (right - left)));

            // Upwards from just below the long point, where no words are: the first dark run. Steep places and quarter lines are left out.
            double fromQuarter = Math.Abs((4 * share) - Math.Round(4 * share));
            if (Math.Abs(slope) > 0.7 || fromQuarter < 0.02)
            {
                continue;
            }

            (int bottom, int top) = page.RunsUpwards(x, (int)(datum + (10 * datumAt) + 5), (int)datum + 10)[0];
            double expected = 10 * (datumAt - saddle(((x - left) / (right - left) * 2 * Math.PI) - Math.PI));
            Assert.Equal(expected, ((bottom + top) / 2.0) - datum, 1.0);
            looked++;
        }

        Assert.True(looked > 15, $"looked at {looked} places");
    }

    private static double[] Groups(int[] places)
    {
        var groups = new List<(int First, int Last)>();
        foreach (int p in places)
        {
            if (groups.Count > 0 && p <= groups[^1].Last + 2)
            {
                groups[^1] = (groups[^1].First, p);
            }
            else
            {
                groups.Add((p, p));
            }
        }

        return [.. groups.Select(g => (g.First + g.Last) / 2.0)];
    }

    private static GreyPage Raster(DrawnTube tube)
    {
        (ShopPackage package, _) = tube.Build();
        ForeignProgram raster = ForeignProgram.Find("pdftoppm");
        using var folder = new ScratchFolder();
        string file = folder.Write("templates.pdf", TemplatesPdf.Write(package));
        raster.Run("-gray", "-r", "254", "-f", "1", "-l", "1", "-singlefile", file, folder["page"]);
        return GreyPage.Read(File.ReadAllBytes(folder["page.pgm"]));
    }

    /// <summary>A page of grey dots, from a binary PGM file.</summary>
    private sealed record GreyPage(int Width, int Height, byte[] Dots)
    {
        public static GreyPage Read(byte[] file)
        {
            // P5, width, height and 255, parted by white space, then a byte a dot.
            int at = 0;
            string Word()
            {
                int start = at;
                while (!char.IsWhiteSpace((char)file[at]))
                {
                    at++;
                }

                return System.Text.Encoding.ASCII.GetString(file, start, at++ - start);
            }

            Assert.Equal("P5", Word());
            int width = int.Parse(Word(), CultureInfo.InvariantCulture);
            int height = int.Parse(Word(), CultureInfo.InvariantCulture);
            Assert.Equal("255", Word());
            return new GreyPage(width, height, file[at..]);
        }

        public bool IsDark(int x, int y) => Dots[(y * Width) + x] < 128;

        public int DarkIn(int y, int from, int to) => Enumerable.Range(from, to - from).Count(x => IsDark(x, y));

        public int DarkInColumn(int x) => Enumerable.Range(0, Height).Count(y => IsDark(x, y));

        public List<(int Bottom, int Top)> RunsUpwards(int x, int from, int to)
        {
            var runs = new List<(int Bottom, int Top)>();
            for (int y = from; y > to; y--)
            {
                if (!IsDark(x, y))
                {
                    continue;
                }

                int bottom = y;
                while (y > to && IsDark(x, y - 1))
                {
                    y--;
                }

                runs.Add((bottom, y));
            }

            return runs;
        }
    }
}
