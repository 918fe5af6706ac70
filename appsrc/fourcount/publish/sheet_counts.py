"""The rows of a sheet that say what everything rests on: counts, pairs, person-time, strata, or the print."""

from __future__ import annotations

from fourcount.appraisal.findings import Counts, OutcomeFindings, PairCounts, PrintedFigure, Rates, StrataFindings
from fourcount.publish import groups
from fourcount.publish.sheet_rows import Row, count_row, text_row
from fourcount.record.outcome import Outcome
from fourcount.wording import exports, names
from fourcount.wording.form import given
from fourcount.wording.pairs import only, pairs_that_differ
from fourcount.wording.person_time import unit
from fourcount.wording.printed import adjusted_words


def basis_rows(outcome: Outcome, findings: OutcomeFindings) -> tuple[Row, ...]:
    """What was typed, number by number."""
    found, strata = given(findings), findings.strata
    if isinstance(strata, StrataFindings):
        return tuple(row for one in strata.strata for row in _counts(outcome, one.counts, f"{one.label}: "))
    if isinstance(found, Counts):
        return _counts(outcome, found)
    if isinstance(found, Rates):
        return _rates(outcome, found)
    if isinstance(found, PrintedFigure):
        return (text_row(exports.AS_PRINTED.format(text=found.text, adjusted=adjusted_words(outcome, found))),)
    return _pairs(outcome, findings) if findings.form == "pairs" else ()


def _counts(outcome: Outcome, counts: Counts, before: str = "") -> tuple[Row, ...]:
    """People with the event, and all people, of each group."""
    table: list[Row] = []
    for group, events, total in groups.people(counts):
        where = names.in_group(outcome, group)
        with_event = exports.PEOPLE_WITH_EVENT.format(group=where, event=names.event_words(outcome))
        table.append(count_row(f"{before}{with_event}", events))
        table.append(count_row(f"{before}{exports.ALL_PEOPLE.format(group=where)}", total))
    return tuple(table)


def _rates(outcome: Outcome, rates: Rates) -> tuple[Row, ...]:
    table: list[Row] = []
    for group, events, time in groups.person_time(rates):
        where = names.in_group(outcome, group)
        table.append(count_row(exports.EVENTS_IN_GROUP.format(group=where), events))
        table.append(count_row(exports.TIME_IN_GROUP.format(group=where, unit=unit(outcome)), float(time)))
    return tuple(table)


def _pairs(outcome: Outcome, findings: OutcomeFindings) -> tuple[Row, ...]:
    pairs, differ = given(findings), pairs_that_differ(outcome, findings)
    index, reference = only(outcome, "index"), only(outcome, "reference")
    twice = outcome.design == "before-after"
    both, neither = (exports.BOTH_TIMES, exports.NEITHER_TIME) if twice else (exports.BOTH_SIDES, exports.NEITHER_SIDE)
    counts = [] if differ is None else [(f"only {index}", differ[0]), (f"only {reference}", differ[1])]
    if isinstance(pairs, PairCounts):
        counts = [(both, pairs.both), *counts, (neither, pairs.neither)]
    event, called = names.event_words(outcome), exports.SAME_PEOPLE if twice else exports.PAIRS
    named = [(exports.PAIRS_WITH_EVENT.format(pairs=called, event=event, where=w), number) for w, number in counts]
    return tuple(count_row(name, number) for name, number in named)
