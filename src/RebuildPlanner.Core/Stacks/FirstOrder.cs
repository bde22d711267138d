using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>First order: every output of every cylinder, its sensitivities to every source, covariance between cylinders and shares of the ratio.</summary>
/// <remarks>
/// One dual pass for each input that carries doubt, then the chain rule through its terms. The arrays are made once;
/// <see cref="Evaluate"/> allocates nothing. Source: jcgm100 (5.1, 5.2).
/// </remarks>
public sealed class FirstOrder
{
    /// <summary>How many things a share can count under.</summary>
    public const int WhatCount = (int)What.ValveSeat + 1;

    private const int Inputs = CylinderFigures<Real>.Count;
    private const int Outputs = CylinderStack<Real>.Count;

    private readonly EngineModel _model;
    private readonly int _sources;
    private readonly int _cylinders;
    private readonly double[] _values;
    private readonly double[] _jacobian;
    private readonly double[] _rows;
    private readonly double[] _covariances;
    private readonly double[] _shares;

    /// <summary>Makes room for a model's results and evaluates them.</summary>
    public FirstOrder(EngineModel model)
    {
        _model = model;
        _sources = model.Sources.Length;
        _cylinders = model.Cylinders.Count;
        _values = new double[_cylinders * Outputs];
        _jacobian = new double[_cylinders * Outputs * Inputs];
        _rows = new double[_cylinders * Outputs * _sources];
        _covariances = new double[Outputs * _cylinders * _cylinders];
        _shares = new double[_cylinders * WhatCount];
        Evaluate();
    }

    /// <summary>The output at the estimates, coherent unit.</summary>
    public double Value(int cylinder, Output output) => _values[(cylinder * Outputs) + (int)output];

    /// <summary>Change of the output for a unit of each source.</summary>
    public ReadOnlySpan<double> Row(int cylinder, Output output) => RowSpan(cylinder, (int)output);

    /// <summary>Change of the output for a unit of one input.</summary>
    public double Sensitivity(int cylinder, Output output, Input input) =>
        _jacobian[(((cylinder * Outputs) + (int)output) * Inputs) + (int)input];

    /// <summary>Covariance of one output between two cylinders, coherent unit squared.</summary>
    public double Covariance(Output output, int cylinder, int otherCylinder) =>
        _covariances[((((int)output * _cylinders) + cylinder) * _cylinders) + otherCylinder];

    /// <summary>Standard uncertainty of the output, coherent unit.</summary>
    public double StandardUncertainty(int cylinder, Output output) => Math.Sqrt(Covariance(output, cylinder, cylinder));

    /// <summary>Share of the ratio's variance that counts under one thing; they sum to 1.</summary>
    public double Share(int cylinder, What what) => _shares[(cylinder * WhatCount) + (int)what];

    /// <summary>Computes everything again from the model.</summary>
    public void Evaluate()
    {
        Array.Clear(_rows);
        Array.Clear(_jacobian);
        Array.Clear(_shares);
        for (int cylinder = 0; cylinder < _cylinders; cylinder++)
        {
            Differentiate(cylinder);
            ShareOut(cylinder);
        }

        for (int output = 0; output < Outputs; output++)
        {
            Covary(output);
        }
    }

    private void Differentiate(int cylinder)
    {
        CylinderForm form = _model.Cylinders[cylinder].Form;
        _model.Values(cylinder, out CylinderFigures<Real> values);
        CylinderFigures<Dual<Real>> duals = default;
        for (int input = 0; input < Inputs; input++)
        {
            duals[input] = new Dual<Real>(values[input], default);
        }

        CylinderStack<Real>.Compute(values, form, out CylinderStack<Real> plain);
        for (int output = 0; output < Outputs; output++)
        {
            _values[(cylinder * Outputs) + output] = plain[output].Value;
        }

        for (int input = 0; input < Inputs; input++)
        {
            ReadOnlySpan<Term> terms = _model.TermsOf(cylinder, input);
            if (terms.IsEmpty)
            {
                continue;
            }

            duals[input] = new Dual<Real>(values[input], Real.From(1.0));
            CylinderStack<Dual<Real>>.Compute(duals, form, out CylinderStack<Dual<Real>> stack);
            duals[input] = new Dual<Real>(values[input], default);
            for (int output = 0; output < Outputs; output++)
            {
                double slope = stack[output].Derivative.Value;
                if (slope == 0.0)
                {
                    continue;
                }

                _jacobian[(((cylinder * Outputs) + output) * Inputs) + input] = slope;
                Span<double> row = RowSpan(cylinder, output);
                foreach (Term term in terms)
                {
                    row[term.Source] += slope * term.Coefficient;
                }
            }
        }
    }

    private void ShareOut(int cylinder)
    {
        ReadOnlySpan<double> row = RowSpan(cylinder, (int)Output.CompressionRatio);
        ReadOnlySpan<double> variances = _model.Variances;
        Span<double> shares = _shares.AsSpan(cylinder * WhatCount, WhatCount);
        double total = 0.0;
        for (int input = 0; input < Inputs; input++)
        {
            double slope = Sensitivity(cylinder, Output.CompressionRatio, (Input)input);
            if (slope == 0.0)
            {
                continue;
            }

            foreach (Term term in _model.TermsOf(cylinder, input))
            {
                double part = slope * term.Coefficient * row[term.Source] * variances[term.Source];
                shares[(int)term.What] += part;
                total += part;
            }
        }

        for (int what = 0; total > 0.0 && what < WhatCount; what++)
        {
            shares[what] /= total;
        }
    }

    private void Covary(int output)
    {
        for (int cylinder = 0; cylinder < _cylinders; cylinder++)
        {
            for (int other = 0; other <= cylinder; other++)
            {
                double covariance = Propagation.Covariance(_model.Sources, RowSpan(cylinder, output), RowSpan(other, output));
                _covariances[(((output * _cylinders) + cylinder) * _cylinders) + other] = covariance;
                _covariances[(((output * _cylinders) + other) * _cylinders) + cylinder] = covariance;
            }
        }
    }

    private Span<double> RowSpan(int cylinder, int output) => _rows.AsSpan(((cylinder * Outputs) + output) * _sources, _sources);
}
