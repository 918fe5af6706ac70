"""A letter's lines, and what it rests on, for the forms of print that are not four counts of one table."""

from __future__ import annotations

from fourcount.appraisal.findings import (
    Counts,
    Figure,
    OutcomeFindings,
    PairCounts,
    PrintedFigure,
    Rates,
    StrataFindings,
)
from fourcount.publish import groups
from fourcount.publish.letter_figures import said_once
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import exports, limits, names, numbers
from fourcount.wording.extras import extra_lines
from fourcount.wording.form import given, level_of
from fourcount.wording.lines import MeasureLine, measure_lines
from fourcount.wording.pairs import only, pairs_that_differ, who_differ
from fourcount.wording.person_time import time_in
from fourcount.wording.printed import adjusted_words

IN_LETTERS = ("adjusted", "clusters")
"""What stands under the fold and belongs to a letter: what the reader typed beside the table."""


def form_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[str, ...]:
    """One line for every measure of a form, with its interval; what is withheld once for each reason."""
    level = limits.interval_name(level_of(findings, choices))
    lines = [line for line in measure_lines(outcome, findings, choices) if line.group == "main"]

    def text_of(line: MeasureLine, _figure: Figure, reasons: tuple[str, ...]) -> str:
        return figure_text(line, level, reasons)

    given_lines, withheld = said_once(lines, outcome, findings, level, text_of)
    return (*given_lines, *beside_lines(outcome, findings, choices), *withheld)


def beside_lines(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[str, ...]:
    """What the reader typed beside the table: the paper's own adjusted effect, the design effect of clusters."""
    lines = [line for line in extra_lines(outcome, findings, choices) if line.key in IN_LETTERS and not line.withheld]
    return tuple(
        ", ".join(
            part for part in (f"{line.name}: {line.estimate}{limits.bracketed(line.interval)}", line.note) if part
        )
        for line in lines
    )


def figure_text(line: MeasureLine, level: str, reasons: tuple[str, ...] = ()) -> str:
    """``Rate ratio: 0.54 (95% interval 0.36 to 0.80), score``; reasons stand apart from it."""
    note = line.note
    for reason in reasons:
        note = note.replace(reason, "")
    said = f"{line.name}: {line.estimate} ({level} {line.interval})"
    return ", ".join(part for part in (said, line.detail, note.strip().rstrip(".")) if part)


def rests_on(outcome: Outcome, findings: OutcomeFindings) -> str:
    """The counts, pairs, person-time or print that everything below rests on, in the reader's words."""
    found, strata = given(findings), findings.strata
    if isinstance(strata, StrataFindings):
        return " ".join(f"{stratum.label}: {_groups(outcome, stratum.counts)}" for stratum in strata.strata)
    if isinstance(found, Rates):
        return _rates(outcome, found)
    if isinstance(found, PrintedFigure):
        return exports.AS_PRINTED.format(text=found.text, adjusted=adjusted_words(outcome, found))
    return _pairs(outcome, findings) if findings.form == "pairs" else ""


def _groups(outcome: Outcome, counts: Counts) -> str:
    """``night lights 10 of 200, usual care 22 of 190.``"""
    return (
        ", ".join(
            f"{names.label_within(outcome, group)} {numbers.whole(events)} of {numbers.whole(total)}"
            for group, events, total in groups.people(counts)
        )
        + "."
    )


def _rates(outcome: Outcome, rates: Rates) -> str:
    return " ".join(
        exports.GROUP_RATE.format(
            group=names.sentence_case(names.label(outcome, group)),
            events=numbers.whole(events),
            time=time_in(time, outcome),
        )
        for group, events, time in groups.person_time(rates)
    )


def _pairs(outcome: Outcome, findings: OutcomeFindings) -> str:
    pairs, differ = given(findings), pairs_that_differ(outcome, findings)
    if differ is None:
        return ""
    whole = isinstance(pairs, PairCounts)
    words = exports.PAIR_COUNTS if whole else exports.PAIRS_THAT_DIFFER
    twice = outcome.design == "before-after"
    return words.format(
        pairs=exports.SAME_PEOPLE if twice else exports.PAIRS,
        differing=names.sentence_case(who_differ(outcome, sum(differ))),
        on_both=exports.BOTH_TIMES if twice else exports.BOTH_SIDES,
        on_neither=exports.NEITHER_TIME if twice else exports.NEITHER_SIDE,
        both=numbers.whole(pairs.both) if isinstance(pairs, PairCounts) else "",
        neither=numbers.whole(pairs.neither) if isinstance(pairs, PairCounts) else "",
        index_only=numbers.whole(differ[0]),
        reference_only=numbers.whole(differ[1]),
        index=only(outcome, "index"),
        reference=only(outcome, "reference"),
        event=names.event_words(outcome),
    )
