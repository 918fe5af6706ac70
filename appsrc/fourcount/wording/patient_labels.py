"""The words of the third column's rarer fields, the outcomes bar, the picture's forms, a line of the reader's own."""

from __future__ import annotations

from fourcount.record.outcome import Outcome

START_KINDS = {
    "one": "Starting risk",
    "three": "Low to high",
    "rate": "Rate",
    "overall": "Overall risk",
}
"""How the starting risk is given; the word stands before its fields."""

START_NOTES = {
    "one": "one, as 12% or 24 of 200",
    "three": "low, usual and high beside each other",
    "rate": "as 12 per 1,000 person-years",
    "overall": "of people with and without it together",
}
START_KIND = "How the starting risk is given"

START_FIELDS = {
    "starting_risk_text": "Starting risk",
    "low_risk_text": "Low starting risk",
    "high_risk_text": "High starting risk",
    "rate_text": "Rate without",
    "overall_risk_text": "Risk of everybody",
    "exposed_share_text": "Share of people who have it",
}
"""Names for a screen reader."""

START_HEADS = {
    "low_risk_text": "low",
    "starting_risk_text": "usual",
    "high_risk_text": "high",
    "overall_risk_text": "of everybody",
    "exposed_share_text": "share who have it",
}
"""Over the fields, where there is more than one."""

START_HINTS = {
    "low_risk_text": "8%",
    "high_risk_text": "20%",
    "rate_text": "12 per 1,000 person-years",
    "overall_risk_text": "10%",
    "exposed_share_text": "30%",
}
USUAL_START = "Usual starting risk"

CARRY_ODDS = "Carry the odds ratio"
"""Offered where a risk would pass 100%: odds never do."""

PICTURE_NAMES = {"picture": "Picture", "relative": "The relative figure as a picture"}

QUIET = {
    "span": "Another time span",
    "words": "Plain words",
    "certainty": "Certainty",
    "handout": "On the handout",
}
"""The links that open fields which few patients need."""

QUIET_NAMES = {
    "span": "Time span",
    "words": "Plain words",
    "certainty": "Certainty",
    "handout": "Handout",
}
QUIET_FIELDS = {
    "other_span_text": "Time span that the effect is carried to",
    "plain_event_text": "The event in plain words",
    "plain_other_text": "The other outcome in plain words",
    "certainty": "Certainty of the evidence, as you rate it",
    "on_handout": "Whether this outcome stands on the handout",
}
QUIET_HINTS = {
    "other_span_text": "“5 years”",
    "other_span_known": "“5 years”; the study: {span}",
}
CERTAINTIES = {"": "not rated", "high": "high", "moderate": "moderate", "low": "low", "very-low": "very low"}
ON_HANDOUT = {True: "stands on it", False: "left out"}

BUTTONS = {"show-patient": "Show the patient", "handout": "Handout…"}
PICTURE_LINKS = {"picture": "Picture ▾", "copy-picture": "Copy", "curve": "Across starting risks…"}
PICTURE_LINK_NAMES = {"picture": "How the picture is drawn", "copy-picture": "Copy the picture"}

PICTURE_MENU = "Pict&ure"
ICONS = {"person": "&People", "block": "B&locks", "dot": "&Dots"}
ARRANGEMENTS = {"two": "&Two pictures", "one": "&One picture of all three"}
"""Bars are a command of their own, with a key."""

OUTCOME_MENU = "&Outcomes of the paper"
OUTCOME_COMMANDS = {
    "outcome-add": "&Add an outcome",
    "outcome-copy": "&Copy this outcome",
    "outcome-next": "&Next outcome",
    "outcome-previous": "&Previous outcome",
    "outcome-left": "Move to the &left",
    "outcome-right": "Move to the &right",
    "outcome-remove": "Re&move this outcome",
}
PATIENT_COMMANDS = {
    "show-patient": "&Show the patient",
    "handout": "&Handout…",
    "curve": "A&cross starting risks…",
    "uncertainty": "&Uncertainty in the picture",
    "relative": "The relative fi&gure beside it",
    "own-line": "A l&ine of your own",
}

OUTCOMES = "Outcomes"
UNNAMED_OUTCOME = "Outcome {number}"
ADD_OUTCOME = "Add an outcome"
OUTCOME_PLACE = "{place} of {all}"
OUTCOME_REMOVED = "{name} removed. Undo brings it back."
OUTCOMES_FULL = "A paper holds 200 outcomes at most."

TABLE_HEADS = {"without": "without", "with": "with", "difference": "difference", "needed": "NNT"}
TABLE_NAME = "The picture’s numbers"
TABLE_CORNER = "in {people}"

OWN_LINE = "A line of your own"
OWN_LINE_CLOSE = "Close the line of your own"
LINE_KINDS = {"matters": "smallest that matters", "margin": "non-inferiority margin"}
LINE_KIND = "What your line stands for"
LINE_SCALES = {
    "risk_difference": "per 100",
    "risk_ratio": "risk ratio",
    "odds_ratio": "odds ratio",
    "hazard_ratio": "hazard ratio",
}
LINE_SCALE = "The scale of your line"
LINE_SIDES = {"fewer": "fewer", "more": "more"}
LINE_SIDES_OF_RATIO = {"fewer": "lower", "more": "higher"}
LINE_SIDE = "The side of your line"
LINE_TEXT = "Where your line lies"
LINE_HINTS = {"risk_difference": "5", "risk_ratio": "0.80", "odds_ratio": "0.80", "hazard_ratio": "0.80"}


def outcome_title(outcome: Outcome, place: int) -> str:
    """What an outcome is called on its tab: its name, what is counted, or its place."""
    texts = (outcome.name_text, outcome.event_heading_text, outcome.event_words_text)
    name = next((" ".join(text.split()) for text in texts if text.strip()), "")
    return name or UNNAMED_OUTCOME.format(number=place + 1)
