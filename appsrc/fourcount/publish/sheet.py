"""The findings of one outcome as a table for a spreadsheet: numbers unrounded, one measure a row."""

from __future__ import annotations

import unicodedata
from datetime import date
from html import escape

from fourcount.appraisal.findings import Gap, OutcomeFindings, StrataFindings
from fourcount.publish.made_with import made_with
from fourcount.publish.paper import paper_says, study
from fourcount.publish.plain_text import one_line
from fourcount.publish.sheet_counts import basis_rows
from fourcount.publish.sheet_extras import extra_rows
from fourcount.publish.sheet_patient import patient_rows
from fourcount.publish.sheet_rows import Row, figure_row, measure_row, note_row, p_cell, text_row
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import exports, lines, names, numbers
from fourcount.wording.cautions import STANDING_FULL, caution_text
from fourcount.wording.form import measure_of, shown_choices
from fourcount.wording.gaps import gap_text
from fourcount.wording.lines.strata import STRATUM_KEY
from fourcount.wording.own_line import own_line_sentence
from fourcount.wording.p_value import PRINTED, own_p, test_title, why_no_p
from fourcount.wording.person_time import unit

# Behind any blanks, a spreadsheet takes these for the beginning of a formula, and a quotation mark for that of a field
# that goes on over tabs and lines.
_TAKEN_FOR_MORE = ("=", "+", "-", "@", "\uff1d", "\uff0b", "\uff0d", "\uff20", "\u2212", '"', "'")


def rows(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> tuple[Row, ...]:
    """What it is about, the counts, every measure, p, the patient, the cautions, the version; six columns throughout.

    A figure that is not given has blank cells, and the reason stands under "note", as every caution does. Only cells
    that hold a number may begin with a minus sign: all others are text to a spreadsheet, whatever the reader typed.
    """
    choices = record.choices
    shown = shown_choices(findings, choices)
    about = (names.outcome_name(outcome), record.title_text, record.source_text, study(outcome))
    own_line = own_line_sentence(outcome, findings)
    notes = [
        *([own_line] if own_line else []),
        *paper_says(outcome, findings, choices),
        exports.UNROUNDED.format(level=numbers.level(shown.level)),
        *([exports.PER_UNIT.format(unit=unit(outcome))] if findings.form == "person-time" else []),
        *STANDING_FULL,
        made_with(shown, version, today, findings.form),
    ]
    table = (
        exports.SHEET_HEAD,
        *(text_row(text) for text in about if text.strip()),
        *basis_rows(outcome, findings),
        *_measures(outcome, findings, choices),
        *extra_rows(outcome, findings, choices),
        _p(findings),
        *_converted(outcome, findings),
        *patient_rows(outcome, findings, choices),
        *(note_row(exports.CAUTION_ROW, caution_text(caution)) for caution in findings.cautions),
        *(note_row(exports.NOTE_ROW, note) for note in notes),
    )
    return tuple(
        (_safe(name), estimate, low, high, _safe(method), _safe(note))
        for name, estimate, low, high, method, note in table
    )


def tsv(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> str:
    """The rows with tabs between their cells: what a spreadsheet takes from the clipboard."""
    table = rows(record, outcome, findings, version=version, today=today)
    return "".join("\t".join(row) + "\n" for row in table)


def html(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> str:
    """The rows as a table of HTML, which a word processor takes from the clipboard; all text is escaped."""
    head, *body = rows(record, outcome, findings, version=version, today=today)
    return f"<table>{_html_row(head, 'th')}{''.join(_html_row(row, 'td') for row in body)}</table>"


def _html_row(row: Row, tag: str) -> str:
    return f"<tr>{''.join(f'<{tag}>{escape(cell)}</{tag}>' for cell in row)}</tr>"


def _measures(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[Row, ...]:
    """Every measure in the order of the screen; of strata one by one their measures in full."""
    shown = [line for line in lines.measure_lines(outcome, findings, choices) if not line.key.startswith(STRATUM_KEY)]
    form = findings.form
    table = [measure_row(line.name, measure_of(line.key, findings), line.key, form) for line in shown]
    strata = findings.strata.strata if isinstance(findings.strata, StrataFindings) else ()
    for stratum in strata:
        for key, measure in stratum.measures.items():
            table.append(measure_row(f"{stratum.label}: {lines.measure_name(key, outcome)}", measure, key, form))
    return tuple(table)


def _p(findings: OutcomeFindings) -> Row:
    test = own_p(findings)
    if isinstance(test, Gap):
        return (exports.P_NAME, "", "", "", "", why_no_p(test))
    title = exports.WORKED_OUT if test.method in PRINTED else test_title(test.method)
    return (exports.P_NAME, p_cell(test.p), "", "", title, gap_text(test.p) if isinstance(test.p, Gap) else "")


def _converted(outcome: Outcome, findings: OutcomeFindings) -> tuple[Row, ...]:
    """Only at a starting risk from elsewhere: at the study's own it is the risk ratio, which has a row."""
    conversion = findings.conversion
    if isinstance(conversion, Gap) or conversion.baseline_from == "reference":
        return ()
    baseline = lines.baseline_text(conversion, outcome)
    name = exports.CONVERTED.format(baseline=baseline)
    key = "pooled_odds_ratio" if findings.form == "strata" else "odds_ratio"
    return (figure_row(name, conversion.risk_ratio, key, findings.form),)


def _safe(text: str) -> str:
    """The text on one line, behind an apostrophe where a spreadsheet would take it for more than text."""
    line = one_line(text)
    seen = line.lstrip("".join({sign for sign in line if unicodedata.category(sign) == "Cf"}) + " ")
    return f"'{line}" if seen.startswith(_TAKEN_FOR_MORE) else line
