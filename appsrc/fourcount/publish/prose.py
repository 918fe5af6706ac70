"""The findings of one outcome as plain text to be pasted into a letter: short, each thing said once."""

from __future__ import annotations

from collections.abc import Iterable
from datetime import date

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.publish import groups
from fourcount.publish.letter_figures import figure_lines
from fourcount.publish.letter_forms import beside_lines, form_lines, rests_on
from fourcount.publish.made_with import made_with
from fourcount.publish.paper import paper_says, study
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import COUNTED_FORMS, Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import exports, labels, names, numbers
from fourcount.wording.basis import basis
from fourcount.wording.cautions import SAID_OF_THE_PATIENT, STANDING_FULL, caution_text
from fourcount.wording.form import lacking, patient_choices, shown_choices
from fourcount.wording.own_line import own_line_sentence
from fourcount.wording.patient import picture_heading
from fourcount.wording.patient_sentence import patient_sentence
from fourcount.wording.sentence import headline, p_sentence


def prose(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> str:
    """Names and counts, then absolute before relative figures, the patient, the cautions and where it all comes from.

    ``version`` and ``today`` are given by whoever asks: this room looks at no clock.
    """
    choices = record.choices
    patient = _patient(outcome, findings, choices)
    paragraphs = [
        one_line(picture_heading(record, outcome)),
        one_line(f"{study(outcome)} {_counts(outcome, findings)}"),
        one_line(headline(outcome, findings, choices)),
        _figures(outcome, findings, choices),
        one_line(own_line_sentence(outcome, findings)),
        one_line(" ".join(paper_says(outcome, findings, choices))),
        one_line(patient),
        _cautions(findings, said=bool(patient)),
        one_line(" ".join(STANDING_FULL)),
        made_with(shown_choices(findings, choices), version, today, findings.form),
    ]
    return "\n\n".join(paragraph for paragraph in paragraphs if paragraph) + "\n"


def _counts(outcome: Outcome, findings: OutcomeFindings) -> str:
    """What everything below rests on, in the reader's words."""
    counts = findings.counts
    if findings.form not in COUNTED_FORMS:
        return rests_on(outcome, findings)
    if isinstance(counts, Gap):
        return ""
    event, other = names.event_words(outcome), names.other_words(outcome)
    return " ".join(
        exports.GROUP_COUNTS.format(
            group=names.sentence_case(names.label(outcome, group)),
            events=numbers.whole(events),
            event=event,
            others=numbers.whole(total - events),
            other=other,
        )
        for group, events, total in groups.people(counts)
    )


def _figures(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """A list of one line for every measure, and the p."""
    if lacking(findings):
        return ""
    if findings.form not in COUNTED_FORMS:
        return _list((*form_lines(outcome, findings, choices), p_sentence(findings)))
    beside = beside_lines(outcome, findings, choices)
    return _list((*figure_lines(outcome, findings, choices), *beside, p_sentence(findings)))


def _patient(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    patient = findings.patient
    if not isinstance(patient, PatientFindings):
        return ""
    rests = basis(outcome, patient, patient_choices(findings, choices))
    said = patient_sentence(outcome, findings, choices)
    return f"{labels.COLUMNS['patient']}: {names.mid_sentence(rests)} {said}"


def _cautions(findings: OutcomeFindings, *, said: bool) -> str:
    """The cautions that hold, without what the patient's paragraph says already, where there is one."""
    told = SAID_OF_THE_PATIENT if said else ()
    bullets = _list(caution_text(caution) for caution in findings.cautions if caution.key not in told)
    return f"{labels.COLUMNS['cautions']}:\n{bullets}" if bullets else ""


def _list(texts: Iterable[str]) -> str:
    return "\n".join(f"- {one_line(text)}" for text in texts)
