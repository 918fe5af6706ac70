"""Why a figure is not there, and what is wrong with something that was typed: one sentence for every key."""

from __future__ import annotations

from fourcount.record.entry.readings import Mark, Unreadable
from fourcount.stats.results import Gap
from fourcount.wording.facts import told

GAP_TEXTS = {
    # the numbers themselves
    "empty-table": "There is nobody in either group.",
    "empty-index-group": "There is nobody in the index group.",
    "empty-reference-group": "There is nobody in the reference group.",
    "empty-group": "There is nobody in this group.",
    "no-events": "Nobody in either group had the event, so this figure is not determined.",
    "no-non-events": "Everybody in both groups had the event, so this figure is not determined.",
    "zero-width": "An interval of zero width is withheld; the score family gives a real one.",
    "one-outcome": "Nobody, or everybody, here had the event, where textbook odds have no interval; "
    "the score family gives one.",
    "beyond-one": "The risk would pass 100% here; where a risk ratio is carried, the odds ratio can be.",
    "beyond-zero": "The bare formula’s limit falls below 0%, where no risk lies; the score intervals stay above it.",
    # the design, the table, the patient
    "not-typed": "Type the four counts of the table.",
    "unreadable": "A cell of the table cannot be used; the line under the table says why.",
    "follows": "This figure takes a moment and will follow.",
    "design-survey-nnt": "A cross-sectional survey sees who has the event at one time, not who comes to have it, "
    "so it gives no number needed to treat.",
    "design-case-control": "A case-control study sets how many cases and controls it takes, "
    "so its totals give neither risks nor what follows from them.",
    "case-control-needs-baseline": "Type a starting risk from another source: a case-control study has none.",
    "no-starting-risk": "Type a starting risk: nobody is in the reference group to give one.",
    "baseline-unreadable": "The starting risk cannot be read; 12% or 12 in 100 would do.",
    "carried-gap": "The effect to be carried has no value in this table, so nothing follows for a patient.",
    "undetermined-at-baseline": "An infinite effect says nothing at a starting risk of 0%, nor an odds ratio of 0 "
    "at one of 100%.",
    "bare-starting-risk": "The starting risk was typed without an interval of its own.",
    "formula-beyond-one": "The bare formula’s limit passes 100%, where no risk lies; the score intervals do not.",
    "formula-beyond-risks": "The bare formula’s limit parts the two risks farther than they can lie apart; "
    "the score intervals do not.",
}
LIMIT_TEXTS = {
    "beyond-one": "The upper limit of the risk would pass 100%, so the interval is open there; "
    "carrying the odds ratio avoids it.",
}
"""What is said where only a limit is withheld and the estimate stands."""

UNKNOWN_GAP = "This figure cannot be given."

MARK_TEXTS = {
    "not-a-count": "{text}: a whole number of people is needed, such as 38",
    "negative": "{text}: a count cannot be negative",
    "decimal": "{text}: people are counted whole, without decimals",
    "point-in-thousands": "{text}: people are counted whole; a thousands mark is a comma, as in {comma}",
    "two-counts": "{text}: one count in each cell",
    "too-large": "{text}: a count goes up to {limit}",
    "events-above-total": "{text}: more events than people; the events have to fit into the total",
    "total-disagrees": "{text}: the total here is {typed}, but the group’s total is {total}; check the paper",
    "percent-disagrees": "{text}: {events} of {total} does not round to this percentage; the count is used",
    "read-as": "{text}: read as {value}; two counts need two cells",
    "not-a-risk": "{text}: a risk is needed, such as 12% or 12 in 100",
    "percent-or-fraction": "{text}: this could be a percentage or a fraction; write it with its sign, such as 12%",
    "risk-out-of-range": "{text}: a risk lies between 0% and 100%",
    "not-a-level": "{text}: a confidence level is needed, such as 95%",
    "level-out-of-range": "{text}: a confidence level here lies between 80% and 99.9%",
}
UNKNOWN_MARK = "{text}: this cannot be read"


def gap_text(gap: Gap) -> str:
    """One sentence that says why a figure is not given, and what would help where something would."""
    return told(GAP_TEXTS.get(gap.key, UNKNOWN_GAP), gap.facts)


def limit_text(gap: Gap) -> str:
    """The sentence for one limit that is not given beside an estimate that is."""
    return LIMIT_TEXTS.get(gap.key) or gap_text(gap)


def mark_text(mark: Mark | Unreadable) -> str:
    """What was typed, what is wrong with it, and what would do."""
    return told(MARK_TEXTS.get(mark.key, UNKNOWN_MARK), mark.facts)
