"""Trials of an eight-cylinder engine as one would write them with numpy: whole arrays, one operation after another.

Argument: how many trials. Standard input: seeds, one a line. Standard output for each: seconds, then for each cylinder mean, standard deviation, 2.5 %
and 97.5 % limits of the ratio and the share above 9.6; last the same limits of the spread between the cylinders.
"""
import sys
import time

import numpy as np

TRIALS = int(sys.argv[1])
CYLINDERS = 8
QUARTER_PI = np.pi / 4.0

for line in sys.stdin:
    random = np.random.default_rng(int(line))
    begun = time.perf_counter()
    stroke = random.normal(78.0, 0.02, TRIALS)
    gasket = random.normal(1.20, 0.02, TRIALS)
    dish = random.normal(2000.0, 60.0, TRIALS)
    burette = random.normal(0.0, 80.0, TRIALS)
    micrometer = random.uniform(-0.004, 0.004, TRIALS)
    opening = random.uniform(82.3, 82.7, TRIALS)
    gasket_volume = QUARTER_PI * opening * opening * gasket
    answer, ratios = [], []
    for cylinder in range(CYLINDERS):
        bore = random.normal(81.0, 0.003, TRIALS) + micrometer
        chamber = random.normal(38000.0 + 50.0 * cylinder, 60.0, TRIALS) + burette
        deck = random.normal(0.20, 0.015, TRIALS)
        land_height = random.normal(5.0, 0.1, TRIALS)
        land_diameter = random.normal(80.5, 0.02, TRIALS)
        area = QUARTER_PI * bore * bore
        land = QUARTER_PI * (bore - land_diameter) * (bore + land_diameter) * land_height
        clearance = chamber + gasket_volume + area * deck + dish + land
        ratio = 1.0 + area * stroke / clearance
        low, high = np.quantile(ratio, [0.025, 0.975])
        answer += [ratio.mean(), ratio.std(), low, high, np.mean(ratio > 9.6)]
        ratios.append(ratio)
    spread = np.max(ratios, axis=0) - np.min(ratios, axis=0)
    answer += list(np.quantile(spread, [0.025, 0.975]))
    print(time.perf_counter() - begun, *answer, flush=True)
