"""The sentences of the patient view and the handout, in short words; a test measures how hard they are to read."""

from __future__ import annotations

from fourcount.record.outcome import Certainty, Design

MISSING = "Before a patient is shown this, fill in {items}."
OTHER_OUTCOME = "“Plain words” for the people who do not have the welcome outcome"

DO_NOT = "do not"
HOW_MANY = "How many people {event}"
EACH_FIGURE = "Each figure is one person."
EACH_MARK = "Each mark is one person."
EACH_FIGURE_OR_MARK = "Each figure or mark is one person."
LIKE_THE_STUDY = "These people are like those in the study."
START_AT = "These people start at a risk of {start}."
START_WELCOME = "These people start at {start}."
FOR_LIKE_THE_STUDY = "for people like those in the study"
FOR_START_AT = "for people who start at {start}"
START = "{count} in {people}{who}{over}"
OVER = " over {span}"
HEAD = "{title}, {who}"
CHANGE = "{index}, {number} {side} of these {people} {event}."
SAME = "Going by the study, the same number of these {people} {event}."
TURNED = "The filled ones are people who {event}."
DRAWN = " who {event}"
ROUNDED = "Numbers are rounded to whole people; the difference is worked out before."
TOO_SMALL = "The risks are too small to draw as people."
TOO_CLOSE = "The difference is too small to draw as people."
EACH_PICTURE = "Each picture shows {people} people."
EITHER_WAY = "{words}, with both"
"""What the key says where one array shows both groups."""

CHANGED = ("spared, on balance", "added, on balance")
CHANGED_HERE = ("fewer here, on balance", "more here, on balance")
"""The key of figures that make the difference, avoided and added, without a number: fewer are drawn where the range
takes their place. The second pair is for studies that show no cause."""

OPEN = "There may be no difference: the study leaves that open."
OPEN_EITHER_WAY = "The study leaves open a difference either way."
OPEN_ONE_WAY = "The study leaves open that there is a difference."
RANGE = "{index}, it could be from {low} to {high} in {people}{drawn}."
NO_RANGE = "A range cannot be given here."
RELATIVE = "Going from {before} to {after} in {people}{drawn} is also called “{percent} {word}”."
RELATIVE_UNROUNDED = (
    "Going from {before} to {after} in {people}{drawn} is also called “{percent} {word}” "
    "(worked out before rounding to whole people)."
)
OTHER_START = "For people who start at {start}, it is {after} in {people} {index}."
OTHER_START_OVER = "For people who start at {start}, it is {before} in {people} {reference} and {after} {index}."

CERTAINTY_NAMES: dict[Certainty, str] = {
    "": "How sure the evidence is: not rated, so nobody has judged it here.",
    "high": "How sure the evidence is: high, as rated by your clinician.",
    "moderate": "How sure the evidence is: moderate, as rated by your clinician.",
    "low": "How sure the evidence is: low, as rated by your clinician.",
    "very-low": "How sure the evidence is: very low, as rated by your clinician.",
}
CERTAINTY: dict[Certainty, dict[str, str]] = {
    "": dict.fromkeys(("fewer", "more", "same"), ""),
    "high": {
        "fewer": "{index}, fewer people {event}.",
        "more": "{index}, more people {event}.",
        "same": "{index}, about the same number of people {event}.",
    },
    "moderate": {
        "fewer": "{index}, probably fewer people {event}.",
        "more": "{index}, probably more people {event}.",
        "same": "{index}, probably about the same number of people {event}.",
    },
    "low": {
        "fewer": "{index}, it may be that fewer people {event}.",
        "more": "{index}, it may be that more people {event}.",
        "same": "{index}, it may be that the same number of people {event}.",
    },
    "very-low": {
        "fewer": "The evidence is very uncertain: we do not know if fewer people {event} {index}.",
        "more": "The evidence is very uncertain: we do not know if more people {event} {index}.",
        "same": "The evidence is very uncertain: we do not know if anything changes {index}.",
    },
}
"""What the rated certainty lets one say; ``index`` is "with night lights"."""

DOUBT = "Other things may explain the difference: {why}."
NOT_ALIKE: dict[Design, str] = {
    "cohort": "the groups may not have been alike",
    "survey": "the groups may not have been alike, and people were asked only once",
    "case-control": "the groups may not have been alike",
    "matched": "the groups may not have been alike",
    "before-after": "more may have changed in that time",
}
"""Why a study whose groups chance did not make alike shows no cause."""

VARIED = "Not all people in the study were followed for the same time{span}."
OTHER_SPAN = "The study ran for {span}. For {other}, we assume that the risk goes on as before."

ONE_STUDY = "Based on one study. Talk it over with your clinician."
PLACE = "{number} of {all}"
BACK, NEXT, LEAVE = "◂ Back", "Next ▸", "Esc: leave"
SHOW_RANGE, HIDE_RANGE = "Show the range", "Hide the range"
SCREEN_TITLE = "For the patient"
