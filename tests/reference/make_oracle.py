"""Make oracle.json.gz: 2,000 random tables and what libraries, or 50 digits, give for them.

    python tests/reference/make_oracle.py

takes some ten minutes, prints the counts of refusals and of disagreements, and writes the file beside itself.
The tests only read the file. Where a library refuses a table, the same method at 50 digits takes its place; on a
sample of 300 tables every method is also computed at 50 digits, so that the libraries' own accuracy is known.
"""

from __future__ import annotations

import gzip
import json
import math
import platform
import random
from collections import Counter
from collections.abc import Callable
from fractions import Fraction
from importlib.metadata import version
from pathlib import Path
from typing import Any

from fifty_digits import conditional, difference, odds, ratio, risk
from libraries import LIBRARIES, Pair, RefusedError, Table, ask

SEED = 20261201
TABLES = 2000
SAMPLE = 300
LARGEST_GROUP = 200
DESCRIPTION = (
    "tables: index events and non-events, reference events and non-events, level. answers: the library's figure per "
    "table, 13 digits, null where it refuses. refusals: how many tables, by reason. exact: the figure at 50 digits of "
    "a sample of 300 and of every refused table, by number of the table, 15 digits, null where the method gives none. "
    "largest_difference: relative, between the library and 50 digits, where both are stored."
)
TARGET = Path(__file__).parent / "oracle.json.gz"

Exact = Callable[[Table], Any]


def _of_risk(function: Callable[..., Any]) -> Exact:
    return lambda table: function(table[0], table[0] + table[1], table[4])


def _score(function: Callable[..., Any], factor: bool) -> Exact:
    return lambda table: function(*table, factor)


def _estimate(table: Table) -> Any:
    return conditional.Hypergeometric(*table[:4]).estimate()


EXACT: dict[str, Exact] = {
    "risk/wald": _of_risk(risk.wald_risk),
    "risk/wilson": _of_risk(risk.wilson),
    "risk/wilson-continuity": _of_risk(risk.wilson_continuity),
    "risk/agresti-coull": _of_risk(risk.agresti_coull),
    "risk/clopper-pearson": _of_risk(risk.clopper_pearson),
    "risk/mid-p": _of_risk(risk.mid_p),
    "risk/jeffreys": _of_risk(risk.jeffreys),
    "risk_difference/wald": lambda table: difference.wald_difference(*table),
    "risk_difference/newcombe": lambda table: difference.newcombe(*table),
    "risk_difference/newcombe-continuity": lambda table: difference.newcombe_continuity(*table),
    "risk_difference/agresti-caffo": lambda table: difference.agresti_caffo(*table),
    "risk_difference/miettinen-nurminen": _score(difference.score_difference, True),
    "risk_difference/mee": _score(difference.score_difference, False),
    "risk_ratio/katz": lambda table: ratio.katz(*table),
    "risk_ratio/miettinen-nurminen": _score(ratio.score_ratio, True),
    "risk_ratio/koopman": _score(ratio.score_ratio, False),
    "odds_ratio/woolf": lambda table: odds.woolf(*table),
    "odds_ratio/gart": lambda table: odds.gart(*table),
    "odds_ratio/miettinen-nurminen": _score(odds.score_odds, True),
    "odds_ratio/cornfield": _score(odds.score_odds, False),
    "odds_ratio/conditional-exact": lambda table: conditional.conditional_exact(*table),
    "odds_ratio/conditional-mid-p": lambda table: conditional.conditional_mid_p(*table),
    "odds_ratio/baptista-pike-mid-p": lambda table: conditional.baptista_pike_mid_p(*table),
    "conditional-odds-ratio": _estimate,
    "test/fisher": lambda table: conditional.fisher(*table[:4]),
    "test/fisher-mid-p": lambda table: conditional.fisher_mid_p(*table[:4]),
    "test/pearson": lambda table: conditional.pearson(*table[:4]),
    "test/n-minus-1": lambda table: conditional.pearson(*table[:4], n_minus_1=True),
}
"""Every method, at 50 digits or as an exact fraction."""


def random_tables(seed: int = SEED, count: int = TABLES) -> list[Table]:
    """Distinct tables: small and large groups, rare, even and certain events, zeros and empty columns among them."""
    chance = random.Random(seed)
    seen: dict[Table, None] = {}
    while len(seen) < count:
        largest = chance.choice((8, 30, 100, LARGEST_GROUP, LARGEST_GROUP))
        n1, n2 = chance.randint(1, largest), chance.randint(1, largest)
        a, c = _events(chance, n1), _events(chance, n2)
        kind = chance.random()
        if kind < 0.02:
            a = c = 0
        elif kind < 0.04:
            a, c = n1, n2
        elif kind < 0.12:
            a = chance.choice((0, n1))
        elif kind < 0.20:
            c = chance.choice((0, n2))
        level = 0.95 if chance.random() < 0.7 else chance.choice((0.8, 0.9, 0.99))
        seen[(a, n1 - a, c, n2 - c, level)] = None
    return list(seen)


def _events(chance: random.Random, total: int) -> int:
    risk_drawn = chance.choice((0.02, 0.1, 0.3, 0.5, 0.8, 0.97, chance.random()))
    return sum(chance.random() < risk_drawn for _ in range(total))


def _stored(value: Any, digits: int) -> Any:
    """A figure as the file keeps it: rounded, infinity as a string, a pair as a list, none as null."""
    if value is None:
        return None
    if isinstance(value, tuple | list):
        return [_stored(part, digits) for part in value]
    if isinstance(value, Fraction):
        value = value.numerator / value.denominator
    number = float(value)
    return "inf" if math.isinf(number) else float(f"{number:.{digits}g}")


def _difference(stored: Any, exact: Any) -> float:
    """The largest relative difference of a figure's parts where both sides have one, to no less than 1e-6."""
    if stored is None or exact is None:
        return 0.0
    if isinstance(stored, list):
        return max(_difference(one, other) for one, other in zip(stored, exact, strict=True))
    first, second = float(stored), float(exact)
    if first == second:
        return 0.0
    return abs(first - second) / max(abs(second), 1e-6)


def column(key: str, tables: list[Table], sample: set[int]) -> dict[str, Any]:
    """One method: the library's figures, its refusals, and the figures at 50 digits of sample and refusals."""
    library = LIBRARIES.get(key)
    refusals: Counter[str] = Counter()
    answers: list[Pair | float | None] = []
    for table in tables if library else ():
        try:
            answers.append(_stored(ask(library, table), 13))  # type: ignore[arg-type]
        except RefusedError as reason:
            refusals[str(reason)] += 1
            answers.append(None)
    wanted = {index for index, answer in enumerate(answers) if answer is None} | sample
    exact = {index: _stored(EXACT[key](tables[index]), 15) for index in sorted(wanted)}
    apart = max((_difference(answers[index], exact[index]) for index in exact if answers), default=0.0)
    print(f"{key:38} refused {sum(refusals.values()):5} {dict(refusals)}  largest difference {apart:.1e}", flush=True)
    return {
        "library": library.call if library else None,
        "refusals": dict(refusals),
        "largest_difference": float(f"{apart:.1e}"),
        "answers": answers,
        "exact": exact,
    }


def main() -> None:
    tables = random_tables()
    sample = set(random.Random(SEED + 1).sample(range(len(tables)), SAMPLE))
    zero = sum(0 in table[:4] for table in tables)
    empty = sum(table[0] == table[2] == 0 or table[1] == table[3] == 0 for table in tables)
    print(f"{len(tables)} tables, {zero} with a zero cell, {empty} with an empty column")
    columns = {key: column(key, tables, sample) for key in EXACT}
    document = {
        "command": "python tests/reference/make_oracle.py",
        "seed": SEED,
        "versions": {
            "python": platform.python_version(),
            **{name: version(name) for name in ("numpy", "scipy", "statsmodels", "mpmath")},
        },
        "description": DESCRIPTION,
        "with_a_zero_cell": zero,
        "with_an_empty_column": empty,
        "tables": tables,
        "columns": columns,
    }
    text = json.dumps(document, separators=(",", ":"))
    TARGET.write_bytes(gzip.compress(text.encode(), mtime=0))
    print(f"{TARGET.name}: {TARGET.stat().st_size} bytes")


if __name__ == "__main__":
    main()
