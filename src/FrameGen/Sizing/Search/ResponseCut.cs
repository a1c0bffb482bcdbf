using FrameGen.Mechanics.Frames;
using FrameGen.Sizing.Analysis;
using FrameGen.Sizing.Program;

namespace FrameGen.Sizing.Search;

/// <summary>
/// Linear rows that every design which keeps a limit on a response satisfies, made from one analysed design.
/// </summary>
/// <remarks>
/// <para>Let q(x) = c(x) + a(x)ᵀK(x)⁻¹f(x), K(x) = Σ s(x) g gᵀ, a group's terms following its own option alone. For any two displacement fields u and z, by expanding,
/// q = c + aᵀu + zᵀf − zᵀK u + (a − K z)ᵀ K⁻¹ (f − K u): exact, whatever u and z are. The first terms are sums over groups of what their options give; the last is
/// at least −¼ ‖(a − K z)/σ − σ (f − K u)‖² in the norm of K⁻¹, for any σ &gt; 0, since pᵀr = ¼‖p/σ + σr‖² − ¼‖p/σ − σr‖².</para>
/// <para>With u = K̂⁻¹f̂ and z = K̂⁻¹â of a design x̂ the vector in that norm is Gᵀy, w = z/σ − σu, y = (k − k̂)/σ − (s − ŝ) gᵀw element by element, and
/// ‖Gᵀy‖² ≤ Σ y²/s, because K = GᵀSG makes (GᵀS½)ᵀK⁻¹(GᵀS½) a projection. That too is a sum over groups. So
/// Σ over groups of the options' terms ≤ limit holds in every design that keeps the limit, in the second order of its distance from x̂ as sharp as can be.</para>
/// <para>Where the response is along its own load, z ∥ u, σ makes w vanish: the row is the tangent of a convex function. σ⁴ = zᵀKz / uᵀKu makes w small in any case.</para>
/// <para>x̂ need not be a design: all stiffnesses are first scaled so that it meets the limit exactly, K̂ = κK, κ = q/limit. The row then touches where it matters.</para>
/// <para>Self weight: f − f̂ = Σ Δμ h, with ‖a + b‖² ≤ (1 + θ)‖a‖² + (1 + 1/θ)‖b‖² and ‖Σ Δμ h‖² ≤ n Σ Δμ² hᵀK⁻¹h over the n groups that vary, K the softest of all.</para>
/// </remarks>
internal sealed class ResponseCut(DesignSpace space, StructuralModel structure, StiffnessTable table, Weights weights)
{
    private const int Modes = StiffnessTable.Modes;

    // Far above what rounding does to the sums, far below what a size changes.
    private const double Room = 1e-8;

    private FrameSolution? _adjoint;
    private int _adjointSolver = -1;

    /// <summary>The row of a response, made from a design.</summary>
    /// <param name="design">The design; analysed as far as is needed.</param>
    /// <param name="response">The response, read off there.</param>
    /// <returns>Null where none can be made.</returns>
    public ProgramRow? Make(DesignAnalysis design, Response response)
    {
        LoadSet load = response.Load;
        FrameSolution actual = load.IsCase ? design.Case(load.Index) : design.Unit(load.Index);
        FrameSolution adjoint = Adjoint(design, response);
        Fields fields = Describe(design, response, actual, adjoint);
        if (!(fields.AdjointEnergy > 0 && fields.Work > 0 && fields.Kappa > 0 && double.IsFinite(fields.Kappa)))
        {
            return null;
        }

        (double kappa, double scaleZ) = (fields.Kappa, fields.ScaleZ);
        double constant = (response.Own is null ? fields.Value / kappa : 0) + (weights.Given(load, adjoint) * scaleZ) - (fields.Springs * scaleZ / kappa)
            - (0.25 * (1 + fields.Theta) * (kappa - 1) * (kappa - 1) * fields.SpringsOfW);
        double[] own = weights.Own(load, adjoint);
        var options = new double[OptionCount()];
        double size = Math.Abs(constant) + response.Limit;
        int place = 0;
        for (int g = 0; g < space.Groups; g++)
        {
            double largest = 0;
            double softest = load.IsCase ? weights.SoftestEnergy(load.Index)[g] : 0;
            for (int c = 0; c < space[g].Length; c++)
            {
                (double straight, double bent) = Terms(design, response, g, c, fields);
                straight += space[g][c].MassPerLength * own[g] * scaleZ;
                bent *= 1 + fields.Theta;
                if (fields.Theta > 0)
                {
                    double extra = space[g][c].MassPerLength - space[g][design.Choice[g]].MassPerLength;
                    bent += (1 + (1 / fields.Theta)) * fields.Sigma * fields.Sigma * weights.Varying * extra * extra * softest;
                }

                options[place++] = straight - (0.25 * bent);
                largest = Math.Max(largest, Math.Abs(straight));
            }

            size += largest;
        }

        return options.All(double.IsFinite) && double.IsFinite(size)
            ? new ProgramRow([.. Enumerable.Range(0, options.Length)], options, response.Limit - constant + (Room * size))
            : null;
    }

    private FrameSolution Adjoint(DesignAnalysis design, Response response)
    {
        int solver = response.Load.IsCase ? structure.Cases[response.Load.Index].Solver : structure.Units[response.Load.Index].Solver;
        _adjoint = design.Factored(solver).Solve(new BeamLoads(response.Functional, []), _adjointSolver == solver ? _adjoint : null);
        _adjointSolver = solver;
        return _adjoint;
    }

    private Fields Describe(DesignAnalysis design, Response response, FrameSolution actual, FrameSolution adjoint)
    {
        double[] u = table.StrainsOf(actual);
        double[] z = table.StrainsOf(adjoint);
        double work = weights.Given(response.Load, actual);
        double[] own = weights.Own(response.Load, actual);
        for (int g = 0; g < space.Groups; g++)
        {
            work += space[g][design.Choice[g]].MassPerLength * own[g];
        }

        double onActual = Work(response.Functional, actual);
        double onAdjoint = Work(response.Functional, adjoint);
        double value = onActual;
        for (int g = 0; g < space.Groups && response.Own is not null; g++)
        {
            value += response.Own.Constant(g, design.Choice[g]);
        }

        double kappa = response.Scale ?? (value / response.Limit);
        double scaleZ = response.GrowsWithStiffness ? 1 : 1 / kappa;

        // What springs resist with is the rest of the energy: the same in every design.
        (double zu, double zz, double uu) = Energies(design, z, u);
        double sigma = Math.Sqrt(scaleZ * kappa * Math.Sqrt(onAdjoint / work));
        double springs = onActual - zu;
        double springsOfW = (scaleZ * scaleZ * (onAdjoint - zz) / (sigma * sigma)) - (2 * scaleZ * springs / kappa) + (sigma * sigma * (work - uu) / (kappa * kappa));
        return new Fields(u, z, sigma, kappa, scaleZ, Theta(design, response, sigma, kappa, scaleZ, u, z))
        {
            Value = onActual,
            AdjointEnergy = onAdjoint,
            Work = work,
            Springs = springs,
            SpringsOfW = Math.Max(0, springsOfW),
        };
    }

    private static double Work(IReadOnlyList<NodalLoad> loads, FrameSolution field)
    {
        double work = 0;
        foreach (NodalLoad load in loads)
        {
            work += load.Force.Dot(field.Displacement(load.Node)) + load.Moment.Dot(field.Rotation(load.Node));
        }

        return work;
    }

    private int OptionCount()
    {
        int count = 0;
        for (int g = 0; g < space.Groups; g++)
        {
            count += space[g].Length;
        }

        return count;
    }

    private (double Zu, double Zz, double Uu) Energies(DesignAnalysis design, double[] z, double[] u)
    {
        (double zu, double zz, double uu) = (0, 0, 0);
        for (int g = 0; g < space.Groups; g++)
        {
            ReadOnlySpan<int> elements = table.Elements(g);
            ReadOnlySpan<double> s = table.Of(g, design.Choice[g]);
            for (int i = 0; i < elements.Length; i++)
            {
                for (int m = 0; m < Modes; m++)
                {
                    int k = (Modes * elements[i]) + m;
                    double stiffness = s[(Modes * i) + m];
                    zu += stiffness * z[k] * u[k];
                    zz += stiffness * z[k] * z[k];
                    uu += stiffness * u[k] * u[k];
                }
            }
        }

        return (zu, zz, uu);
    }

    // What an option of a group adds: the straight terms, and the square that is taken off.
    private (double Straight, double Bent) Terms(DesignAnalysis design, Response response, int group, int option, in Fields fields)
    {
        ReadOnlySpan<int> elements = table.Elements(group);
        ReadOnlySpan<double> s = table.Of(group, option);
        ReadOnlySpan<double> s0 = table.Of(group, design.Choice[group]);
        ReadOnlySpan<double> k = response.Own is { } own ? own.Factors(group, option) : [];
        ReadOnlySpan<double> k0 = response.Own is { } there ? there.Factors(group, design.Choice[group]) : [];
        (double straight, double bent) = (response.Own?.Constant(group, option) ?? 0, 0);
        (double kappa, double sigma) = (fields.Kappa, fields.Sigma);
        double perKappa = 1 / kappa;
        double scaleK = fields.ScaleZ * kappa;
        for (int i = 0; i < s.Length; i++)
        {
            int at = (Modes * elements[i / Modes]) + (i % Modes);
            double z = fields.Z[at] * fields.ScaleZ;
            double u = fields.U[at] * perKappa;
            double y = ((kappa * s0[i]) - s[i]) * ((z / sigma) - (sigma * u));
            straight -= s[i] * z * u;
            if (k.Length > 0)
            {
                straight += k[i] * u;
                y += (k[i] - (scaleK * k0[i])) / sigma;
            }

            if (y != 0)
            {
                bent += y * y / s[i];
            }
        }

        return (straight, bent);
    }

    // A share that balances the two squares where sizes change by some tenth.
    private double Theta(DesignAnalysis design, Response response, double sigma, double kappa, double scaleZ, double[] u, double[] z)
    {
        const double Change = 0.1;
        LoadSet load = response.Load;
        if (!load.IsCase)
        {
            return 0;
        }

        double[] softest = weights.SoftestEnergy(load.Index);
        (double bent, double weight) = (0, 0);
        for (int g = 0; g < space.Groups; g++)
        {
            double extra = Change * space[g][design.Choice[g]].MassPerLength;
            weight += sigma * sigma * weights.Varying * extra * extra * softest[g];
            ReadOnlySpan<int> elements = table.Elements(g);
            ReadOnlySpan<double> s = table.Of(g, design.Choice[g]);
            for (int i = 0; i < elements.Length; i++)
            {
                for (int m = 0; m < Modes; m++)
                {
                    int k = (Modes * elements[i]) + m;
                    double w = (scaleZ * z[k] / sigma) - (sigma * u[k] / kappa);
                    bent += Change * Change * kappa * s[(Modes * i) + m] * w * w;
                }
            }
        }

        return weight > 0 ? Math.Clamp(Math.Sqrt(weight / Math.Max(bent, 1e-30)), 1e-6, 1e6) : 0;
    }

    /// <summary>Strains of u and z in the design, σ, κ, what z is scaled by when stiffnesses are by κ, θ, and energies.</summary>
    private readonly record struct Fields(double[] U, double[] Z, double Sigma, double Kappa, double ScaleZ, double Theta)
    {
        /// <summary>aᵀu.</summary>
        public double Value { get; init; }

        /// <summary>aᵀz.</summary>
        public double AdjointEnergy { get; init; }

        /// <summary>fᵀu.</summary>
        public double Work { get; init; }

        /// <summary>What springs have of zᵀK u.</summary>
        public double Springs { get; init; }

        /// <summary>What springs have of wᵀK w, w scaled.</summary>
        public double SpringsOfW { get; init; }
    }
}
