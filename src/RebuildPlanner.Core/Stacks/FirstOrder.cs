using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>First order: every output of every cylinder, its sensitivities to every source, covariance between cylinders and shares of the ratio.</summary>
/// <remarks>
/// One pass for every eight inputs that carry doubt, then the chain rule through their terms. The arrays are made once;
/// <see cref="Evaluate"/> allocates nothing. Source: jcgm100 (5.1, 5.2).
/// </remarks>
public sealed class FirstOrder
{
    /// <summary>How many things a share can count under.</summary>
    public const int WhatCount = (int)What.ValveSeat + 1;

    private const int Inputs = CylinderFigures<Real>.Count;
    private const int Outputs = CylinderStack<Real>.Count;

    // Outputs stand side by side, rounded up to whole registers: one multiplication serves eight of them.
    private const int Registers = (Outputs + Slopes.Count - 1) / Slopes.Count;
    private const int Width = Registers * Slopes.Count;

    private readonly EngineModel _model;
    private readonly int _cylinders;
    private readonly SourceSlots _slots;
    private readonly double[] _values;
    private readonly double[] _jacobian;
    private readonly double[][] _rows;
    private readonly double[] _covariances;
    private readonly double[] _shares;

    /// <summary>Makes room for a model's results and evaluates them.</summary>
    public FirstOrder(EngineModel model)
    {
        _model = model;
        _cylinders = model.Cylinders.Count;
        _slots = new SourceSlots(model);
        _values = new double[_cylinders * Outputs];
        _jacobian = new double[_cylinders * Inputs * Width];
        _rows = new double[_cylinders][];
        for (int cylinder = 0; cylinder < _cylinders; cylinder++)
        {
            _rows[cylinder] = new double[_slots.Variances(cylinder).Length * Width];
        }

        _covariances = new double[_cylinders * _cylinders * Width];
        _shares = new double[_cylinders * WhatCount];
        Evaluate();
    }

    /// <summary>The output at the estimates, coherent unit.</summary>
    public double Value(int cylinder, Output output) => _values[(cylinder * Outputs) + (int)output];

    /// <summary>Whether the output's figures are all there and make sense together: without clearance there is no ratio.</summary>
    public bool IsKnown(int cylinder, Output output) =>
        _model.Cylinders[cylinder].Known[(int)output] && double.IsFinite(Value(cylinder, output))
        && !(NeedsClearance(output) && Value(cylinder, Output.ClearanceVolume) <= 0.0);

    /// <summary>Whether an output is a quotient with the clearance volume below the line.</summary>
    public static bool NeedsClearance(Output output) => output is Output.CompressionRatio or Output.TrappedRatio or Output.CrankingPressure;

    /// <summary>Change of the output for a unit of each source, in a new array.</summary>
    public double[] Row(int cylinder, Output output)
    {
        double[] row = new double[_model.Sources.Length];
        for (int source = 0; source < row.Length; source++)
        {
            int slot = _slots.Of(cylinder, source);
            row[source] = slot < 0 ? 0.0 : _rows[cylinder][(slot * Width) + (int)output];
        }

        return row;
    }

    /// <summary>Change of the output for a unit of one input.</summary>
    public double Sensitivity(int cylinder, Output output, Input input) =>
        _jacobian[(((cylinder * Inputs) + (int)input) * Width) + (int)output];

    /// <summary>Covariance of one output between two cylinders, coherent unit squared.</summary>
    public double Covariance(Output output, int cylinder, int otherCylinder) =>
        _covariances[(((Math.Max(cylinder, otherCylinder) * _cylinders) + Math.Min(cylinder, otherCylinder)) * Width) + (int)output];

    /// <summary>Standard uncertainty of the output, coherent unit.</summary>
    public double StandardUncertainty(int cylinder, Output output) => Math.Sqrt(Covariance(output, cylinder, cylinder));

    /// <summary>Share of the ratio's variance that counts under one thing; they sum to 1.</summary>
    public double Share(int cylinder, What what) => _shares[(cylinder * WhatCount) + (int)what];

    /// <summary>Computes everything again from the model.</summary>
    public void Evaluate()
    {
        Array.Clear(_shares);
        for (int cylinder = 0; cylinder < _cylinders; cylinder++)
        {
            Differentiate(cylinder);
            Chain(cylinder);
            Covary(cylinder);
            ShareOut(cylinder);
        }
    }

    /// <summary>Sensitivities to the inputs, a register of inputs a pass.</summary>
    private void Differentiate(int cylinder)
    {
        _model.Values(cylinder, out CylinderFigures<Real> values);
        Span<int> seeded = stackalloc int[Slopes.Count];
        int input = 0;
        do
        {
            int count = 0;
            for (; input < Inputs && count < Slopes.Count; input++)
            {
                if (!_model.DoubtsOf(cylinder, input).IsEmpty)
                {
                    seeded[count++] = input;
                }
            }

            Pass(cylinder, values, seeded[..count]);
        }
        while (input < Inputs);
    }

    // On its own: taken into its caller, the compiler's patience with inlining ends in the middle of the formulas.
    [MethodImpl(MethodImplOptions.NoInlining)]
    private void Pass(int cylinder, in CylinderFigures<Real> values, ReadOnlySpan<int> seeded)
    {
        Unsafe.SkipInit(out CylinderFigures<Slopes> figures);
        for (int input = 0; input < Inputs; input++)
        {
            figures[input] = Slopes.From(values[input].Value);
        }

        for (int place = 0; place < seeded.Length; place++)
        {
            figures[seeded[place]] = Slopes.Seed(values[seeded[place]].Value, place);
        }

        CylinderStack<Slopes>.Compute(figures, _model.Cylinders[cylinder].Form, out CylinderStack<Slopes> stack);
        Span<double> slopes = stackalloc double[Slopes.Count];
        Span<double> jacobian = _jacobian.AsSpan(cylinder * Inputs * Width, Inputs * Width);
        for (int output = 0; output < Outputs; output++)
        {
            _values[(cylinder * Outputs) + output] = stack[output].Value;
            stack[output].Derivatives.CopyTo(slopes);
            for (int place = 0; place < seeded.Length; place++)
            {
                jacobian[(seeded[place] * Width) + output] = slopes[place];
            }
        }
    }

    /// <summary>The chain rule through the terms: sensitivities to the sources, of all outputs at once.</summary>
    private void Chain(int cylinder)
    {
        Span<Vector512<double>> rows = MemoryMarshal.Cast<double, Vector512<double>>(_rows[cylinder].AsSpan());
        ReadOnlySpan<Vector512<double>> jacobian =
            MemoryMarshal.Cast<double, Vector512<double>>(_jacobian.AsSpan(cylinder * Inputs * Width, Inputs * Width));
        rows.Clear();
        for (int input = 0; input < Inputs; input++)
        {
            foreach (Term term in _model.DoubtsOf(cylinder, input))
            {
                int slot = _slots.Of(cylinder, term.Source);
                for (int part = 0; part < Registers; part++)
                {
                    rows[(slot * Registers) + part] += jacobian[(input * Registers) + part] * term.Coefficient;
                }
            }
        }
    }

    private void ShareOut(int cylinder)
    {
        ReadOnlySpan<double> rows = _rows[cylinder];
        ReadOnlySpan<double> variances = _slots.Variances(cylinder);
        Span<double> shares = _shares.AsSpan(cylinder * WhatCount, WhatCount);
        double total = Covariance(Output.CompressionRatio, cylinder, cylinder);
        for (int input = 0; input < Inputs; input++)
        {
            double slope = Sensitivity(cylinder, Output.CompressionRatio, (Input)input);
            if (slope == 0.0)
            {
                continue;
            }

            foreach (Term term in _model.DoubtsOf(cylinder, input))
            {
                int slot = _slots.Of(cylinder, term.Source);
                shares[(int)term.What] +=
                    slope * term.Coefficient * rows[(slot * Width) + (int)Output.CompressionRatio] * variances[slot];
            }
        }

        double perUnit = total > 0.0 ? 1.0 / total : 0.0;
        for (int what = 0; what < WhatCount; what++)
        {
            shares[what] *= perUnit;
        }
    }

    /// <summary>Covariances with the cylinders before and with itself.</summary>
    private void Covary(int cylinder)
    {
        for (int other = 0; other <= cylinder; other++)
        {
            // Two cylinders vary together by what they share, and by that alone; with itself a cylinder shares everything.
            ReadOnlySpan<double> variances = other == cylinder ? _slots.Variances(cylinder) : _slots.Variances(cylinder)[.._slots.Shared];
            Propagation.Covariances(
                variances, _rows[cylinder], _rows[other], _covariances.AsSpan(((cylinder * _cylinders) + other) * Width, Width));
        }
    }
}
