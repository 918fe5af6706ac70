"""What a printed effect is called, and for what it was adjusted."""

from __future__ import annotations

from fourcount.record.entry.readings import PrintedFigure, PrintedUnit
from fourcount.record.outcome import PAIRED_DESIGNS, Outcome
from fourcount.wording import names

PER_UNIT: dict[PrintedUnit, int] = {"one": 1, "percent": 100, "per-1000": 1_000}
NAMES = {
    "risk_ratio": "risk ratio",
    "odds_ratio": "odds ratio",
    "hazard_ratio": "hazard ratio",
    "rate_ratio": "rate ratio",
    "risk_difference": "risk difference",
    "rate_difference": "rate difference",
    "relative_reduction": "relative reduction",
    "number_needed": "number needed",
    "risk": "risk",
    "p": "p",
}
OF_PAIRS = {
    "odds_ratio": "{name} of the pairs",
    "risk_ratio": "{name} of the pairs",
    "risk_difference": "{name} of the pairs",
}
ADJUSTED = ", adjusted"


def paper_measure_name(key: str, outcome: Outcome) -> str:
    """A printed measure's name; in a survey ratio and difference are those of prevalences, in pairs those of pairs."""
    name = NAMES[key].replace("risk", names.risk_name(outcome), 1)
    if outcome.design not in PAIRED_DESIGNS or key not in OF_PAIRS:
        return name
    return OF_PAIRS[key].format(name=name)


def adjusted_words(outcome: Outcome, printed: PrintedFigure) -> str:
    """``, adjusted for age and sex``; ``, adjusted`` where only the print calls it so; else ""."""
    what = names.bare(outcome.adjusted_for_text)
    if what:
        return f"{ADJUSTED} for {what}"
    return ADJUSTED if printed.adjusted else ""
