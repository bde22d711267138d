using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>Which sources a cylinder touches, and where each stands in its rows: the shared ones first, at one place in every cylinder.</summary>
/// <remarks>Most doubts are a cylinder's own repeats and resolutions; rows over all sources would be zeros for the greater part.</remarks>
internal sealed class SourceSlots
{
    private readonly int _sources;
    private readonly int[] _slots;
    private readonly double[][] _variances;

    /// <summary>Sorts a model's sources.</summary>
    public SourceSlots(EngineModel model)
    {
        _sources = model.Sources.Length;
        _slots = new int[model.Cylinders.Count * _sources];
        Array.Fill(_slots, -1);
        int[] touchedBy = new int[_sources];
        for (int cylinder = 0; cylinder < model.Cylinders.Count; cylinder++)
        {
            for (int input = 0; input < CylinderFigures<Real>.Count; input++)
            {
                foreach (Term term in model.DoubtsOf(cylinder, input))
                {
                    ref int slot = ref _slots[(cylinder * _sources) + term.Source];
                    touchedBy[term.Source] += slot < 0 ? 1 : 0;
                    slot = 0;
                }
            }
        }

        int[] shared = [.. Enumerable.Range(0, _sources).Where(source => touchedBy[source] > 1)];
        Shared = shared.Length;
        _variances = new double[model.Cylinders.Count][];
        for (int cylinder = 0; cylinder < _variances.Length; cylinder++)
        {
            int first = cylinder * _sources;
            int[] order = [.. shared, .. Enumerable.Range(0, _sources).Where(source => touchedBy[source] == 1 && _slots[first + source] == 0)];
            _variances[cylinder] = new double[order.Length];
            for (int slot = 0; slot < order.Length; slot++)
            {
                _slots[first + order[slot]] = slot;
                _variances[cylinder][slot] = model.Variances[order[slot]];
            }
        }
    }

    /// <summary>How many slots at the front hold sources that more than one cylinder touches.</summary>
    public int Shared { get; }

    /// <summary>The place of a source in a cylinder's rows, or −1 where it touches nothing there.</summary>
    public int Of(int cylinder, int source) => _slots[(cylinder * _sources) + source];

    /// <summary>u² of the source in each slot of a cylinder.</summary>
    public ReadOnlySpan<double> Variances(int cylinder) => _variances[cylinder];
}
