"""The findings of one outcome as aligned plain text, for a terminal."""

from __future__ import annotations

from collections.abc import Iterable
from textwrap import fill

from fourcount.appraisal.findings import Gap, OutcomeFindings, PatientFindings
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import labels, numbers
from fourcount.wording.cautions import STANDING, caution_text
from fourcount.wording.lines import MeasureLine, measure_lines
from fourcount.wording.patient import patient_words
from fourcount.wording.sentence import headline, p_sentence

WIDTH = 79
INDENT = "  "
INTERVAL_HEAD = "{level} interval"


def listing(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> str:
    """What the table says, what that means for one patient, and what to keep in mind."""
    if isinstance(findings.counts, Gap):
        return _joined([_wrapped(headline(outcome, findings, choices)), _wrapped(STANDING)])
    lines = measure_lines(outcome, findings, choices)
    return _joined(
        [
            _wrapped(headline(outcome, findings, choices)),
            _figures([line for line in lines if not line.withheld], choices),
            *_withheld([line for line in lines if line.withheld]),
            _wrapped(p_sentence(findings)),
            _patient(outcome, findings),
            _cautions(findings),
            _wrapped(STANDING),
        ]
    )


def _figures(lines: list[MeasureLine], choices: Choices) -> str:
    """A row for every measure, with its notes below it."""
    head = ("", "", INTERVAL_HEAD.format(level=numbers.level(choices.level)), "")
    rows = [(one_line(line.name), line.estimate, line.interval, line.detail) for line in lines]
    name, estimate, interval, _ = (max(map(len, column)) for column in zip(head, *rows, strict=True))
    written = []
    for row, note in zip((head, *rows), ("", *(line.note for line in lines)), strict=True):
        written.append(f"{row[0]:<{name}}  {row[1]:>{estimate}}  {row[2]:<{interval}}  {row[3]}".rstrip())
        written += [_wrapped(note, INDENT)] if note else []
    return "\n".join(written)


def _withheld(lines: list[MeasureLine]) -> list[str]:
    """Each reason once, behind the measures that it withholds."""
    reasons: dict[str, list[str]] = {}
    for line in lines:
        reasons.setdefault(line.withheld, []).append(line.name)
    return [_wrapped(f"{'; '.join(names)}: {reason}") for reason, names in reasons.items()]


def _patient(outcome: Outcome, findings: OutcomeFindings) -> str:
    if not isinstance(findings.patient, PatientFindings):
        return ""
    words = patient_words(outcome, findings, None)
    groups = ((words.without_title, words.without_percent), (words.with_title, words.with_percent))
    width = max(len(one_line(title)) for title, _ in groups)
    rows = [f"{INDENT}{one_line(title):<{width}}  {percent}" for title, percent in groups]
    summary = _wrapped(", ".join(part for part in (words.summary_bold, words.summary) if part), INDENT)
    return "\n".join([labels.COLUMNS["patient"], *rows, summary, _wrapped(words.detail, INDENT)])


def _cautions(findings: OutcomeFindings) -> str:
    if not findings.cautions:
        return ""
    bullets = (_wrapped(caution_text(caution), "- ", INDENT) for caution in findings.cautions)
    return "\n".join([labels.COLUMNS["cautions"], *bullets])


def _wrapped(text: str, first: str = "", later: str | None = None) -> str:
    line = one_line(text)
    indent = first if later is None else later
    return fill(line, WIDTH, initial_indent=first, subsequent_indent=indent, break_on_hyphens=False) if line else ""


def _joined(paragraphs: Iterable[str]) -> str:
    return "\n\n".join(paragraph for paragraph in paragraphs if paragraph) + "\n"
