using FrameGen.Diagnostics;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace FrameGen.Spec.Yaml;

/// <summary>
/// Composes a file's values from the events of the YAML parser. The parser's own tree gives aliases the place of their
/// anchor, lets the last of two equal keys win and follows any depth; this one keeps every place and every bound.
/// </summary>
internal sealed class YamlComposer
{
    /// <summary>Deepest nesting of lists and maps.</summary>
    public const int DeepestNesting = 32;

    /// <summary>Most nodes that all aliases of a file may stand for.</summary>
    public const int MostAliasedNodes = 10_000;

    /// <summary>Most nodes of a file, those of aliases included: several times what the largest frame needs.</summary>
    public const int MostNodes = 400_000;

    private readonly string _file;
    private readonly Scanner _scanner;
    private readonly Parser _parser;
    private readonly ProblemList _problems;
    private readonly Dictionary<string, (YamlNode Node, int Size)> _anchors = new(StringComparer.Ordinal);
    private int _depth;
    private int _nodes;
    private int _aliasedNodes;

    private YamlComposer(string file, string text, ProblemList problems)
    {
        _file = file;
        _scanner = new Scanner(new StringReader(text));
        _parser = new Parser(_scanner);
        _problems = problems;
    }

    /// <summary>Composes a file of one document.</summary>
    /// <param name="file">Its name in messages.</param>
    /// <param name="text">Its text, without a byte order mark.</param>
    /// <param name="problems">Keys written twice are added here.</param>
    /// <exception cref="YamlProblem">The file is no YAML, empty, or beyond a bound.</exception>
    public static YamlNode Compose(string file, string text, ProblemList problems)
    {
        try
        {
            return new YamlComposer(file, text, problems).Document();
        }
        catch (YamlException wrong)
        {
            throw YamlSyntax.Explain(file, text, wrong);
        }
    }

    private YamlNode Document()
    {
        Next();
        Next();
        if (_parser.Current is not DocumentStart)
        {
            throw new YamlProblem(new SourcePlace(_file, 1, 1), "the file is empty; a spec begins with `framegen: 1`");
        }

        Next();
        YamlNode root = Node();
        Next();
        if (_parser.Current is DocumentStart second)
        {
            throw new YamlProblem(PlaceOf(second), "a second document begins here; a spec is one document, so remove the `---`");
        }

        return root is YamlScalar { IsNothing: true }
            ? throw new YamlProblem(root.At, "the file is empty; a spec begins with `framegen: 1`")
            : root;
    }

    /// <summary>Composes the node whose first event is the current one, and moves behind it.</summary>
    private YamlNode Node()
    {
        ParsingEvent first = _parser.Current!;
        SourcePlace at = PlaceOf(first);
        if (first is AnchorAlias alias)
        {
            return Aliased(alias, at);
        }

        if (++_nodes > MostNodes)
        {
            throw new YamlProblem(at, $"the file holds more than {MostNodes} values; no frame needs so many");
        }

        if (first is NodeEvent { Tag.IsEmpty: false } tagged)
        {
            _problems.Error(at, $"the tag '{tagged.Tag}' has no meaning in a spec; remove it");
        }

        int nodesBefore = _nodes - 1;
        YamlNode node = first switch
        {
            YamlDotNet.Core.Events.Scalar scalar => Scalar(scalar, at),
            SequenceStart => Nested(at, Sequence),
            MappingStart => Nested(at, Mapping),
            _ => throw new YamlProblem(at, "expected a value here"),
        };

        // Only now: an alias inside its own anchor would make a value that contains itself.
        if (first is NodeEvent { Anchor.IsEmpty: false } anchored)
        {
            _anchors[anchored.Anchor.Value] = (node, _nodes - nodesBefore);
        }

        return node;
    }

    private YamlNode Aliased(AnchorAlias alias, SourcePlace at)
    {
        if (!_anchors.TryGetValue(alias.Value.Value, out (YamlNode Node, int Size) target))
        {
            throw new YamlProblem(at, $"unknown anchor '{alias.Value.Value}'{NearestName.Suggest(alias.Value.Value, _anchors.Keys.Order(StringComparer.Ordinal))}");
        }

        // Sizes of anchors count the aliases inside them, so that aliases of aliases add up to what they expand to.
        _aliasedNodes += target.Size;
        _nodes += target.Size;
        if (_aliasedNodes > MostAliasedNodes)
        {
            throw new YamlProblem(at, $"aliases expand to more than {MostAliasedNodes} values; write some of them out, or use parameters");
        }

        Next();
        return target.Node with { At = at };
    }

    private YamlScalar Scalar(YamlDotNet.Core.Events.Scalar scalar, SourcePlace at)
    {
        bool isPlain = scalar.Style == ScalarStyle.Plain;
        int quotes = scalar.Style is ScalarStyle.SingleQuoted or ScalarStyle.DoubleQuoted ? 1 : 0;

        // Escapes, folded lines, anchors and tags make the piece of the file longer than the text.
        bool isAsWritten = scalar.Start.Line == scalar.End.Line
            && scalar.Style is ScalarStyle.Plain or ScalarStyle.SingleQuoted or ScalarStyle.DoubleQuoted
            && scalar.End.Index - scalar.Start.Index == scalar.Value.Length + (2 * quotes);
        Next();
        return new YamlScalar(at, scalar.Value, isPlain, isAsWritten ? at.Column + quotes : null);
    }

    private YamlNode Nested(SourcePlace at, Func<SourcePlace, YamlNode> compose)
    {
        if (++_depth > DeepestNesting)
        {
            throw new YamlProblem(at, $"nested deeper than {DeepestNesting} levels; a spec needs fewer than ten");
        }

        Next();
        YamlNode node = compose(at);
        Next();
        _depth--;
        return node;
    }

    private YamlSequence Sequence(SourcePlace at)
    {
        var items = new List<YamlNode>();
        while (_parser.Current is not SequenceEnd)
        {
            items.Add(Node());
        }

        return new YamlSequence(at, items);
    }

    private YamlMapping Mapping(SourcePlace at)
    {
        var entries = new List<YamlEntry>();
        var merges = new List<YamlEntry>();
        var places = new Dictionary<string, SourcePlace>(StringComparer.Ordinal);
        while (_parser.Current is not MappingEnd)
        {
            SourcePlace keyAt = PlaceOf(_parser.Current!);
            if (_parser.Current is not YamlDotNet.Core.Events.Scalar)
            {
                throw new YamlProblem(keyAt, "a key must be a word; in { } a value may need quotes, as in \"{...}\"");
            }

            var key = (YamlScalar)Node();
            YamlNode value = Node();
            if (key is { IsPlain: true, Text: "<<" })
            {
                merges.Add(new YamlEntry(key, value));
            }
            else if (places.TryGetValue(key.Text, out SourcePlace? first))
            {
                _problems.Error(keyAt, $"the key {key.Words} is written twice; it stands already in line {first.Line}");
            }
            else
            {
                places.Add(key.Text, keyAt);
                entries.Add(new YamlEntry(key, value));
            }
        }

        foreach (YamlEntry merge in merges)
        {
            Merge(merge, entries, places);
        }

        return new YamlMapping(at, entries);
    }

    /// <summary>Takes in another map's entries; own keys, and those of maps named before, win.</summary>
    private void Merge(YamlEntry merge, List<YamlEntry> entries, Dictionary<string, SourcePlace> places)
    {
        IReadOnlyList<YamlNode> sources = merge.Value is YamlSequence list ? list.Items : [merge.Value];
        foreach (YamlNode source in sources)
        {
            if (source is not YamlMapping map)
            {
                _problems.Error(source.At, $"`<<` takes in keys with values, as in `<<: *name`, not {source.Words}");
                continue;
            }

            entries.AddRange(map.Entries.Where(entry => places.TryAdd(entry.Key.Text, entry.Key.At)));
        }
    }

    private SourcePlace PlaceOf(ParsingEvent e) => new(_file, (int)e.Start.Line, (int)e.Start.Column);

    private void Next()
    {
        try
        {
            _parser.MoveNext();
        }
        catch (Exception wrong) when (wrong is InvalidOperationException or ArgumentException or IndexOutOfRangeException or FormatException or OverflowException)
        {
            // The scanner has states that it did not foresee, such as a value that begins with a colon inside [ ].
            Mark mark = _scanner.CurrentPosition;
            throw YamlSyntax.NotYaml(_file, (int)mark.Line, (int)mark.Column, "nothing can begin with this character here");
        }
    }
}
