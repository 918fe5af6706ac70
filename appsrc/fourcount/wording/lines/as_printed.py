"""Figures that stand only in the print, in the digits of the print: no zero is added that the paper does not have."""

from __future__ import annotations

import math
import re

from fourcount.appraisal.extras.printed import adjusted_of, read_effect
from fourcount.appraisal.findings import Figure, Gap, Interval, OutcomeFindings, PrintedFigure
from fourcount.record.entry.readings import PrintedNumber
from fourcount.record.outcome import EffectOnly, Outcome, RiskAtTime
from fourcount.wording import limits, names, numbers
from fourcount.wording.form import given
from fourcount.wording.lines.text import estimate_text, interval_text
from fourcount.wording.lines.words import KINDS
from fourcount.wording.printed import PER_UNIT

SHIFTS = {"one": 2, "percent": 0, "per-1000": -1}
"""By how many places the point moves from a printed risk difference to one per 100."""

NUMBER = re.compile(r"\d+(?:[.,·]\d+)?")
SAME = 1e-9

Texts = tuple[str, str]
"""An estimate and its interval."""


def effect_texts(key: str, outcome: Outcome, figure: Figure, findings: OutcomeFindings) -> Texts:
    """A printed effect; what was turned round, or rebuilt from a p, is computed and has our digits."""
    return _texts(key, given(findings), outcome, figure)


def carried_texts(key: str, outcome: Outcome, figure: Figure, *, adjusted: bool = False) -> Texts:
    """An effect that is carried to a patient, in the digits of the print where it stands only there."""
    if isinstance(outcome.table, EffectOnly):
        printed = read_effect(outcome.paper_text, outcome.paper_measure, "paper_text").figure
    else:
        printed = adjusted_of(outcome).figure if adjusted else None
    return _texts(key, printed, outcome, figure)


def _texts(key: str, printed: object, outcome: Outcome, figure: Figure) -> Texts:
    per = PER_UNIT[printed.unit] if isinstance(printed, PrintedFigure) and key == "rate_difference" else 1
    ours = estimate_text(key, figure, per), interval_text(key, figure, per)
    turned = (outcome.index_group == "second") != (outcome.counted == "right")
    if turned or not isinstance(printed, PrintedFigure) or isinstance(figure.estimate, Gap):
        return ours
    shift = SHIFTS[printed.unit] if key == "risk_difference" else 0
    estimate = ours[0] if printed.estimate is None else _number(printed.estimate, shift, key)
    return estimate, _limits(printed, figure, shift, key) or ours[1]


def _number(number: PrintedNumber, shift: int, key: str) -> str:
    """``9.7``; of a difference ``7.9 fewer``."""
    digits = _digits(number, shift)
    sided = "difference" in KINDS.get(key, "") and number.value != 0
    return f"{digits} {limits.side(number.value)}" if sided else digits


def _digits(number: PrintedNumber, shift: int) -> str:
    if math.isinf(number.value):
        return numbers.INFINITY
    return numbers.fixed(abs(number.value) * 10**shift, max(0, number.decimals - shift))


def _limits(printed: PrintedFigure, figure: Figure, shift: int, key: str) -> str:
    """Both printed limits; "" where they are not printed, or are not those that are shown."""
    low, high, interval = printed.low, printed.high, figure.interval
    if low is None or high is None or not isinstance(interval, Interval):
        return ""
    if "difference" not in KINDS.get(key, ""):
        return f"{_digits(low, shift)}{numbers.TO}{_digits(high, shift)}"
    return limits.sided(interval, figure.estimate, lambda x: _digits(low if x == interval.low else high, shift))


def risk_texts(group: names.Group, outcome: Outcome, figure: Figure) -> Texts:
    """A printed risk and its limits with the decimals that were typed, of either outcome."""
    key = f"risk_{group}"
    ours = estimate_text(key, figure), interval_text(key, figure)
    if not isinstance(outcome.table, RiskAtTime) or isinstance(figure.estimate, Gap):
        return ours
    first = (group == "index") == (outcome.index_group == "first")
    table = outcome.table
    cells = (
        (table.first_left_text, table.first_right_text) if first else (table.second_left_text, table.second_right_text)
    )
    estimate = _as_typed(" ".join(cells), figure.estimate, outcome)
    interval = ours[1]
    if isinstance(figure.interval, Interval):
        low, high = (_as_typed(" ".join(cells), x, outcome) for x in (figure.interval.low, figure.interval.high))
        interval = f"{low}{numbers.TO}{high}%" if low and high else interval
    return (f"{estimate}%" if estimate else ours[0]), interval


def _as_typed(text: str, shown: float, outcome: Outcome) -> str:
    """A risk in hundredths with the decimals of the number that it was typed as; "" where it was not one."""
    value = shown if outcome.counted == "left" else 1 - shown
    for match in NUMBER.finditer(text):
        digits = match.group().replace("·", ".").replace(",", ".")
        decimals = len(digits.partition(".")[2])
        if abs(float(digits) / 100 - value) < SAME:
            return numbers.fixed_percent(shown, decimals)
    return ""
