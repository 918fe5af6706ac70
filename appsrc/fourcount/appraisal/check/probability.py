"""Whether a printed p is that of a known test, follows from the printed limits, and agrees with them on no effect."""

from __future__ import annotations

import math
from dataclasses import dataclass

from fourcount.appraisal.check.digits import bounds, rounds_to
from fourcount.appraisal.check.symmetry import Triple, symmetric, triple_of
from fourcount.appraisal.extras.printed import DIFFERENCES, RATIOS
from fourcount.appraisal.findings.check import Finding
from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.stats.normal import quantile, two_sided_p
from fourcount.stats.results import Fact

NO_EFFECT_AT_ZERO = frozenset((*DIFFERENCES, "relative_reduction"))
_DECIMALS_OF_ZERO = 2
_OTHER_TEST = 1.5
"""How many times larger or smaller a p may be than the limits say, since it may come from another test."""


@dataclass(frozen=True, kw_only=True, slots=True)
class Tested:
    """One test's key and its two-sided p of these counts."""

    key: str
    p: float


@dataclass(frozen=True, kw_only=True, slots=True)
class Implied:
    """The two-sided p that the printed digits give, and the least and the greatest that they allow."""

    least: float
    likely: float
    most: float


def p_findings(figure: PrintedFigure, tests: tuple[Tested, ...], level: float, shown: str = "") -> tuple[Finding, ...]:
    """What there is to say of the printed p; ``level`` is that of the limits beside it, ``shown`` the window's test.

    The p of a hazard ratio, or of an adjusted figure, is none of the table's.
    """
    if figure.p is None:
        return ()
    if figure.adjusted or figure.measure == "hazard_ratio":
        tests = ()
    tests = tuple(sorted(tests, key=lambda test: test.key != shown))
    beside = _beside_interval(figure, level)
    zero = (Finding(key="p-zero", facts={"half": bounds(figure.p)[1]}, agrees=True),) if figure.p.value == 0 else ()
    source = _source(figure, figure.p, tests, level, shown, contradicted=bool(beside))
    if beside:
        return (*zero, Finding(key="p-beside-interval", facts={**source.facts, **beside, "source": source.key}))
    return zero if zero and source.key == "p-unchecked" else (*zero, source)


def agrees(p: float, printed: PrintedNumber, figure: PrintedFigure) -> bool:
    """Whether a p prints so. No p is 0: one printed so with two decimals or more is less than half its last digit."""
    if printed.value == 0:
        return figure.p_relation == "=" and printed.decimals >= _DECIMALS_OF_ZERO and p < bounds(printed)[1]
    if figure.p_relation == "<":
        return p < printed.value
    return p > printed.value if figure.p_relation == ">" else rounds_to(p, printed)


def implied_p(triple: Triple, level: float) -> Implied | None:
    """What the printed estimate and limits say of p (Altman and Bland 2011, with exact normal tails)."""
    parts = (triple.estimate, triple.low, triple.high)
    ends = [bounds(part) for part in parts]
    if triple.log_scale:
        if min(end for pair in ends for end in pair) <= 0:
            return None
        ends = [(math.log(least), math.log(most)) for least, most in ends]
    centre = [math.log(part.value) if triple.log_scale else part.value for part in parts]
    estimate, low, high = ends
    widths = (high[0] - low[1], centre[2] - centre[1], high[1] - low[0])
    if widths[0] <= 0:
        return None
    nearest = 0.0 if estimate[0] <= 0 <= estimate[1] else min(abs(estimate[0]), abs(estimate[1]))
    farthest = max(abs(estimate[0]), abs(estimate[1]))
    twice = 2.0 * quantile(level)
    return Implied(
        least=two_sided_p(farthest * twice / widths[0]),
        likely=two_sided_p(centre[0] * twice / widths[1]),
        most=two_sided_p(nearest * twice / widths[2]),
    )


def _beside_interval(figure: PrintedFigure, level: float) -> dict[str, Fact]:
    """The facts of a p on one side of 1 - level beside limits on the other side of no effect; else none."""
    inside, below = _holds_no_effect(figure), _below(figure, 1.0 - level)
    if inside is None or below is None or figure.p is None or inside is not below:
        return {}
    return {"inside": int(inside), "level": level, "no_effect": _no_effect(figure)}


def _holds_no_effect(figure: PrintedFigure) -> bool | None:
    """Whether no effect lies within the printed limits; None where the digits do not tell."""
    if figure.low is None or figure.high is None:
        return None
    if figure.measure not in RATIOS and figure.measure not in NO_EFFECT_AT_ZERO:
        return None
    none, low, high = _no_effect(figure), bounds(figure.low), bounds(figure.high)
    if low[1] < none < high[0]:
        return True
    return False if low[0] > none or high[1] < none else None


def _no_effect(figure: PrintedFigure) -> int:
    return 1 if figure.measure in RATIOS else 0


def _below(figure: PrintedFigure, alpha: float) -> bool | None:
    """Whether the printed p is below alpha; None where its digits do not tell."""
    if figure.p is None:
        return None
    if figure.p_relation != "=":
        below = figure.p_relation == "<"
        told = figure.p.value <= alpha + 1e-12 if below else figure.p.value >= alpha - 1e-12
        return below if told else None
    least, most = bounds(figure.p)
    if most < alpha:
        return True
    return False if least > alpha else None


def _source(
    figure: PrintedFigure, p: PrintedNumber, tests: tuple[Tested, ...], level: float, shown: str, *, contradicted: bool
) -> Finding:
    fitting = tuple(test for test in tests if agrees(test.p, p, figure))
    if fitting:
        every = len(fitting) == len(tests) > 1
        facts: dict[str, Fact] = {"tests": "" if every else " ".join(test.key for test in fitting)}
        facts |= {"shown": int(not every and fitting[0].key == shown)}
        facts |= {"p": min(test.p for test in fitting), "p_most": max(test.p for test in fitting)}
        return Finding(key="p-reproduced", facts=facts, agrees=True)
    facts = {}
    triple = triple_of(figure)
    implied = implied_p(triple, level) if triple is not None and symmetric(triple) else None
    if implied is not None:
        facts["implied"] = implied.likely
        if not contradicted and _allows(implied, p, figure):
            return Finding(key="p-from-limits", facts={**facts, "level": level}, agrees=True)
    if tests:
        nearest = min(tests, key=lambda test: abs(math.log(max(test.p, 1e-300) / max(p.value, 1e-300))))
        facts |= {"nearest": nearest.key, "p": nearest.p}
    return Finding(key="p-differs" if facts else "p-unchecked", facts=facts, agrees=not facts)


def _allows(implied: Implied, p: PrintedNumber, figure: PrintedFigure) -> bool:
    """Whether the printed p may come with these limits, from this test or a similar one."""
    least, most = bounds(p)
    if figure.p_relation == "<":
        return implied.least < p.value
    if figure.p_relation == ">":
        return implied.most > p.value
    return implied.least / _OTHER_TEST <= most and least <= implied.most * _OTHER_TEST
