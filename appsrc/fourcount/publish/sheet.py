"""The findings of one outcome as a table for a spreadsheet: numbers unrounded, one measure a row."""

from __future__ import annotations

from datetime import date
from html import escape
from math import isinf

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Conversion,
    Counts,
    Figure,
    Gap,
    NumberNeededLimit,
    OutcomeFindings,
    PatientFindings,
    Range,
)
from fourcount.publish.made_with import made_with
from fourcount.publish.plain_text import one_line
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording import exports, labels, limits, lines, names, numbers
from fourcount.wording.basis import basis
from fourcount.wording.cautions import STANDING_FULL, caution_text
from fourcount.wording.gaps import gap_text, limit_text
from fourcount.wording.half_added import half_added

Row = tuple[str, str, str, str, str]

# Behind any blanks, a spreadsheet takes these for the beginning of a formula, and a quotation mark for that of a field
# that goes on over tabs and lines.
_TAKEN_FOR_MORE = ("=", "+", "-", "@", "\uff1d", "\uff0b", "\uff0d", "\uff20", "\u2212", '"', "'")


def rows(record: Record, outcome: Outcome, findings: OutcomeFindings, *, version: str, today: date) -> tuple[Row, ...]:
    """What it is about, the counts, every measure, p, the patient, the cautions, the version; five columns throughout.

    A figure that is not given has blank cells, and the reason stands under "method". Only cells that hold a number
    may begin with a minus sign: all others are text to a spreadsheet, whatever the reader typed.
    """
    choices = record.choices
    cautions = [caution_text(caution) for caution in findings.cautions]
    about = (names.outcome_name(outcome), record.title_text, record.source_text)
    table = (
        exports.SHEET_HEAD,
        *(_text(text) for text in about if text.strip()),
        *_counts(outcome, findings.counts),
        *(_measure(line.name, findings.measures[line.key]) for line in lines.measure_lines(outcome, findings, choices)),
        _p(findings),
        *_converted(findings.conversion),
        *_patient(outcome, findings.patient),
        *(_text(caution) for caution in cautions),
        _text(exports.UNROUNDED.format(level=numbers.level(choices.level))),
        *(_text(sentence) for sentence in STANDING_FULL),
        _text(made_with(choices, version, today)),
    )
    return tuple((_safe(name), estimate, low, high, _safe(method)) for name, estimate, low, high, method in table)


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


def _counts(outcome: Outcome, counts: Counts | Gap) -> tuple[Row, ...]:
    """People with the event, and all people, of each group."""
    if isinstance(counts, Gap):
        return ()
    groups: tuple[tuple[names.Group, int, int], ...] = (
        ("reference", counts.reference_events, counts.reference_total),
        ("index", counts.index_events, counts.index_total),
    )
    table: list[Row] = []
    for group, events, total in groups:
        where = names.in_group(outcome, group)
        with_event = exports.PEOPLE_WITH_EVENT.format(group=where, event=names.event_words(outcome))
        table.append((with_event, str(events), "", "", ""))
        table.append((exports.ALL_PEOPLE.format(group=where), str(total), "", "", ""))
    return tuple(table)


def _measure(name: str, measure: Figure | AnyNumberNeeded | Gap) -> Row:
    if isinstance(measure, Gap):
        return (name, "", "", "", gap_text(measure))
    return _number_needed(name, measure) if isinstance(measure, AnyNumberNeeded) else _figure(name, measure)


def _figure(name: str, figure: Figure) -> Row:
    interval = figure.interval
    low, high = (interval, interval) if isinstance(interval, Gap) else (interval.low, interval.high)
    say = limit_text if isinstance(interval, Range) else gap_text
    reasons = [gap_text(figure.estimate)] if isinstance(figure.estimate, Gap) else []
    reasons += [say(limit) for limit in (low, high) if isinstance(limit, Gap)]
    method = "; ".join(part for part in (figure.method, half_added(figure), *dict.fromkeys(reasons)) if part)
    return (name, _number(figure.estimate), _number(low), _number(high), method)


def _number_needed(name: str, needed: AnyNumberNeeded) -> Row:
    through = exports.THROUGH_INFINITY if needed.through_infinity else ""
    low, high = _needed_limit(needed.low, needed), _needed_limit(needed.high, needed)
    why = "; ".join(part for part in (through, limits.withheld_needed(needed)) if part)
    return (name, _number(needed.estimate), low, high, why)


def _needed_limit(limit: NumberNeededLimit | Gap, needed: AnyNumberNeeded) -> str:
    """A limit with its own kind in front where that is not the estimate's; blank where it is withheld."""
    if isinstance(limit, Gap):
        return ""
    value = _number(limit.value)
    return value if limit.kind in (needed.kind, "neither") else f"{limit.kind} {value}"


def _p(findings: OutcomeFindings) -> Row:
    test = findings.test
    if isinstance(test, Gap):
        return (exports.P_NAME, "", "", "", gap_text(test))
    reason = f"; {gap_text(test.p)}" if isinstance(test.p, Gap) else ""
    return (exports.P_NAME, _number(test.p), "", "", f"{test.method}{reason}")


def _converted(conversion: Conversion | Gap) -> tuple[Row, ...]:
    """Only at a starting risk from elsewhere: at the study's own it is the risk ratio, which has a row."""
    if isinstance(conversion, Gap) or conversion.baseline_from == "reference":
        return ()
    baseline = lines.baseline_text(conversion.baseline, conversion.baseline_from)
    return (_figure(exports.CONVERTED.format(baseline=baseline), conversion.risk_ratio),)


def _patient(outcome: Outcome, patient: PatientFindings | Gap) -> tuple[Row, ...]:
    """Only at a starting risk from elsewhere: at the study's own the rows above say the same."""
    if isinstance(patient, Gap) or patient.baseline_from == "reference":
        return ()
    baseline = lines.baseline_text(patient.baseline, patient.baseline_from)
    needed = patient.number_needed
    rows = exports.PATIENT_ROWS

    def named(name: str) -> str:
        return exports.PATIENT.format(column=labels.COLUMNS["patient"], baseline=baseline, name=name)

    return (
        _text(named(basis(outcome, patient))),
        _figure(named(rows["without"]), patient.without),
        _figure(named(rows["with"]), patient.with_),
        _figure(named(rows["difference"]), patient.difference),
        _measure(named(limits.needed_kind(needed)), needed),
        _figure(named(rows["risk_ratio"]), patient.risk_ratio),
    )


def _text(sentence: str) -> Row:
    return (sentence, "", "", "", "")


def _number(number: float | Gap) -> str:
    """The number in full, the point as its decimal mark; blank where there is none."""
    if isinstance(number, Gap):
        return ""
    return exports.SHEET_INFINITY if isinf(number) else repr(float(number))


def _safe(text: str) -> str:
    """The text on one line, behind an apostrophe where a spreadsheet would take it for more than text."""
    line = one_line(text)
    return f"'{line}" if line.startswith(_TAKEN_FOR_MORE) else line
