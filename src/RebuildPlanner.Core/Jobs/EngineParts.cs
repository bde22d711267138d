using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Which parts stand round each cylinder at each stage, and which cuts were made to them.</summary>
/// <remarks>
/// A plan counts as taken when something is fitted or cut at the planned stage. When the engine has been machined, a cut made takes the
/// place of the same cut planned: they are one operation, not two.
/// </remarks>
public sealed class EngineParts
{
    private readonly Job _job;
    private readonly Stage _asked;
    private readonly Dictionary<string, PistonSet> _pistons;
    private readonly Dictionary<string, GasketChoice> _gaskets;
    private readonly string[] _banks;
    private readonly Head[] _heads;

    /// <summary>Looks at a job from a stage.</summary>
    public EngineParts(Job job, Stage asked)
    {
        _job = job;
        _asked = asked;
        _pistons = job.Pistons.ToDictionary(piston => piston.Id);
        _gaskets = job.Gaskets.ToDictionary(gasket => gasket.Id);
        _banks = [.. job.Engine.Labels.Select(label => job.Engine.Banks.First(bank => bank.Cylinders.Contains(label)).Label)];
        _heads = [.. job.Engine.Labels.Select(label => job.Engine.Heads.First(head => head.Cylinders.Contains(label)))];
        bool planTaken = job.Cuts.Any(cut => cut.Stage == Stage.Planned) || job.Fitted.Any(fitted => fitted.Stage == Stage.Planned);
        Stages = [.. Enum.GetValues<Stage>()
            .Where(stage => stage <= asked && (stage != Stage.Planned || asked == Stage.Planned || planTaken))];
    }

    /// <summary>The stages whose figures may count, earliest first, the asked one last.</summary>
    public IReadOnlyList<Stage> Stages { get; }

    /// <summary>The stage before one of these, or null for the first.</summary>
    public Stage? Before(Stage stage)
    {
        Stage? before = null;
        foreach (Stage earlier in Stages)
        {
            if (earlier == stage)
            {
                break;
            }

            before = earlier;
        }

        return before;
    }

    /// <summary>The cylinder's label.</summary>
    public string Label(int cylinder) => _job.Engine.Labels[cylinder];

    /// <summary>The label of the cylinder's bank.</summary>
    public string Bank(int cylinder) => _banks[cylinder];

    /// <summary>The cylinder's head.</summary>
    public Head Head(int cylinder) => _heads[cylinder];

    /// <summary>Whether a place takes in a cylinder.</summary>
    public bool Covers(Place place, int cylinder) =>
        (place.Cylinder is null || place.Cylinder == Label(cylinder))
        && (place.Head is null || place.Head == Head(cylinder).Label)
        && (place.Bank is null || place.Bank == Bank(cylinder));

    /// <summary>The piston in a cylinder at a stage, and since when that very piston has been there.</summary>
    public FittedPart<PistonSet>? Piston(int cylinder, Stage at) => Part(cylinder, at, fitted => fitted.Piston, _pistons);

    /// <summary>The gasket over a cylinder at a stage, and since when.</summary>
    public FittedPart<GasketChoice>? Gasket(int cylinder, Stage at) => Part(cylinder, at, fitted => fitted.Gasket, _gaskets);

    /// <summary>The cuts of one kind that touch a cylinder at a stage, with their place in the job.</summary>
    public IEnumerable<(int Index, Cut Cut)> Cuts(CutKind kind, int cylinder, Stage at) =>
        CutsAt(kind, cylinder, at).Where(_ => !(at == Stage.Planned && _asked == Stage.AsMachined && CutsAt(kind, cylinder, _asked).Any()));

    private IEnumerable<(int Index, Cut Cut)> CutsAt(CutKind kind, int cylinder, Stage at)
    {
        for (int index = 0; index < _job.Cuts.Count; index++)
        {
            Cut cut = _job.Cuts[index];
            if (cut.Kind == kind && cut.Stage == at && Covers(cut.Place, cylinder))
            {
                yield return (index, cut);
            }
        }
    }

    private FittedPart<TPart>? Part<TPart>(int cylinder, Stage at, Func<Fitted, string?> id, Dictionary<string, TPart> parts)
        where TPart : class
    {
        FittedPart<TPart>? current = null;
        foreach (Stage stage in Stages.TakeWhile(stage => stage <= at))
        {
            // The narrowest entry of a stage counts: one for this cylinder before one for its head before one for all; then the later one.
            Fitted? entry = _job.Fitted
                .Where(fitted => fitted.Stage == stage && id(fitted) is not null
                    && Covers(new Place(fitted.Cylinder, Head: fitted.Head), cylinder))
                .OrderBy(fitted => (fitted.Cylinder is null ? 0 : 2) + (fitted.Head is null ? 0 : 1))
                .LastOrDefault();
            if (entry is null)
            {
                continue;
            }

            bool stays = current is not null && current.Id == id(entry) && (entry.Piece is null || current.Piece is null || current.Piece == entry.Piece);
            current = stays
                ? current! with { Piece = entry.Piece ?? current.Piece }
                : new FittedPart<TPart>(id(entry)!, parts[id(entry)!], stage, entry.Piece);
        }

        return current;
    }
}

/// <summary>A part in the engine.</summary>
/// <typeparam name="TPart">Piston set or gasket.</typeparam>
/// <param name="Id">Its id.</param>
/// <param name="Part">The part.</param>
/// <param name="Since">The stage it was fitted at and has stayed from.</param>
/// <param name="Piece">Which piece of a piston set.</param>
public sealed record FittedPart<TPart>(string Id, TPart Part, Stage Since, string? Piece);
