"""The findings of one outcome as aligned plain text, for a terminal."""

from __future__ import annotations

from collections.abc import Iterable
from textwrap import fill

from fourcount.appraisal.findings import Gap, OutcomeFindings
from fourcount.publish.contract_patient import asked_of_a_patient
from fourcount.publish.letter_figures import withheld_lines
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import labels, limits, starts
from fourcount.wording.cautions import SAID_OF_THE_PATIENT, STANDING, caution_text
from fourcount.wording.extras import extra_lines
from fourcount.wording.form import lacking, shown_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines import MeasureLine, measure_lines
from fourcount.wording.own_line import own_line_sentence
from fourcount.wording.patient import patient_words
from fourcount.wording.sentence import headline, p_sentence

WIDTH = 79
INDENT = "  "
LONGEST_NAME = 36
SENTENCE = ". "
SHORT = 40  # a fragment such as "relative reduction 46%" belongs to its own line
TYPED_BESIDE = ("adjusted", "clusters", "losses", "recovered")


def listing(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What the table says, what that means for one patient, and what to keep in mind."""
    if lacking(findings):
        return _joined([_wrapped(headline(outcome, findings, choices)), _wrapped(STANDING)])
    lines = measure_lines(outcome, findings, choices)
    patient = _patient(outcome, findings, choices)
    return _joined(
        [
            _wrapped(headline(outcome, findings, choices)),
            _figures([line for line in lines if not line.withheld], shown_choices(findings, choices)),
            *map(_wrapped, withheld_lines([line for line in lines if line.withheld])),
            _wrapped(p_sentence(findings)),
            _wrapped(own_line_sentence(outcome, findings)),
            _beside(outcome, findings, choices),
            patient,
            _cautions(findings, said=bool(patient)),
            _wrapped(STANDING),
        ]
    )


def _figures(lines: list[MeasureLine], choices: Choices, *, headed: bool = True) -> str:
    """A row for every measure, with its notes below it; what is too long for the row has a line of its own."""
    if not lines:
        return ""
    head = ("", "", limits.interval_name(choices.level) if headed else "", "")
    cells = ((line.name, line.estimate, line.interval, line.detail) for line in lines)
    rows = [head, *(tuple(map(one_line, row)) for row in cells)]
    name = max(len(row[0]) for row in rows if len(row[0]) <= LONGEST_NAME)
    estimate, interval = (max(len(row[column]) for row in rows) for column in (1, 2))
    written = []
    for row, note in zip(rows, ("", *_each_once(line.note for line in lines)), strict=True):
        own, below = ("", row[0]) if len(row[0]) > name else (row[0], "")
        figures = f"{own:<{name}}  {row[1]:>{estimate}}  {row[2]:<{interval}}"
        whole = f"{figures}  {row[3]}".rstrip()
        fits = len(whole) <= WIDTH
        written += [_wrapped(below), whole if fits else figures.rstrip()]
        written += [_wrapped("" if fits else row[3], INDENT), _wrapped(note, INDENT)]
    return "\n".join(line for line in written if line)


def _each_once(notes: Iterable[str]) -> tuple[str, ...]:
    """The notes without the sentences that an earlier one has said: clusters withhold every interval for one reason."""
    told: set[str] = set()
    shortened = []
    for note in notes:
        sentences = note.split(SENTENCE)
        shortened.append(SENTENCE.join(s for s in sentences if s.rstrip(".") not in told or len(s) < SHORT))
        told.update(s.rstrip(".") for s in sentences)
    return tuple(shortened)


def _beside(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What follows from what was typed beside the table: an adjusted effect, clusters, people lost, a printed p."""
    lines = [line for line in extra_lines(outcome, findings, choices) if line.key.startswith(TYPED_BESIDE)]
    given = _figures([line for line in lines if not line.withheld], shown_choices(findings, choices), headed=False)
    withheld = withheld_lines([line for line in lines if line.withheld])
    return "\n".join(part for part in (given, *map(_wrapped, withheld)) if part)


def _patient(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """Only where the patient's figures are not the study's own: there the rows above say the same.

    Where something was typed for a patient and nobody is carried, it says why.
    """
    patient, head = findings.patient, labels.COLUMNS["patient"]
    if isinstance(patient, Gap):
        return "\n".join([head, _wrapped(gap_text(patient), INDENT)]) if asked_of_a_patient(outcome) else ""
    words = patient_words(outcome, findings, choices, None)
    ranks = tuple(_wrapped(line, INDENT) for line in words.ranks)
    if starts.as_in_the_study(patient):
        return "\n".join([head, *ranks]) if ranks else ""
    lines = (
        words.basis,
        _risk(words.without_title, words.without_count, words.without_percent, words.without_interval),
        _risk(words.with_title, words.with_count, words.with_percent, words.with_interval),
        ", ".join(part for part in (words.summary_bold, words.summary) if part),
        words.detail,
    )
    return "\n".join([head, *(_wrapped(line, INDENT) for line in lines if line), *ranks])


def _risk(title: str, count: str, percent: str, interval: str) -> str:
    """``With: night lights, 6 in 100 (6%), 95% interval 4 to 9``."""
    return ", ".join(part for part in (title, f"{count}{limits.bracketed(percent)}", interval) if part)


def _cautions(findings: OutcomeFindings, *, said: bool) -> str:
    """The cautions that hold, without what was said of the patient just before, where anything was."""
    told = SAID_OF_THE_PATIENT if said else ()
    texts = (caution_text(caution) for caution in findings.cautions if caution.key not in told)
    bullets = [_wrapped(text, "- ", INDENT) for text in texts]
    return "\n".join([labels.COLUMNS["cautions"], *bullets]) if bullets else ""


def _wrapped(text: str, first: str = "", later: str | None = None) -> str:
    line = one_line(text)
    indent = first if later is None else later
    return fill(line, WIDTH, initial_indent=first, subsequent_indent=indent, break_on_hyphens=False) if line else ""


def _joined(paragraphs: Iterable[str]) -> str:
    return "\n\n".join(paragraph for paragraph in paragraphs if paragraph) + "\n"
