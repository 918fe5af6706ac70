"""One invented outcome of every form of print: falls on a ward, as papers might print them."""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.record.outcome import (
    CELLS,
    Design,
    EffectOnly,
    EventsOfTotal,
    Outcome,
    Pairs,
    PaperMeasure,
    Patient,
    PercentOfTotal,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
)

WORDS = {
    "name_text": "Falls",
    "first_label_text": "Night lights",
    "second_label_text": "Usual care",
    "left_words_text": "fell at least once",
    "right_words_text": "did not fall",
    "span_text": "12 months",
}
Rows = Sequence[tuple[str, int, int, int, int]]
"""Strata: a label, index events of all, reference events of all."""

ALIKE: Rows = (("under 65", 10, 200, 22, 190), ("65 and over", 28, 212, 48, 219))
CONFOUNDED: Rows = (("mild", 2, 40, 8, 160), ("severe", 48, 160, 12, 40))
"""Within each stratum the risks are the same, and thrown together they are 25% against 10%."""


def cells(*texts: object) -> dict[str, str]:
    """The four cells in the print's order."""
    return dict(zip(CELLS, map(str, texts), strict=True))


def of_total(counts: Sequence[object] = (38, 412, 70, 409), **fields: object) -> Outcome:
    """Four counts as ``38 of 412``."""
    return Outcome(table=EventsOfTotal(**cells(*counts)), **{**WORDS, **fields})


def percent_of_total(**fields: object) -> Outcome:
    return Outcome(table=PercentOfTotal(**cells("9.2%", 412, "17.1%", 409)), **{**WORDS, **fields})


def paired(design: Design = "paired", counts: Sequence[object] = (30, 20, 40, 110), **fields: object) -> Outcome:
    """Pairs: both, night lights only, usual care only, neither."""
    return Outcome(table=Pairs(**cells(*counts)), **{**WORDS, "design": design, **fields})


def person_time(
    counts: Sequence[object] = (38, "4,120", 70, "4,090"), unit: str = "person-years", **fields: object
) -> Outcome:
    table = PersonTime(**cells(*counts), unit_text=unit)
    return Outcome(table=table, **{**WORDS, "design": "cohort", **fields})


def at_time(
    texts: Sequence[str] = ("9.2%", "6.8 to 12.4", "17.1%", "13.8 to 21.1"), level: str = "", **fields: object
) -> Outcome:
    return Outcome(table=RiskAtTime(**cells(*texts), limits_level_text=level), **{**WORDS, **fields})


def effect_only(
    measure: PaperMeasure = "hazard_ratio", text: str = "0.72 (0.55 to 0.92)", risk: str = "", **fields: object
) -> Outcome:
    patient = Patient(starting_risk_text=risk)
    words = {**WORDS, "paper_measure": measure, "paper_text": text, "patient": patient}
    return Outcome(table=EffectOnly(), **{**words, **fields})


def strata(design: Design = "cohort", rows: Rows = ALIKE, risk: str = "", **fields: object) -> Outcome:
    table = Strata(strata=tuple(Stratum(label_text=label, **cells(*counts)) for label, *counts in rows))
    return Outcome(table=table, **{**WORDS, "design": design, "patient": Patient(starting_risk_text=risk), **fields})


EVERY_FORM: dict[str, Outcome] = {
    "events-of-total": of_total(),
    "percent-of-total": percent_of_total(),
    "pairs": paired(),
    "matched": paired("matched"),
    "before-after": paired("before-after"),
    "pairs-that-differ": paired("matched", ("", 20, 40, "")),
    "person-time": person_time(),
    "risk-at-time": at_time(),
    "effect-only": effect_only(),
    "odds-only": effect_only("odds_ratio", risk="12%", adjusted_for_text="age"),
    "risk-ratio-only": effect_only("risk_ratio", risk="12%"),
    "difference-only": effect_only("risk_difference", "-7.9% (-12.6 to -3.3)"),
    "strata": strata(risk="12%"),
    "case-control-strata": strata("case-control", risk="12%"),
}
