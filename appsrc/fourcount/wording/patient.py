"""The words of "For one patient": whole people, both frames, the absolute before the relative."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass

from fourcount.appraisal.findings import Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import carried, limits, names, numbers, spans, starts
from fourcount.wording.basis import OWN_RANGE, basis, half_added_note, not_crude_note, range_note
from fourcount.wording.form import patient_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.headline import DO_NOT_ADD_UP
from fourcount.wording.picture_sentence import WHICH_PEOPLE, picture_sentence
from fourcount.wording.ranks import people_for_all, rank_lines
from fourcount.wording.subject import BECAME_CASES, UNNAMED, subject

__all__ = ["DO_NOT_ADD_UP", "WHICH_PEOPLE", "PatientWords", "missing", "patient_words", "picture_heading"]


FIELDS_OF = {
    "the event": "what happens to them (“People who”)",
    "the reference group": "the name of the reference group",
    "the index group": "the name of the index group",
    "the time span": "“Time span”",
}
FIELDS_OF_CASES = {
    **dict.fromkeys(("the reference group", "the index group"), "what people were exposed to (“People who”)"),
    "the event": "the name of the cases, by what they have",
    "the time span": "“Time span”",
}
"""A patient of a matched case-control study becomes a case or not, exposed or not."""


@dataclass(frozen=True, kw_only=True, slots=True)
class PatientWords:
    """Every text of the patient's column; "" where there is nothing to say. The picture's own are ``picture_words``.

    ``missing`` names what the reader has not named yet, without which no patient is shown a picture.
    ``basis`` says what starting risk and what effect everything rests on, and another time span.
    ``ranks`` are a line each for a low and a high starting risk.
    """

    without_title: str
    with_title: str
    without_count: str = ""
    without_percent: str = ""
    without_interval: str = ""
    with_count: str = ""
    with_percent: str = ""
    with_interval: str = ""
    summary_bold: str = ""
    summary: str = ""
    detail: str = ""
    basis: str = ""
    ranks: tuple[str, ...] = ()
    missing: tuple[str, ...] = ()
    picture_sentence: str = ""


def patient_words(
    outcome: Outcome, findings: OutcomeFindings, choices: Choices, denominator: int | None
) -> PatientWords:
    """All words at the patient's starting risk; ``denominator`` is the picture's, None where none can be drawn."""
    patient, spoken = findings.patient, subject(outcome)
    without_title, with_title = titles(outcome)
    if isinstance(patient, Gap):
        why = gap_text(patient)
        lacks = missing_fields(outcome)
        return PatientWords(without_title=without_title, with_title=with_title, detail=why, missing=lacks)
    people = denominator or people_for_all(patient)
    patient = starts.at_one_level(patient, choices)
    choices = patient_choices(findings, choices)
    return PatientWords(
        without_title=without_title,
        with_title=with_title,
        without_count=carried.count(patient.without, people),
        without_percent=carried.percentage(patient.without, people),
        without_interval=_levelled(carried.risk_limits(patient.without, people), choices),
        with_count=carried.count(patient.with_, people),
        with_percent=carried.percentage(patient.with_, people),
        with_interval=_levelled(carried.risk_limits(patient.with_, people), choices),
        summary_bold=_change_said(spoken, patient.difference, people),
        summary=_summary(outcome, patient, choices, people),
        detail=_detail(outcome, patient, findings, people),
        basis=basis(outcome, patient, choices),
        ranks=rank_lines(outcome, findings, choices, people_for_all(patient, people)),
        missing=missing_fields(outcome),
        picture_sentence=picture_sentence(outcome, findings, patient, choices, people),
    )


def titles(outcome: Outcome) -> tuple[str, str]:
    """``Without: usual care`` and ``With: night lights``; of the same people at two times the times alone."""
    spoken = subject(outcome)
    if spoken.design == "before-after":
        labels = names.label(spoken, "reference"), names.label(spoken, "index")
        return names.sentence_case(labels[0]), names.sentence_case(labels[1])
    if spoken is not outcome:
        return names.sentence_case(names.label(spoken, "reference")), names.sentence_case(names.label(spoken, "index"))
    return _titled("Without", spoken, "reference"), _titled("With", spoken, "index")


def _titled(word: str, outcome: Outcome, group: names.Group) -> str:
    """The group behind its word; a side of pairs that nobody has named is neither with nor without."""
    within = names.label_within(outcome, group)
    return names.sentence_case(within) if names.unnamed_side(outcome, group) else f"{word}: {within}"


def picture_heading(record: Record, outcome: Outcome) -> str:
    """What a picture that travels by itself is about: the outcome's name, the paper's title and where it stands."""
    parts = (names.outcome_name(outcome), record.title_text, record.source_text)
    return " · ".join(text.strip() for text in parts if text.strip())


def missing(outcome: Outcome) -> tuple[str, ...]:
    """What has to be named before a patient is shown anything."""
    spoken = subject(outcome)
    event = spoken.event_words_text.strip() or spoken.event_heading_text.strip()
    named = {
        "the event": event not in ("", BECAME_CASES),
        "the reference group": spoken.reference_label_text.strip() not in ("", *UNNAMED),
        "the index group": spoken.index_label_text.strip() not in ("", *UNNAMED),
        "the time span": names.span(spoken) != "",
    }
    return tuple(name for name, is_named in named.items() if not is_named)


def missing_fields(outcome: Outcome, lacks: Iterable[str] | None = None) -> tuple[str, ...]:
    """The fields in which that is typed, as the window calls them; ``lacks`` are those of it that are asked for."""
    fields = FIELDS_OF_CASES if subject(outcome) is not outcome else FIELDS_OF
    return tuple(dict.fromkeys(fields[item] for item in (missing(outcome) if lacks is None else lacks)))


def _levelled(interval: str, choices: Choices) -> str:
    return f"{limits.interval_name(choices.level)} {interval}" if interval else ""


def _change_said(outcome: Outcome, difference: Figure, people: int) -> str:
    """``6 fewer in 100 fell at least once``."""
    change = carried.change(difference, people)
    return names.sentence_case(f"{change} {names.event_words(outcome)}") if change else ""


def _summary(outcome: Outcome, patient: PatientFindings, choices: Choices, people: int) -> str:
    if isinstance(patient.difference.estimate, Gap):
        return ""
    parts = (spans.over(outcome, patient), carried.interval(patient, choices, people))
    return ", ".join(part for part in parts if part)


def _detail(outcome: Outcome, patient: PatientFindings, findings: OutcomeFindings, people: int) -> str:
    """What stands under the summary: number needed, relative words, and what the interval leaves out."""
    if isinstance(patient.with_.estimate, Gap):
        return carried.reason(patient.with_.estimate, patient, findings)
    sentences = [carried.number_needed(patient.number_needed, outcome), carried.relative_words(outcome, patient)]
    sentences += carried.reasons(patient, findings)
    note = range_note(outcome, patient)
    sentences += [note if note != OWN_RANGE else "", half_added_note(patient), not_crude_note(outcome, patient)]
    if not _adds_up(patient, people):
        sentences.append(DO_NOT_ADD_UP)
    return " ".join(part for part in dict.fromkeys(sentences) if part)


def _adds_up(patient: PatientFindings, people: int) -> bool:
    parts = (patient.without.estimate, patient.with_.estimate, patient.difference.estimate)
    rounded = [0 if isinstance(part, Gap) else numbers.people(part, people) for part in parts]
    return any(isinstance(part, Gap) for part in parts) or abs(rounded[1] - rounded[0]) == rounded[2]
