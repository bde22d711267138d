"""The first-order figures of an engine by python3-uncertainties, timed: the rival of FirstOrder.Evaluate.

Usage: rival_first_order.py MODEL.json, written by the benchmark. Prints one JSON object.
The numbers with uncertainty are made once, before the clock starts, as the program's own model is. Of several
rounds the fastest counts, since what else the machine does only ever adds.
"""

import json
import math
import sys
import time

try:
    import uncertainties
    from uncertainties import covariance_matrix, ufloat, umath
except ImportError:
    print(json.dumps({"missing": True}))
    sys.exit(0)

OUTPUTS = ("Bore SweptVolume Chamber Gasket Deck Crown TopLand ClearanceVolume CompressionRatio "
           "TrappedRatio CrankingPressure PistonToHead").split()
QUARTER_PI = math.pi / 4
ISO_EXPONENT = 9.80665 / (287.05287 * 0.0065)
ROUNDS = 15


def build(model):
    """One ufloat a source; estimates as their linear sums; a figure without doubt stays a plain float."""
    sources = [ufloat(0.0, u) if u > 0 else None for u in model["u"]]
    estimates = {}

    def estimate(figure):
        key = figure["estimate"]
        if key not in estimates:
            total = figure["value"]
            for source, coefficient in figure["terms"]:
                if sources[source] is not None:
                    total = total + coefficient * sources[source]
            # Adding up is put off by the package until asked for; asked here, it is not in the time.
            getattr(total, "derivatives", None)
            estimates[key] = total
        return estimates[key]

    return sources, [{name: estimate(figure) for name, figure in cylinder.items()} for cylinder in model["cylinders"]]


def stack(f):
    """The figures of one cylinder, from the table of volumes and the slider-crank; the pin is not offset."""
    swept = QUARTER_PI * f["Bore"] ** 2 * f["Stroke"]
    gasket = QUARTER_PI * f["GasketOpening"] ** 2 * f["GasketThickness"]
    deck = QUARTER_PI * f["Bore"] ** 2 * f["Deck"]
    land = QUARTER_PI * (f["Bore"] ** 2 - f["TopLandDiameter"] ** 2) * f["TopLandHeight"]
    clearance = f["Chamber"] + gasket + deck + f["Crown"] + land + f["Pocket"]
    ratio = 1 + swept / clearance
    throw, rod, closing = f["Stroke"] / 2, f["RodLength"], f["Closing"]
    below = throw + rod + throw * umath.cos(closing) - umath.sqrt(rod ** 2 - (throw * umath.sin(closing)) ** 2)
    trapped = 1 + below / f["Stroke"] * (ratio - 1)
    ambient = 101.325 * (1 - 0.0065 / 288.15 * f["Altitude"]) ** ISO_EXPONENT
    cranking = ambient * (trapped ** f["CrankingExponent"] - 1)
    gap = f["GasketThickness"] + f["LeastDeck"] + f["HeadRecess"] - f["Rock"]
    return (f["Bore"], swept, f["Chamber"], gasket, deck, f["Crown"], land, clearance, ratio, trapped, cranking, gap)


def evaluate(cylinders):
    """What is timed: values and u of all outputs, covariance of each between the cylinders, shares of each ratio's variance."""
    stacks = [stack(cylinder) for cylinder in cylinders]
    values = [[y.nominal_value for y in outputs] for outputs in stacks]
    u = [[y.std_dev for y in outputs] for outputs in stacks]
    ratios = [outputs[OUTPUTS.index("CompressionRatio")] for outputs in stacks]
    covariance = [covariance_matrix([outputs[column] for outputs in stacks]) for column in range(len(OUTPUTS))]
    shares = []
    for ratio in ratios:
        parts = ratio.error_components()
        variance = sum(part * part for part in parts.values())
        shares.append({variable: part * part / variance for variable, part in parts.items()})
    return values, u, covariance, shares


def main():
    with open(sys.argv[1], encoding="utf-8") as file:
        sources, cylinders = build(json.load(file))
    best = math.inf
    for _ in range(ROUNDS):
        start = time.perf_counter()
        values, u, covariance, shares = evaluate(cylinders)
        best = min(best, time.perf_counter() - start)
    print(json.dumps({
        "version": uncertainties.__version__,
        "seconds": best,
        "outputs": OUTPUTS,
        "values": values,
        "u": u,
        "covariance": [[[float(c) for c in row] for row in matrix] for matrix in covariance],
        "shares": [[0.0 if s is None else share.get(s, 0.0) for s in sources] for share in shares],
    }))


main()
