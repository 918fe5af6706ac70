"""What the third column shows for some findings: the picture, its words, and what is still missing."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Any, NamedTuple

from fourcount.appraisal.findings import Carriable, Gap, OutcomeFindings, PatientFindings
from fourcount.ink.patient_picture import picture_of, relative_picture_of
from fourcount.ink.picture import Picture
from fourcount.ink.relative_picture import RelativePicture
from fourcount.picture.options import USUAL, PictureOptions
from fourcount.record.outcome import COUNTED_FORMS, Outcome
from fourcount.record.paper import Choices
from fourcount.wording import labels, numbers
from fourcount.wording.effects import carriable_words
from fourcount.wording.form import lacking
from fourcount.wording.gaps import gap_text, mark_text
from fourcount.wording.names import effect_name, sentence_case
from fourcount.wording.patient import WHICH_PEOPLE, patient_words
from fourcount.wording.patient_labels import TABLE_CORNER
from fourcount.wording.patient_table import Row, patient_table, patient_table_head, rows_sentence
from fourcount.wording.ranks import people_for_all


class PatientView(NamedTuple):
    """Everything that the column shows; ``marks`` are sentences by the field that they mark."""

    baseline_hint: str = ""
    own_risk: bool = False
    effect: str = ""
    effects: tuple[tuple[str, str], ...] = ()
    takes_a_risk: bool = True
    marks: Mapping[str, str] = MappingProxyType({})
    waits: str = ""
    picture: Picture | None = None
    relative: RelativePicture | None = None
    sentence: str = ""
    summary: str = ""
    detail: str = ""
    rows: tuple[Row, ...] = ()
    rows_head: Row | None = None
    rows_corner: str = ""
    rows_sentence: str = ""
    to_curve: bool = False
    to_odds: bool = False


def patient_view(
    outcome: Outcome, findings: OutcomeFindings, choices: Choices, options: PictureOptions = USUAL
) -> PatientView:
    """The column for an outcome and its findings; ``options`` say how the picture is drawn."""
    waiting = lacking(findings) is not None
    view = PatientView(
        baseline_hint=_baseline_hint(outcome, findings, waiting),
        own_risk=_own_risk(outcome, findings),
        effect=_effect(outcome, findings),
        effects=_effects(outcome, findings),
        takes_a_risk=waiting or bool(findings.carriable),
        marks={mark.field: mark_text(mark) for mark in findings.marks},
        to_curve=bool(findings.carriable),
    )
    if waiting:
        counted = findings.form in COUNTED_FORMS
        return view._replace(waits=labels.PATIENT_WAITS if counted else labels.PATIENT_WAITS_OTHERWISE)
    patient = findings.patient
    if isinstance(patient, Gap):
        if any(mark.field in PATIENT_MARKS and not mark.used for mark in findings.marks):
            return view  # the mark's sentence says why
        return view._replace(waits=gap_text(patient), to_odds=patient.key in SOLVED_BY_ODDS)
    return _with_patient(view, outcome, findings, patient, choices, options)


PATIENT_MARKS = (
    "starting_risk_text",
    "low_risk_text",
    "high_risk_text",
    "rate_text",
    "overall_risk_text",
    "exposed_share_text",
    "other_span_text",
)
"""The column's fields that can be marked; the sentences stand under them."""

SOLVED_BY_ODDS = ("solved-beyond-one-odds", "solved-beyond-zero-odds")
"""Why an overall risk gives nobody's, where the odds ratio would do it."""


def _with_patient(
    view: PatientView,
    outcome: Outcome,
    findings: OutcomeFindings,
    patient: PatientFindings,
    choices: Choices,
    options: PictureOptions,
) -> PatientView:
    picture = picture_of(outcome, findings, choices, options)
    people = picture.plan.denominator if picture else None
    words = patient_words(outcome, findings, choices, people)
    missing = labels.MISSING.format(names=", ".join(words.missing)) if words.missing else ""
    range_words = f"{sentence_case(words.summary)}." if words.summary else ""
    which = WHICH_PEOPLE if picture else ""
    detail = " ".join(part for part in (range_words, words.detail, which) if part)
    if picture:
        lines = tuple(line for line in (words.basis, words.summary_bold, detail) if line)
        picture = Picture(picture.plan, picture.words._replace(lines=lines), options)
    return view._replace(
        picture=picture,
        relative=relative_picture_of(outcome, findings) if options.relative else None,
        sentence=words.picture_sentence,
        summary=words.summary_bold,
        detail="\n".join(part for part in (detail, missing) if part),
        to_odds=_passes(patient) and any(_key(one) == "odds_ratio" for one in findings.carriable),
        **_table(outcome, findings, patient, choices, people),
    )


def _passes(patient: PatientFindings) -> bool:
    """Whether the carried effect asks for more than 100%, at any of the starting risks."""
    told = [one for one in (patient, patient.low, patient.high) if isinstance(one, PatientFindings)]
    return any(one.with_.estimate == Gap("beyond-one") and one.baseline < 1.0 for one in told)


def _table(
    outcome: Outcome, findings: OutcomeFindings, patient: PatientFindings, choices: Choices, people: int | None
) -> dict[str, Any]:
    """The rows of the small table, of how many people they speak, and all of it in sentences."""
    rows = patient_table(findings, choices, people)
    if isinstance(patient.with_.estimate, Gap) and len(rows) == 1:
        return {}  # its reason stands above
    heads = patient_table_head(outcome, findings, choices, people)
    corner = TABLE_CORNER.format(people=numbers.whole(people_for_all(patient, people)))
    return {"rows": tuple(rows), "rows_head": heads, "rows_corner": corner, "rows_sentence": rows_sentence(rows, heads)}


def _own_risk(outcome: Outcome, findings: OutcomeFindings) -> bool:
    """Whether an empty starting risk stands for the study's own."""
    if isinstance(findings.patient, PatientFindings):
        return findings.patient.start_from == "reference"
    return outcome.design != "case-control" and findings.form in COUNTED_FORMS


def _baseline_hint(outcome: Outcome, findings: OutcomeFindings, waiting: bool) -> str:
    """The study's own risk while the field is empty, or that one has to be typed."""
    patient = findings.patient
    if isinstance(patient, PatientFindings):
        own = patient.start_from == "reference" and not isinstance(patient.without.estimate, Gap)
        return labels.BASELINE_HINT.format(percent=numbers.percent(patient.baseline)) if own else ""
    outside = outcome.design == "case-control" or findings.form in ("effect-only", "strata")
    return labels.BASELINE_HINT_NEEDED if outside or (findings.carriable and not waiting) else ""


def _key(one: Carriable) -> str:
    """Under which key of ``EFFECTS`` an effect is chosen."""
    return "adjusted" if one.adjusted else one.effect


def _effect(outcome: Outcome, findings: OutcomeFindings) -> str:
    """The effect that is carried: the one chosen where it is there, else the usual one."""
    keys = [_key(one) for one in findings.carriable]
    return outcome.patient.effect if outcome.patient.effect in keys or not keys else keys[0]


def _effects(outcome: Outcome, findings: OutcomeFindings) -> tuple[tuple[str, str], ...]:
    """What can be chosen, with the study's own estimates; the usual one's name while there is nothing to choose."""
    if findings.carriable:
        return tuple((_key(one), carriable_words(outcome, one)) for one in findings.carriable)
    chosen = outcome.patient.effect
    odds = outcome.design in ("case-control", "matched") or chosen == "odds_ratio"
    return ((chosen, effect_name(outcome, "odds_ratio" if odds else "risk_ratio")),)
