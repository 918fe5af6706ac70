"""The words of what is copied: the sheet's rows, a letter's lines, and the last line of both."""

from __future__ import annotations

PICTURE_FOOT = "{standing} Fourcount {version}, {date}"
MADE_WITH = "Calculated with Fourcount {version} on {date}; {family} intervals at {level}."
NOT_ALL_EXACT = "The difference, the number needed and the risk ratio have score intervals, for want of exact ones."
NO_EXACT_RATE_DIFFERENCE = "The difference of the rates has a score interval, for want of an exact one."
POOLED_BY = "Pooled by Mantel and Haenszel."
PRINTED_FAMILY = "printed"

SHEET_HEAD = ("measure", "estimate", "low", "high", "method", "note")
CAUTION_ROW = "caution"
NOTE_ROW = "note"
STUDY = "{design}."
PAPER_PRINTS = "The paper prints {text}."
PAPER_RESULT = "The paper’s result: {said}"
WORKED_OUT = "worked out from the printed figures"
METHOD_AS_PRINTED = "as printed"
NEEDED = {
    "NNTB": "Number needed to treat for one to benefit (NNTB)",
    "NNTH": "Number needed to treat for one to be harmed (NNTH)",
    "NNT": "Number needed to treat (NNT)",
}
"""A letter's reader may not know the letters."""

SHEET_INFINITY = "infinity"
THROUGH_INFINITY = "the interval runs through infinity"
UNROUNDED = (
    "Risks and differences are fractions, index minus reference; all figures but p are unrounded. Level {level}."
)
PEOPLE_WITH_EVENT = "People {group} who {event}"
ALL_PEOPLE = "People {group}, all"
P_NAME = "p, two-sided"
EVENTS_IN_GROUP = "Events {group}"
TIME_IN_GROUP = "Person-time {group}, {unit}"
BOTH_SIDES, BOTH_TIMES = "on both sides", "both times"
NEITHER_SIDE, NEITHER_TIME = "on neither", "at neither time"
PAIRS, SAME_PEOPLE = "Pairs", "People"
PAIRS_WITH_EVENT = "{pairs}, {event}: {where}"
PER_UNIT = "Rates and their difference are events in one unit of time ({unit})."
CONVERTED = "Odds ratio as a risk ratio at {baseline}"
PATIENT = "{column}, {baseline}: {name}"
LEVEL = "Level {level}."
PATIENT_RANK = "{column}, {rank} starting risk"
PATIENT_ROWS = {
    "without": "risk without",
    "with": "risk with",
    "difference": "difference",
    "risk_ratio": "risk ratio",
}

GROUP_COUNTS = "{group}: {events} {event}, {others} {other}."
GROUP_RATE = "{group}: {events} events in {time}."
PAIR_COUNTS = (
    "{pairs}, {event}: {both} {on_both}, {index_only} only {index}, {reference_only} only {reference}, {neither} "
    "{on_neither}."
)
PAIRS_THAT_DIFFER = "{differing}, {event}: {index_only} only {index}, {reference_only} only {reference}."
AS_PRINTED = "As printed: {text}{adjusted}."
GROUP_RISK = "{risk} {group}"
PER_100 = " per 100"
EVENTS_OF_PEOPLE = "{events} of {people}"
