using System.Security.Cryptography;
using FrameGen.Diagnostics;
using FrameGen.Model.Resolving;
using FrameGen.Spec;

namespace FrameGen.Model;

/// <summary>Gives a spec its meaning: evaluates, mirrors, binds names, splits tubes, lists candidates.</summary>
public static class ModelResolver
{
    /// <summary>Resolves a spec. All that is wrong with it is reported, not just the first.</summary>
    /// <param name="spec">As written.</param>
    /// <param name="diagnostics">Takes errors, warnings and notes, each with its place, in the order of the text.</param>
    /// <returns>The model, or null when an error was reported.</returns>
    public static FrameModel? Resolve(FrameSpec spec, DiagnosticList diagnostics) => Resolve(spec, newGroupsChoose: false, diagnostics);

    /// <summary>Resolves a spec beside which sizes may be pinned.</summary>
    /// <param name="spec">As written.</param>
    /// <param name="newGroupsChoose">True where groups without a pinned size may choose one; else that is an error.</param>
    /// <param name="diagnostics">As for any spec.</param>
    /// <returns>The model, or null when an error was reported.</returns>
    public static FrameModel? Resolve(FrameSpec spec, bool newGroupsChoose, DiagnosticList diagnostics)
    {
        var found = new DiagnosticList();
        FrameModel? model = ResolveAll(spec, newGroupsChoose, found);
        foreach (Diagnostic diagnostic in TextOrder.Sort(found, spec.Files.Select(f => f.Path)))
        {
            diagnostics.Add(diagnostic);
        }

        return model;
    }

    private static FrameModel? ResolveAll(FrameSpec spec, bool newGroupsChoose, DiagnosticList diagnostics)
    {
        var values = new SpecValues(ParameterTable.Evaluate(spec.Parameters, diagnostics), diagnostics);
        var reflection = Reflection.Of(spec.Mirror, diagnostics);
        (Fabrication Fabrication, double Gap)? shop = FabricationResolver.Resolve(spec.Fabrication, values);

        var materials = new MaterialTable(spec.Materials, values);
        var stock = new StockTable(spec.Stock, materials, values);
        IReadOnlyList<RackTube> have = RackResolver.Resolve(spec.Have, materials, values);
        TubeGroup?[] groups = GroupResolver.Resolve(spec.Groups, materials, stock, values);

        if (spec.Mirror is not null && reflection is null)
        {
            // Without its twins no other name would be found.
            return null;
        }

        Frame frame = PlaceFrame(spec, reflection, shop?.Gap ?? 0, values);
        var groupNames = NameIndex.Of("group", spec.Groups.Select(g => g.Name), diagnostics);
        int?[] groupOfTube = BindGroups(frame, groupNames);
        var frozen = spec.Frozen is null ? null : new FrozenGroups(spec.Frozen, stock, values);
        TubeGroup?[] free = groups;
        groups = frozen?.Pin(spec.Groups, groupNames, free, groupOfTube.ToHashSet(), newGroupsChoose) ?? groups;
        MeasuredSizes.Apply(spec.Measured, groupNames, groups, values);
        WarnOfUnusedGroups(spec.Groups, groupOfTube, diagnostics);

        var supports = SupportResolver.Of(spec.Supports, frame);
        IReadOnlyList<CarriedMass> masses = MassResolver.Resolve(spec.Masses, frame);
        LoadCase?[] cases = CaseResolver.Resolve(spec.Cases, frame, supports, out NameIndex caseNames);
        Target?[] bound = BindTargets(spec, frame, caseNames, supports, groupNames, groups, groupOfTube);
        IReadOnlyList<JointRequest> joints = JointResolver.Resolve(spec.Joints, frame);
        PriceCheck.Run(spec.Sizing, groups, groupOfTube, diagnostics);

        if (diagnostics.HasErrors || shop is null)
        {
            return null;
        }

        var used = UsedGroups.Of(groups, groupOfTube);
        var model = new FrameModel(
            Identify(spec),
            spec.Display,
            ModelBuilder.Nodes(frame),
            ModelBuilder.Tubes(frame, used),
            used.Groups,
            supports.All,
            masses,
            [.. cases.Select(c => c!)],
            [.. bound.Select(t => used.Renumber(t!))],
            joints,
            shop.Value.Fabrication)
        {
            Have = have,
            Sizing = spec.Sizing,
            Stock = StockOf(used.Groups, stock),
        };
        return frozen is null ? model : model with { Frozen = frozen.Describe(spec.Files[0], Free(model, free, groups, groupOfTube)) };
    }

    // The frame as it would be sized without pins; what the spec gives is as it is, measured or not.
    private static FrameModel Free(FrameModel model, TubeGroup?[] written, TubeGroup?[] pinned, int?[] groupOfTube)
    {
        TubeGroup?[] groups = [.. written.Zip(pinned, (free, fixedSize) => free is { IsFixed: true } ? fixedSize : free)];
        return model with { Groups = UsedGroups.Of(groups, groupOfTube).Groups };
    }

    private static StockVersion[] StockOf(IReadOnlyList<TubeGroup> groups, StockTable stock) =>
    [
        .. groups
            .SelectMany(g => g.Candidates)
            .Select(c => c.StockList)
            .Where(l => l.Length > 0)
            .Distinct(StringComparer.Ordinal)
            .Select(l => new StockVersion(l, stock.VersionOf(l)!)),
    ];

    private static Frame PlaceFrame(FrameSpec spec, Reflection? mirror, double gap, SpecValues values)
    {
        if (spec.Tubes.Count == 0)
        {
            values.Diagnostics.Error(null, "the spec has no tubes; write tubes, for example: tubes: {rail: {from: a, to: b, group: rails}}");
        }

        var draft = FrameDraft.Of(spec, mirror, values);
        var nodes = NodePlacement.Of(draft, mirror, values);
        if (mirror is not null)
        {
            PlaneCheck.Run(draft, nodes, mirror, values.Diagnostics);
        }

        PlacedTube?[] tubes = TubePlacement.Of(draft, nodes, mirror, gap, values);
        NearnessCheck.Run(draft, nodes, tubes, mirror, values.Diagnostics);
        return new Frame(draft, nodes, tubes, mirror, values);
    }

    private static int?[] BindGroups(Frame frame, NameIndex groupNames)
    {
        var groups = new int?[frame.Draft.Tubes.Count];
        for (int tube = 0; tube < groups.Length; tube++)
        {
            TubeDraft draft = frame.Draft.Tubes[tube];
            groups[tube] = draft.Original is { } original
                ? groups[original]
                : groupNames.Find(draft.Spec.Group, $"tube {draft.Name}", frame.Diagnostics);
        }

        return groups;
    }

    private static Target?[] BindTargets(
        FrameSpec spec,
        Frame frame,
        NameIndex caseNames,
        SupportResolver supports,
        NameIndex groupNames,
        TubeGroup?[] groups,
        int?[] groupOfTube)
    {
        var targets = new TargetResolver(
            frame,
            caseNames,
            supports,
            new MemberTargets(frame, groupNames, groupOfTube, spec.Targets),
            new StrengthTargets(frame, caseNames, spec.Groups, groups, groupNames, groupOfTube),
            new StabilityTargets(frame, caseNames, supports, groups, groupOfTube));
        return [.. spec.Targets.Select((target, index) => targets.Resolve(index, target))];
    }

    private static void WarnOfUnusedGroups(IReadOnlyList<GroupSpec> specs, int?[] groupOfTube, DiagnosticList diagnostics)
    {
        var used = new HashSet<int?>(groupOfTube);
        for (int group = 0; group < specs.Count; group++)
        {
            if (!used.Contains(group))
            {
                diagnostics.Warning(specs[group].Name.At, $"group {specs[group].Name.Value} has no tubes and is left out");
            }
        }
    }

    private static SpecIdentity Identify(FrameSpec spec)
    {
        SourceFile root = spec.Files[0];
        string title = spec.Title.Length > 0 ? spec.Title : Path.GetFileNameWithoutExtension(root.Path);
        return new SpecIdentity(
            spec.Files,
            spec.Includes,
            Path.GetFileName(root.Path),
            Convert.ToHexStringLower(SHA256.HashData(root.Bytes.Span)),
            title,
            spec.Revision,
            spec.Notes)
        {
            Frozen = spec.Frozen?.File,
        };
    }
}
