"""Outcomes for the patient's pages: a trial, a harm, a welcome outcome, a case-control study and more; invented."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.outcome import CELLS, EffectOnly, EventsAndOthers, Outcome, Patient
from fourcount.wording.example import worked_example


def of_counts(outcome: Outcome, counts: tuple[int, int, int, int], **changes: object) -> Outcome:
    """The outcome with other counts (in the print's order) and other fields."""
    return replace(outcome, table=EventsAndOthers(**dict(zip(CELLS, map(str, counts), strict=True))), **changes)


TRIAL = replace(worked_example().outcomes[0], plain_event_text="", plain_other_text="")
AT_TWELVE = replace(TRIAL, patient=Patient(starting_risk_text="12%"))
HARM = of_counts(
    TRIAL,
    (15, 85, 5, 95),
    name_text="Bleeding",
    left_words_text="bled",
    left_heading_text="",
    right_words_text="did not bleed",
    right_heading_text="",
)
WELCOME = of_counts(
    TRIAL,
    (60, 40, 45, 55),
    name_text="Healing",
    left_words_text="healed",
    left_heading_text="",
    right_words_text="did not heal",
    right_heading_text="",
    left_welcome=True,
    span_text="12 weeks",
)
SMALL = of_counts(TRIAL, (26, 974, 24, 976))
TINY = of_counts(TRIAL, (3, 999_997, 1, 999_999))
CASE_CONTROL = replace(AT_TWELVE, design="case-control", first_label_text="Night work", second_label_text="Day work")
HAZARD = replace(
    TRIAL,
    table=EffectOnly(),
    paper_measure="hazard_ratio",
    paper_text="0.72 (0.55 to 0.92)",
    patient=Patient(starting_risk_text="20%"),
)
LONG = replace(
    TRIAL,
    first_label_text="a treatment with a name that goes on and on, twice a day with meals and a glass of water",
    left_words_text="had a fall that needed a visit to hospital, a scan or an operation",
    name_text="Falls that needed a visit to hospital, a scan or an operation, whichever came first",
)
SCRIPTS = replace(
    TRIAL,
    first_label_text="夜間照明",
    second_label_text="الرعاية المعتادة",
    left_words_text="転倒した",
    right_words_text="転倒しなかった",
    name_text="転倒",
)
SHOWN = {
    "trial": TRIAL,
    "at twelve": AT_TWELVE,
    "harm": HARM,
    "welcome": WELCOME,
    "small": SMALL,
    "tiny": TINY,
    "case-control": CASE_CONTROL,
    "hazard": HAZARD,
    "long": LONG,
    "scripts": SCRIPTS,
}
"""Every kind of outcome that a page shows, by name."""
