"""The findings of one outcome in sentences, as plain text to be pasted into a letter."""

from __future__ import annotations

from collections.abc import Iterable
from datetime import date

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import labels, names, numbers
from fourcount.wording.cautions import STANDING_FULL, caution_text
from fourcount.wording.patient import patient_words
from fourcount.wording.sentence import headline, measure_sentence, p_sentence

ABSOLUTE = ("risk_reference", "risk_index", "risk_difference", "number_needed")
RELATIVE = ("risk_ratio", "odds_ratio")
MADE_WITH = "Calculated with Fourcount {version} on {date}; {family} intervals at {level}."


def prose(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> str:
    """Names and counts, then absolute before relative figures, the patient, the cautions and where it all comes from.

    ``version`` and ``today`` are given by whoever asks: this room looks at no clock.
    """
    choices = record.choices
    level = numbers.level(choices.level)
    made = MADE_WITH.format(version=version, date=today.isoformat(), family=choices.family, level=level)
    paragraphs = [
        one_line(_title(record, outcome)),
        *(one_line(paragraph) for paragraph in _study(outcome, findings, choices)),
        one_line(_patient(outcome, findings, choices)),
        _cautions(findings),
        one_line(" ".join(STANDING_FULL)),
        one_line(made),
    ]
    return "\n\n".join(paragraph for paragraph in paragraphs if paragraph) + "\n"


def _title(record: Record, outcome: Outcome) -> str:
    parts = (outcome.name_text, record.title_text, record.source_text)
    return ". ".join(line.rstrip(".") for part in parts if (line := one_line(part)))


def _study(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> list[str]:
    """What the study's table says; one sentence where it is not whole yet."""
    if isinstance(findings.counts, Gap):
        return [headline(outcome, findings, choices)]
    absolute = [measure_sentence(key, outcome, findings, choices) for key in ABSOLUTE]
    relative = [measure_sentence(key, outcome, findings, choices) for key in RELATIVE]
    return [
        _counts(outcome, findings),
        headline(outcome, findings, choices),
        _paragraph(absolute),
        _paragraph([*(text for text in relative if text not in absolute), p_sentence(findings)]),
    ]


def _counts(outcome: Outcome, findings: OutcomeFindings) -> str:
    """The four counts that everything below rests on, in the reader's words."""
    counts = findings.counts
    if isinstance(counts, Gap):
        return ""
    groups: tuple[tuple[names.Group, int, int], ...] = (
        ("reference", counts.reference_events, counts.reference_non_events),
        ("index", counts.index_events, counts.index_non_events),
    )
    event, other = names.event_words(outcome), names.other_words(outcome)
    return " ".join(
        f"{names.sentence_case(names.label(outcome, group))}: {numbers.whole(events)} {event}, "
        f"{numbers.whole(others)} {other}."
        for group, events, others in groups
    )


def _patient(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    if not isinstance(findings.patient, PatientFindings):
        return ""
    words = patient_words(outcome, findings, choices, None)
    return f"{labels.COLUMNS['patient']}: {words.basis} {words.picture_sentence} {words.detail}"


def _cautions(findings: OutcomeFindings) -> str:
    """A list, the only paragraph of several lines."""
    bullets = [f"- {one_line(caution_text(caution))}" for caution in findings.cautions]
    return "\n".join([f"{labels.COLUMNS['cautions']}:", *bullets]) if bullets else ""


def _paragraph(texts: Iterable[str]) -> str:
    """The texts in one paragraph. What several of them say, or end with, is said once, at the last of them."""
    said = [text for text in dict.fromkeys(texts) if text]
    for place, text in enumerate(said):
        start = text.rfind(". ") + 1
        if start and any(later.endswith(text[start:]) for later in said[place + 1 :]):
            said[place] = text[:start]
    return " ".join(said)
