"""What the third column shows for some findings: the picture, its words, and what is still missing."""

from __future__ import annotations

from typing import NamedTuple

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Figure,
    Gap,
    OutcomeFindings,
    PatientFindings,
    StrataFindings,
)
from fourcount.ink.picture import KeyEntry, Picture, PictureWords, Side
from fourcount.picture.plan import Plan, plan
from fourcount.picture.scales import risk_scale
from fourcount.record.outcome import COUNTED_FORMS, FORMS, Effect, Form, Outcome
from fourcount.record.paper import Choices
from fourcount.wording import labels, numbers
from fourcount.wording.axis import axis_words
from fourcount.wording.form import lacking
from fourcount.wording.gaps import gap_text, mark_text
from fourcount.wording.names import effect_name, sentence_case
from fourcount.wording.patient import WHICH_PEOPLE, PatientWords, patient_words

WAITS = {form: labels.PATIENT_WAITS_OTHERWISE for form in FORMS if form not in COUNTED_FORMS}
"""What the column says while the table is not whole, where that is not four counts."""

CARRY_NOTHING: tuple[Form, ...] = ("pairs", "person-time")
"""Forms of which nothing is carried to one patient, whatever is typed."""


class PatientView(NamedTuple):
    """Everything that the column shows."""

    baseline_hint: str
    own_risk: bool
    effect: str
    effect_words: dict[str, str]
    effect_is_free: bool
    takes_a_risk: bool = True
    mark: str = ""
    waits: str = ""
    picture: Picture | None = None
    sentence: str = ""
    summary: str = ""
    detail: str = ""


def patient_view(outcome: Outcome, findings: OutcomeFindings, choices: Choices, bars: bool) -> PatientView:
    """The column for an outcome and its findings; ``bars`` asks for bars instead of people."""
    marks = {mark.field: mark_text(mark) for mark in findings.marks}
    view = PatientView(
        baseline_hint=_baseline_hint(outcome, findings),
        own_risk=_own_risk(outcome, findings),
        effect=_effect(outcome, findings),
        effect_words=_effect_words(outcome, findings),
        effect_is_free=outcome.design != "case-control" and findings.form in (*COUNTED_FORMS, "strata"),
        takes_a_risk=_takes_a_risk(findings),
        mark=marks.get("starting_risk_text", ""),
    )
    if lacking(findings) is not None:
        return view._replace(waits=WAITS.get(findings.form, labels.PATIENT_WAITS))
    if isinstance(findings.patient, Gap):
        return view if view.mark else view._replace(waits=gap_text(findings.patient))
    return _with_patient(view, outcome, findings, findings.patient, choices, bars)


def _with_patient(
    view: PatientView,
    outcome: Outcome,
    findings: OutcomeFindings,
    patient: PatientFindings,
    choices: Choices,
    bars: bool,
) -> PatientView:
    drawn = _plan(patient)
    words = patient_words(outcome, findings, choices, drawn.denominator if drawn else None)
    missing = labels.MISSING.format(names=", ".join(words.missing)) if words.missing else ""
    range_words = f"{sentence_case(words.summary)}." if words.summary else ""
    which = WHICH_PEOPLE if drawn else ""
    detail = " ".join(part for part in (range_words, words.detail, which) if part)
    lines = (words.basis, words.summary_bold, detail)
    picture = Picture(drawn, _picture_words(words, lines, drawn), bars) if drawn else None
    return view._replace(
        picture=picture,
        sentence=words.picture_sentence,
        summary=words.summary_bold,
        detail="\n".join(part for part in (detail, missing) if part),
    )


def _plan(patient: PatientFindings) -> Plan | None:
    without, with_ = patient.without.estimate, patient.with_.estimate
    if isinstance(without, Gap) or isinstance(with_, Gap):
        return None
    return plan(without, with_)


def _picture_words(words: PatientWords, lines: tuple[str, ...], drawn: Plan) -> PictureWords:
    low, _, high = axis_words("risk", risk_scale((drawn.without_risk, drawn.with_risk)).high)
    entries = (
        KeyEntry("affected", words.key_event),
        KeyEntry("avoided", words.key_avoided),
        KeyEntry("added", words.key_added),
        KeyEntry("others", words.key_other),
    )
    return PictureWords(
        without=Side(words.without_title, words.without_count, f"({words.without_percent})", words.without_other),
        with_=Side(words.with_title, words.with_count, f"({words.with_percent})", words.with_other),
        key=tuple(entry for entry in entries if entry.text),
        note=words.scale,
        lines=tuple(line for line in lines if line),
        bar_ends=(low, high),
    )


def _takes_a_risk(findings: OutcomeFindings) -> bool:
    """Whether a starting risk would come to anything: some forms carry nothing to a patient."""
    gap = findings.patient
    return findings.form not in CARRY_NOTHING and not (isinstance(gap, Gap) and gap.key == "carried-later")


def _own_risk(outcome: Outcome, findings: OutcomeFindings) -> bool:
    """Whether an empty starting risk stands for the study's own."""
    if isinstance(findings.patient, PatientFindings):
        return findings.patient.baseline_from == "reference"
    return outcome.design != "case-control" and findings.form in COUNTED_FORMS


def _effect(outcome: Outcome, findings: OutcomeFindings) -> str:
    """The effect that is carried: the one chosen, unless design or print leave no choice."""
    if isinstance(findings.patient, PatientFindings):
        return findings.patient.effect
    if outcome.design == "case-control" or (findings.form == "effect-only" and outcome.paper_measure == "odds_ratio"):
        return "odds_ratio"
    return outcome.patient.effect


def carried_measure(findings: OutcomeFindings, key: str) -> Figure | AnyNumberNeeded | Gap | None:
    """The measure that stands for an effect: the pooled one where there are strata."""
    pooled = findings.strata.pooled if isinstance(findings.strata, StrataFindings) else {}
    return pooled.get(f"pooled_{key}") or findings.measures.get(key)


def _baseline_hint(outcome: Outcome, findings: OutcomeFindings) -> str:
    if outcome.design == "case-control" or findings.form in ("effect-only", "strata"):
        return labels.BASELINE_HINT_NEEDED
    if findings.form not in (*COUNTED_FORMS, "risk-at-time"):
        return ""
    risk = findings.measures.get("risk_reference")
    if isinstance(risk, Figure) and not isinstance(risk.estimate, Gap):
        return labels.BASELINE_HINT.format(percent=numbers.percent(risk.estimate))
    return ""


def _effect_words(outcome: Outcome, findings: OutcomeFindings) -> dict[str, str]:
    """The choices of effect with the study's own estimates in them."""
    result: dict[str, str] = {}
    effects: tuple[Effect, ...] = ("risk_ratio", "odds_ratio")
    for key in effects:
        figure, name = carried_measure(findings, key), effect_name(outcome, key)
        result[key] = name
        if isinstance(figure, Figure) and not isinstance(figure.estimate, Gap):
            result[key] = labels.EFFECT_KEPT.format(effect=name, value=numbers.ratio(figure.estimate))
    return result
