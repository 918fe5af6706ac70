"""The words of what is copied: the sheet's rows, a letter's lines, and the last line of both."""

from __future__ import annotations

PICTURE_FOOT = "{standing} Fourcount {version}, {date}"
MADE_WITH = "Calculated with Fourcount {version} on {date}; {family} intervals at {level}."
NOT_ALL_EXACT = "The difference, the number needed and the risk ratio have score intervals, for want of exact ones."

SHEET_HEAD = ("measure", "estimate", "low", "high", "method")
SHEET_INFINITY = "infinity"
THROUGH_INFINITY = "the interval runs through infinity"
UNROUNDED = "Risks and differences are fractions, index minus reference; all figures are unrounded. Level {level}."
PEOPLE_WITH_EVENT = "People {group} who {event}"
ALL_PEOPLE = "People {group}, all"
P_NAME = "p, two-sided"
CONVERTED = "Odds ratio as a risk ratio at {baseline}"
PATIENT = "{column}, {baseline}: {name}"
PATIENT_ROWS = {
    "without": "risk without",
    "with": "risk with",
    "difference": "difference",
    "risk_ratio": "risk ratio",
}

GROUP_COUNTS = "{group}: {events} {event}, {others} {other}."
GROUP_RISK = "{risk} {group}"
PER_100 = " per 100"
EVENTS_OF_PEOPLE = "{events} of {people}"
