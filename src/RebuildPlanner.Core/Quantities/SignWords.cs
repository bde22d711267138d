namespace RebuildPlanner.Core.Quantities;

/// <summary>Which closing words a quantity is written with, and what they do to its sign.</summary>
public enum SignWords
{
    /// <summary>No word; the number is not negative unless its range allows it.</summary>
    None,

    /// <summary>dish (+), dome (−), flat (zero only); one of them is required.</summary>
    Crown,

    /// <summary>below (+), proud (−), flush (zero only); one of them is required.</summary>
    Deck,

    /// <summary>proud (+), below (−), flush (zero only); no word means proud.</summary>
    Protrusion,

    /// <summary>ABDC or BBDC (−); required. The angle is kept after bottom dead centre.</summary>
    AfterBottom,

    /// <summary>BTDC or ATDC (−); required. The angle is kept before top dead centre.</summary>
    BeforeTop,
}
