"""The words of "For one patient": whole people, both frames, the absolute before the relative."""

from __future__ import annotations

from dataclasses import dataclass

from fourcount.appraisal.findings import Caution, Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import carried, limits, names, numbers, of_people
from fourcount.wording.basis import basis
from fourcount.wording.cautions import caution_text
from fourcount.wording.form import shown_choices
from fourcount.wording.gaps import why_no_patient
from fourcount.wording.half_added import half_added
from fourcount.wording.headline import DO_NOT_ADD_UP

LONGEST_KEY = 40
TOO_SMALL = "too small to draw"
WELCOME_DRAWN = "Filled: people with the welcome outcome."
WHICH_PEOPLE = "We cannot say which people."


@dataclass(frozen=True, kw_only=True, slots=True)
class PatientWords:
    """Every text of the patient's column and picture; "" where there is nothing to say.

    ``missing`` names what the reader has not named yet, without which no patient is shown a picture.
    ``basis`` says what starting risk and what effect everything rests on.
    ``scale`` says that the picture shows more than 100 people, or that it is too small to draw.
    """

    without_title: str
    with_title: str
    without_count: str = ""
    without_percent: str = ""
    with_count: str = ""
    with_percent: str = ""
    without_other: str = ""
    with_other: str = ""
    key_event: str = ""
    key_avoided: str = ""
    key_added: str = ""
    key_other: str = ""
    summary_bold: str = ""
    summary: str = ""
    detail: str = ""
    basis: str = ""
    scale: str = ""
    missing: tuple[str, ...] = ()
    picture_sentence: str = ""


def patient_words(
    outcome: Outcome, findings: OutcomeFindings, choices: Choices, denominator: int | None
) -> PatientWords:
    """All words at the patient's starting risk; ``denominator`` is the picture's, None where none can be drawn."""
    patient = findings.patient
    without_title = f"Without: {names.label_within(outcome, 'reference')}"
    with_title = f"With: {names.label_within(outcome, 'index')}"
    if isinstance(patient, Gap):
        why = why_no_patient(patient, findings.form, next(iter(findings.measures), ""))
        return PatientWords(without_title=without_title, with_title=with_title, detail=why, missing=missing(outcome))
    people = denominator or carried.denominator_for_text(patient)
    choices = shown_choices(findings, choices)
    change = patient.difference.estimate
    return PatientWords(
        without_title=without_title,
        with_title=with_title,
        without_count=carried.count(patient.without, people),
        without_percent=carried.percentage(patient.without, people),
        with_count=carried.count(patient.with_, people),
        with_percent=carried.percentage(patient.with_, people),
        without_other=_others(patient.without, people, outcome),
        with_other=_others(patient.with_, people, outcome),
        key_event=names.event_key(outcome),
        key_avoided=_key("avoided", outcome) if not isinstance(change, Gap) and change < 0 else "",
        key_added=_key("added", outcome) if not isinstance(change, Gap) and change > 0 else "",
        key_other=names.other_key(outcome),
        summary_bold=_change_said(outcome, patient.difference, people),
        summary=_summary(outcome, patient, choices, people),
        detail=_detail(outcome, patient, people),
        basis=basis(outcome, patient),
        scale="" if isinstance(change, Gap) else _scale(outcome, denominator),
        missing=missing(outcome),
        picture_sentence=_picture_sentence(outcome, patient, people) + _change_sentence(patient, choices, people),
    )


def picture_heading(record: Record, outcome: Outcome) -> str:
    """What a picture that travels by itself is about: the outcome's name, the paper's title and where it stands."""
    parts = (names.outcome_name(outcome), record.title_text, record.source_text)
    return " · ".join(text.strip() for text in parts if text.strip())


def missing(outcome: Outcome) -> tuple[str, ...]:
    """What has to be named before a patient is shown anything."""
    wanted = {
        "the event": outcome.event_words_text.strip() or outcome.event_heading_text.strip(),
        "the reference group": outcome.reference_label_text.strip(),
        "the index group": outcome.index_label_text.strip(),
        "the time span": outcome.span_text.strip(),
    }
    return tuple(name for name, text in wanted.items() if not text)


def _others(figure: Figure, people: int, outcome: Outcome) -> str:
    """The other frame: ``88 did not fall``. It is what the rounded count leaves, so that the two make the whole."""
    if isinstance(figure.estimate, Gap):
        return ""
    return f"{of_people.unaffected(figure.estimate, people)} {names.other_words(outcome)}"


def _key(verb: str, outcome: Outcome) -> str:
    if outcome.welcome:
        verb = {"avoided": "lost", "added": "gained"}[verb]
    name = names.mid_sentence(names.outcome_name(outcome)) if outcome.counted == "left" else ""
    return f"{name} {verb}, on balance" if name and len(name) <= LONGEST_KEY else f"{verb}, on balance"


def _change_said(outcome: Outcome, difference: Figure, people: int) -> str:
    """``6 fewer in 100 fell at least once``."""
    change = carried.change(difference, people)
    return f"{change} {names.event_words(outcome)}" if change else ""


def _summary(outcome: Outcome, patient: PatientFindings, choices: Choices, people: int) -> str:
    if isinstance(patient.difference.estimate, Gap):
        return ""
    parts = (names.over_span(outcome), carried.interval(patient, choices, people))
    return ", ".join(part for part in parts if part)


def _detail(named: Outcome, patient: PatientFindings, people: int) -> str:
    """What stands under the summary: number needed, relative words, and what the interval leaves out."""
    if isinstance(patient.with_.estimate, Gap):
        return carried.reason(patient.with_.estimate, patient)
    sentences = [carried.number_needed(patient.number_needed, named), _relative(patient.risk_ratio)]
    sentences += carried.reasons(patient)
    if patient.range_from == "effect" and not isinstance(patient.difference.interval, Gap):
        sentences.append(caution_text(Caution(key="baseline-uncertain", facts={"baseline": patient.baseline})))
    if not _adds_up(patient, people):
        sentences.append(DO_NOT_ADD_UP)
    return " ".join(part for part in dict.fromkeys(sentences) if part)


def _relative(ratio: Figure) -> str:
    if isinstance(ratio.estimate, Gap):
        return ""
    change = ratio.estimate - 1
    if change in (0.0, float("inf")):
        return ""
    word = limits.LOWER if change < 0 else limits.HIGHER
    interval = "" if half_added(ratio) else limits.bracketed(limits.relative_interval(ratio.interval, ratio.estimate))
    return f"In relative words {numbers.percent_whole(abs(change))} {word}{interval}."


def _adds_up(patient: PatientFindings, people: int) -> bool:
    parts = (patient.without.estimate, patient.with_.estimate, patient.difference.estimate)
    rounded = [0 if isinstance(part, Gap) else numbers.people(part, people) for part in parts]
    return any(isinstance(part, Gap) for part in parts) or abs(rounded[1] - rounded[0]) == rounded[2]


def _scale(named: Outcome, denominator: int | None) -> str:
    """What has to be said of the picture itself: what it counts, how many people it shows, or why it shows none."""
    parts = [WELCOME_DRAWN] if named.welcome else []
    if denominator is None:
        parts.append(f"{TOO_SMALL[0].upper()}{TOO_SMALL[1:]} as people.")
    elif denominator != 100:
        parts.append(f"Each picture shows {numbers.whole(denominator)} people.")
    return " ".join(parts)


def _picture_sentence(outcome: Outcome, patient: PatientFindings, people: int) -> str:
    """What is drawn, in one sentence: both groups, both frames."""
    all_people, span = numbers.whole(people), names.within_span(outcome)
    event = names.event_words(outcome)
    first = (
        f"Of {all_people} people {names.in_group(outcome, 'reference')} {_affected(patient.without, people)} "
        f"{event}{f' {span}' if span else ''} and {_others(patient.without, people, outcome)}"
    )
    if isinstance(patient.with_.estimate, Gap):
        reason = carried.reason(patient.with_.estimate, patient)
        return f"{first}. {names.sentence_case(names.in_group(outcome, 'index'))}: {reason}"
    second = (
        f"of {all_people} {names.in_group(outcome, 'index')} {_affected(patient.with_, people)} "
        f"{event} and {_others(patient.with_, people, outcome)}"
    )
    return f"{first}; {second}"


def _change_sentence(own: PatientFindings, choices: Choices, people: int) -> str:
    """How the picture's sentence ends: the change of the named outcome, and its interval."""
    if isinstance(own.with_.estimate, Gap):
        return ""
    change = carried.change(own.difference, people)
    interval = carried.interval(own, choices, people)
    return f": {change[:1].lower()}{change[1:]}{f', {interval}' if interval else ''}. {WHICH_PEOPLE}"


def _affected(figure: Figure, people: int) -> str:
    """``12 (12%)``."""
    if isinstance(figure.estimate, Gap):
        return carried.NOT_GIVEN
    return f"{of_people.affected(figure.estimate, people)} ({carried.percentage(figure, people)})"
