"""The letters of a method's formula with the reader's numbers for them, and what they stand for."""

from __future__ import annotations

import math
from collections.abc import Mapping, Sequence

from fourcount.appraisal.findings import Counts, Figure, Interval, PairCounts, Rates, TimedRisks
from fourcount.stats.normal import quantile
from fourcount.stats.results import FractionalCounts
from fourcount.stats.risk import score_limits
from fourcount.wording.numbers import INFINITY, plain, quantity

Row = tuple[str, str]
Letters = Mapping[str, str]

USED = {
    ("risk", "wilson"): "x, n, p, z",
    ("risk", "wald"): "n, p, z",
    ("risk", "logit"): "x, n, z",
    ("risk", "clopper-pearson"): "x, n, alpha",
    ("risk_difference", "miettinen-nurminen"): "p1, p2, n1, n2, N, z",
    ("risk_difference", "wald"): "D, p1, p2, n1, n2, z",
    ("risk_ratio", "miettinen-nurminen"): "p1, p2, n1, n2, N, z",
    ("risk_ratio", "katz"): "R, a, n1, c, n2, z",
    ("odds_ratio", "miettinen-nurminen"): "a, c, n1, n2, m, N, z",
    ("odds_ratio", "woolf"): "a, b, c, d, z",
    ("odds_ratio", "conditional-exact"): "a, n1, n2, m, alpha",
    ("pair_difference", "newcombe"): "e, f, g, h, p1, l1, u1, p2, l2, u2, D, φ",
    ("pair_difference", "wald"): "f, g, n, D, z",
    ("pair_ratio", "bonett-price"): "e, f, g, m, A, B, C, l1, u1, l2, u2, z",
    ("pair_ratio", "log"): "e, f, g, R, z",
    ("pair_odds_ratio", "conditional-mid-p"): "f, g, alpha",
    ("pair_odds_ratio", "conditional-exact"): "f, g, alpha",
    ("pair_odds_ratio", "log"): "f, g, z",
    ("rate", "score"): "x, t, z",
    ("rate", "wald"): "x, t, z",
    ("rate", "exact"): "x, t, alpha",
    ("rate_difference", "miettinen-nurminen"): "x1, t1, x2, t2, z",
    ("rate_difference", "wald"): "D, x1, t1, x2, t2, z",
    ("rate_ratio", "score"): "x1, t1, x2, t2, z",
    ("rate_ratio", "exact"): "x1, t1, x2, t2, alpha",
    ("rate_ratio", "log"): "R, x1, x2, z",
    ("timed_difference", "square-and-add"): "D, p1, l1, u1, p2, l2, u2",
    ("timed_ratio", "square-and-add"): "R, p1, l1, u1, p2, l2, u2",
    ("pooled_risk_difference", "sato"): "D, W, ΣP, ΣQ, z",
    ("pooled_risk_ratio", "greenland-robins"): "R, V of R, z",
    ("pooled_odds_ratio", "robins-breslow-greenland"): "O, V of O, z",
}
"""The letters of the formula of every method that a family shows, in the order in which they are told."""

ON_TRIAL = {
    "risk_difference": "D0, P1 and P2 are found by trial",
    "risk_ratio": "R0, P1 and P2 are found by trial",
    "odds_ratio": "psi, P1 and P2 are found by trial",
    "rate_difference": "D0, R1 and R2 are found by trial",
}
TWO_GROUPS = "1 is the index group, 2 the reference group"
MEANINGS = {
    "risk": "x events among n people; p = x/n",
    "rate": "x events in the time t",
    "pair": "1 is the index side, 2 the reference side; e have the event on both, f on the index side only, g on the "
    "reference side only, h on neither",
    "rate_": f"{TWO_GROUPS}; x events in the time t",
    "timed": f"{TWO_GROUPS}; l and u are the printed limits",
    "pooled": "Σ adds up what each stratum gives",
    "": TWO_GROUPS,
}
ABCD = "a and b: with and without the event in the one, c and d: in the other"
ALL_WITH = "m: all with the event"
WILSON = "l and u are the limits of Wilson’s formula"


def letter_rows(measure: str, figure: Figure, counts: object, level: float) -> list[Row]:
    """Every letter of the shown method's formula with its number, and what the letters are; none without limits.

    ``counts`` are those of the form: events and people (or time) of one group, the counts of two, pairs, or strata.
    """
    used = USED.get((measure, figure.method), "")
    if not used or not isinstance(figure.interval, Interval):
        return []
    letters = {**_letters(counts, level, measure), **_of_level(level)}
    named = ((name.split(" ")[0], letters[name]) for name in used.split(", ") if name in letters)
    told = ", ".join(f"{name} = {number}" for name, number in named)
    return [("With", told), ("Letters", _meaning(measure, figure.method, used))]


def _meaning(measure: str, method: str, used: str) -> str:
    if measure in MEANINGS:
        return MEANINGS[measure]
    kind = next((key for key in ("pair", "rate_", "timed", "pooled") if measure.startswith(key)), "")
    names = used.split(", ")
    parts = (
        MEANINGS[kind],
        ABCD if not kind and "a" in names else "",
        ALL_WITH if not kind and "m" in names else "",
        WILSON if kind == "pair" and "l1" in names else "",
        ON_TRIAL.get(measure, "") if method == "miettinen-nurminen" else "",
    )
    return "; ".join(part for part in parts if part)


def _of_level(level: float) -> Letters:
    return {"z": plain(quantile(level)), "alpha": quantity(1 - level)}


def _letters(counts: object, level: float, measure: str) -> Letters:
    if isinstance(counts, PairCounts):
        return _of_pairs(counts, level, measure)
    if isinstance(counts, Rates):
        return _of_rates(counts)
    if isinstance(counts, TimedRisks):
        return _of_timed(counts)
    if isinstance(counts, FractionalCounts):
        return _of_counts(counts)
    if measure.startswith("pooled") and isinstance(counts, Sequence):
        return _of_strata(counts)
    return _of_one(*counts) if isinstance(counts, tuple) else {}


def _of_one(events: float, people: float) -> Letters:
    """A single risk, or a single rate."""
    share = f"{quantity(events)}/{quantity(people)} = {_quotient(events, people)}"
    return {"x": quantity(events), "n": quantity(people), "t": quantity(people), "p": share}


def _of_counts(t: FractionalCounts) -> Letters:
    a, b, c, d = t.index_events, t.index_non_events, t.reference_events, t.reference_non_events
    n1, n2 = a + b, c + d
    numbers = {"a": a, "b": b, "c": c, "d": d, "n1": n1, "n2": n2, "m": a + c, "N": n1 + n2}
    return {
        **{name: quantity(number) for name, number in numbers.items()},
        "p1": f"{quantity(a)}/{quantity(n1)} = {_quotient(a, n1)}",
        "p2": f"{quantity(c)}/{quantity(n2)} = {_quotient(c, n2)}",
        "D": plain(a / n1 - c / n2),
        "R": _quotient(a * n2, c * n1),
    }


def _of_pairs(pairs: PairCounts, level: float, measure: str) -> Letters:
    e, f, g, h, n = pairs.both, pairs.index_only, pairs.reference_only, pairs.neither, pairs.total
    first, second, some, z = e + f, e + g, e + f + g, quantile(level)
    letters = {name: quantity(x) for name, x in {"e": e, "f": f, "g": g, "h": h, "n": n, "m": some}.items()}
    people = n
    if measure == "pair_ratio":
        people = some
        shares = {
            "A": math.sqrt((f + g + 2) / ((first + 1) * (second + 1))),
            "B": math.sqrt((g + 1) / ((some + 2) * (first + 1))),
            "C": math.sqrt((f + 1) / ((some + 2) * (second + 1))),
        }
        letters |= {name: plain(share) for name, share in shares.items()}
        z *= shares["A"] / (shares["B"] + shares["C"])
    for side, events in (("1", first), ("2", second)):
        wilson = score_limits(events, people, z) if people else None
        letters |= {f"p{side}": f"{quantity(events)}/{quantity(people)} = {_quotient(events, people)}"}
        letters |= {f"l{side}": plain(wilson.low), f"u{side}": plain(wilson.high)} if wilson else {}
    return letters | {"D": _quotient(f - g, n), "R": _quotient(first, second), "φ": plain(_correlation(pairs))}


def _correlation(pairs: PairCounts) -> float:
    """Newcombe's phi: how often the sides agree, with his correction where it is positive."""
    e, f, g, h = pairs.both, pairs.index_only, pairs.reference_only, pairs.neither
    margins = (e + f) * (g + h) * (e + g) * (f + h)
    across = e * h - f * g
    corrected = max(across - pairs.total / 2, 0.0) if across > 0 else across
    return corrected / math.sqrt(margins) if margins else 0.0


def _of_rates(rates: Rates) -> Letters:
    x1, t1, x2, t2 = rates.index_events, rates.index_time, rates.reference_events, rates.reference_time
    return {
        **{name: quantity(number) for name, number in {"x1": x1, "t1": t1, "x2": x2, "t2": t2}.items()},
        "D": plain(x1 / t1 - x2 / t2),
        "R": _quotient(x1 * t2, x2 * t1),
    }


def _of_timed(timed: TimedRisks) -> Letters:
    one, two = timed.index, timed.reference
    risks = {"p1": one.risk, "l1": one.low, "u1": one.high, "p2": two.risk, "l2": two.low, "u2": two.high}
    return {
        **{name: plain(number) for name, number in risks.items()},
        "D": plain(one.risk - two.risk),
        "R": _quotient(one.risk, two.risk),
    }


def _of_strata(strata: Sequence[Counts]) -> Letters:
    """The sums of Sato's, Greenland and Robins's, and Robins, Breslow and Greenland's formulas."""
    parts = [_parts(t) for t in strata if t.index_total and t.reference_total]
    sums = {name: math.fsum(part[name] for part in parts) for name in (parts[0] if parts else ())}
    if not sums:
        return {}
    up, down, r, s = sums["up"], sums["down"], sums["R"], sums["S"]
    letters = {name: plain(sums[name]) for name in ("W", "ΣP", "ΣQ")}
    letters |= {"D": _quotient(sums["DW"], sums["W"]), "R": _quotient(up, down), "O": _quotient(r, s)}
    if up and down:
        letters["V of R"] = plain(sums["apart"] / (up * down))
    if r and s:
        squares = sums["PR"] / (2 * r * r) + sums["PS + QR"] / (2 * r * s) + sums["QS"] / (2 * s * s)
        letters["V of O"] = plain(squares)
    return letters


def _parts(t: Counts) -> dict[str, float]:
    """One stratum's part of each sum."""
    a, b, c, d = t.index_events, t.index_non_events, t.reference_events, t.reference_non_events
    n1, n2, n = t.index_total, t.reference_total, t.total
    r, s, p, q = a * d / n, b * c / n, (a + d) / n, (b + c) / n
    return {
        "DW": (a * n2 - c * n1) / n,
        "W": n1 * n2 / n,
        "ΣP": (n1 * n1 * c - n2 * n2 * a + n1 * n2 * (n2 - n1) / 2) / (n * n),
        "ΣQ": (a * d + b * c) / (2 * n),
        "up": a * n2 / n,
        "down": c * n1 / n,
        "apart": ((a + c) * n1 * n2 - a * c * n) / (n * n),
        "R": r,
        "S": s,
        "PR": p * r,
        "PS + QR": p * s + q * r,
        "QS": q * s,
    }


def _quotient(numerator: float, denominator: float) -> str:
    if denominator:
        return plain(numerator / denominator)
    return INFINITY
