"""How long the check of a print takes, nothing remembered, for random tables and for prints that search the most.

check.py LARGEST: the seconds of the slowest table with counts to LARGEST, of the first one, and of loading numpy before
it, which the window does in a thread at its start.
"""

from __future__ import annotations

import json
import random
import statistics
import sys
import time

from fourcount.appraisal.check import check
from fourcount.record.outcome import CELLS, EventsAndOthers, Outcome
from fourcount.record.paper import Choices

PRINTS = (
    "RR 1.00 (95% CI, 0.50 to 2.00; P = 0.03)",  # at no effect every measure fits from every side
    "OR 1.0 (0.8 to 1.3), P < 0.001",
    "aOR 2.3; 90% CI 1.1, 4.8",
    "RR 0.54 (0.37 to 0.87); OR 0.49 (0.32 to 0.75); risk difference -7.9 percentage points (-12.5 to -3.3); NNT 13",
    "9.3% vs 17.1% (P = 0.04)",
)


def outcomes(largest: int, count: int = 20) -> list[Outcome]:
    """Random tables, and such as have nearly equal risks, each with each print."""
    chance = random.Random(12)
    found = []
    for place in range(count):
        a, b, c, d = (chance.randint(1, largest) for _ in range(4))
        if place % 2:
            c, d = max(1, a + chance.randint(-1, 1)), b
        cells = dict(zip(CELLS, map(str, (a, b, c, d)), strict=True))
        found += [Outcome(table=EventsAndOthers(**cells), paper_text=text) for text in PRINTS]
    return found


def main() -> None:
    start = time.perf_counter()
    import fourcount.stats.conditional  # noqa: F401 - loads numpy

    loading, times = time.perf_counter() - start, []
    for outcome in outcomes(int(sys.argv[1])):
        start = time.perf_counter()
        check(outcome, Choices())
        times.append(time.perf_counter() - start)
    print(json.dumps({"loading": loading, "first": times[0], "most": max(times), "median": statistics.median(times)}))


if __name__ == "__main__":
    main()
