using System.Buffers.Binary;
using System.Globalization;
using System.Text;
using System.Text.Json;
using FrameGen.Fabrication;
using FrameGen.Geometry;
using FrameGen.Joints;
using FrameGen.Mechanics.Frames;
using FrameGen.Model;
using FrameGen.Sizing;

namespace FrameGen.Output.Report;

/// <summary>What the report's picture is drawn from: one JSON object a tube, and one for the frame. Safe inside a script element.</summary>
/// <remarks>
/// Columns of <see cref="SceneColumns"/> are 16-bit whole numbers times <c>step</c>. Motions are single-precision floats, six a place:
/// displacement in mm and rotation in rad. Both little-endian, in base64.
/// </remarks>
internal sealed class SceneJson(ShopPackage package)
{
    private readonly SizedFrame _sized = package.Cut.Sized;
    private readonly FrameModel _model = package.Cut.Sized.Model;
    private readonly DisplayFormat _display = new(package.Cut.Sized.Model.Display);
    private readonly string[] _marks = PartMarks.NamesByTube(package);

    /// <summary>Names that tubes refer to by their place: groups, cases, targets that look at single tubes; and the nodes.</summary>
    /// <param name="azimuth">Of the first view, degrees.</param>
    /// <param name="elevation">Of the first view, degrees.</param>
    public string Frame(double azimuth, double elevation) => Text(json =>
    {
        json.Numbers("view", azimuth, elevation);
        Texts(json, "groups", _model.Groups.Select(g => g.Name));
        json.WriteStartArray("cases");
        foreach (CaseResult result in _sized.Cases)
        {
            json.WriteStartObject();
            json.WriteString("name", _model.Cases[result.Case].Name);
            json.WriteString("moves", MovesMost(result));
            json.WriteEndObject();
        }

        json.WriteEndArray();
        Texts(json, "limits", Limits().Select(t => $"{t.Kind}: {t.Label}"));
        json.WriteString("lengthUnit", _display.LengthUnitName);
        json.Number("lengthScale", _display.TargetUnit("mm").Scale);
        json.WriteStartArray("nodes");
        foreach (Node node in _model.Nodes)
        {
            json.WriteStartObject();
            json.WriteString("name", node.Name);
            Point(json, "at", node.Position);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    });

    /// <summary>One object a tube, in the spec's order.</summary>
    public IEnumerable<string> Tubes() => _model.Tubes.Select((tube, index) => Text(json => Write(json, tube, index)));

    /// <summary>The share of its limits that a tube uses: the most of all targets that look at single tubes; without any, of its yield; null where that is not known.</summary>
    public double? UseOf(int tube)
    {
        double?[] all = [.. Limits().Select(t => t.ByTube[tube])];
        return all.Max() ?? _sized.Cases.Max(c => c.Tubes[tube].Use?.Share);
    }

    private void Write(Utf8JsonWriter json, Tube tube, int index)
    {
        CutTube part = package.Cut.Tubes[index];
        json.WriteString("name", tube.Name);
        json.WriteString("mark", _marks[index]);
        json.WriteNumber("group", tube.Group);
        json.WriteString("section", _display.Section(_sized.ChosenFor(index)));
        json.WriteString("material", _model.Groups[tube.Group].Material.Name);
        json.WriteString("cutLength", _display.MeasuredLength(part.CutLength));
        json.WriteString("mass", _display.Mass(part.MassKg));
        json.WriteString("from", $"{_model.Nodes[tube.From.Node].Name}: {EndText.ForPeople(_model, part.From)}");
        json.WriteString("to", $"{_model.Nodes[tube.To.Node].Name}: {EndText.ForPeople(_model, part.To)}");
        json.Number("use", Rounded(UseOf(index)));
        json.WriteStartArray("uses");
        foreach (TargetResult limit in Limits())
        {
            if (Rounded(limit.ByTube[index]) is { } ratio)
            {
                json.WriteNumberValue(ratio);
            }
            else
            {
                json.WriteNullValue();
            }
        }

        json.WriteEndArray();
        Texts(json, "stress", _sized.Cases.Select(c => Stress(c.Tubes[index])));
        WriteAxis(json, tube);
        json.Number("length", Math.Round(tube.Length, 3));
        WriteColumns(json, SceneColumns.Of(package.Cut, index));
        if (_sized.Cases.Count > 0 && _sized.Cases.All(c => c.Axes.Count > index))
        {
            json.Numbers("places", [.. _sized.Cases[0].Axes[index].Select(p => Math.Round(p.Distance, 3))]);
            Texts(json, "motions", _sized.Cases.Select(c => Motions(c.Axes[index])));
        }
    }

    // Straights and arcs in their order, each with the point and the local axes at its start.
    private static void WriteAxis(Utf8JsonWriter json, Tube tube)
    {
        json.WriteStartArray("pieces");
        foreach (PathPiece piece in tube.Bent?.Pieces ?? [new PathPiece(0, tube.Length, tube.From.Point, tube.Axes.X, Vector3.Zero, 0)])
        {
            TubeAxes axes = tube.AxesAt(piece.Start);
            json.WriteStartObject();
            json.Number("start", Math.Round(piece.Start, 6));
            Point(json, "at", piece.Origin);
            Point(json, "x", axes.X);
            Point(json, "y", axes.Y);
            Point(json, "z", axes.Z);
            if (piece.IsArc)
            {
                Point(json, "about", piece.About);
                json.Number("radius", piece.Radius);
            }

            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static string Motions(IReadOnlyList<AxisPlace> places)
    {
        const int Floats = 6;
        byte[] bytes = new byte[places.Count * Floats * sizeof(float)];
        for (int i = 0; i < places.Count; i++)
        {
            AxisMotion motion = places[i].Motion;
            Span<byte> six = bytes.AsSpan(i * Floats * sizeof(float));
            ReadOnlySpan<double> values = [motion.Shift.X, motion.Shift.Y, motion.Shift.Z, motion.Turn.X, motion.Turn.Y, motion.Turn.Z];
            for (int k = 0; k < values.Length; k++)
            {
                // Noise below a millionth of a millimetre would differ from machine to machine.
                BinaryPrimitives.WriteSingleLittleEndian(six[(k * sizeof(float))..], (float)(Math.Round(values[k], 7) + 0.0));
            }
        }

        return Convert.ToBase64String(bytes);
    }

    private static void WriteColumns(Utf8JsonWriter json, double[] columns)
    {
        double largest = columns.Max(Math.Abs);
        double step = Math.Pow(2, Math.Ceiling(Math.Log2(largest / short.MaxValue)));
        byte[] bytes = new byte[columns.Length * sizeof(short)];
        for (int i = 0; i < columns.Length; i++)
        {
            BinaryPrimitives.WriteInt16LittleEndian(bytes.AsSpan(i * sizeof(short)), (short)Math.Round(columns[i] / step));
        }

        json.Number("step", step);
        json.WriteBase64String("columns", bytes);
    }

    // A target that looks at single tubes has a share for some of them.
    private IEnumerable<TargetResult> Limits() => _sized.Targets.Where(t => t.ByTube.Count > 0);

    private static string Stress(TubeForces forces)
    {
        string stress = string.Create(CultureInfo.InvariantCulture, $"{FixedDigits.Tenths(forces.MaxStress)} MPa");
        return forces.Use is { } use ? $"{stress}, {SizingModel.Percent(use.Share)} of yield" : stress;
    }

    private string MovesMost(CaseResult result)
    {
        (int node, Vector3 shift) = result.LargestDisplacement();
        return $"{_display.SmallLengthNumber(shift.Length)} {_display.LengthUnitName} at {_model.Nodes[node].Name}";
    }

    private static double? Rounded(double? ratio) => ratio is { } r && double.IsFinite(r) ? Math.Round(r, 6) : null;

    private static void Point(Utf8JsonWriter json, string name, Vector3 v) =>
        json.Numbers(name, Math.Round(v.X, 6) + 0.0, Math.Round(v.Y, 6) + 0.0, Math.Round(v.Z, 6) + 0.0);

    // Not the list writer of the files: its texts keep their <.
    private static void Texts(Utf8JsonWriter json, string name, IEnumerable<string> texts)
    {
        json.WriteStartArray(name);
        foreach (string text in texts)
        {
            json.WriteStringValue(text);
        }

        json.WriteEndArray();
    }

    // The writer's own escapes leave no < in it, so that no text can end the script element.
    private static string Text(Action<Utf8JsonWriter> write)
    {
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream))
        {
            json.WriteStartObject();
            write(json);
            json.WriteEndObject();
        }

        return Encoding.UTF8.GetString(stream.ToArray());
    }
}
