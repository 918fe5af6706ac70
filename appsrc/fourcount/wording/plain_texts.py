"""The sentences of the patient view and the handout, in short words; a test measures how hard they are to read."""

from __future__ import annotations

from fourcount.record.outcome import Certainty, Design

MISSING = "Before a patient is shown this, fill in {items}."
ITEMS = {
    "the event": "the event in words",
    "the reference group": "the name of the reference group",
    "the index group": "the name of the index group",
    "the time span": "the time span",
}
OTHER_OUTCOME = "words for the people who do not have the welcome outcome"

DO_NOT = "do not"
HOW_MANY = "How many people {event}"
EACH_FIGURE = "Each figure is one person."
EACH_MARK = "Each mark is one person."
EACH_FIGURE_OR_MARK = "Each figure or mark is one person."
LIKE_THE_STUDY = "These people are like those in the study."
START_AT = "These people start at a risk of {count} in {people}."
CHANGE = "On balance, {number} {side} of these {people} {event}."
SAME = "There is no difference: the same number of these {people} {event}."
TURNED = "The filled figures are people who {event}."
ROUNDED = "Numbers are rounded, so they may not add up."
TOO_SMALL = "The risks are too small to draw as people."
EACH_PICTURE = "Each picture shows {people} people."
EITHER = "could go either way"
EITHER_WAY = "{words} with both"
"""What the key says where one array shows both groups."""

AVOIDED = "{name}avoided, on balance"
ADDED = "{name}added, on balance"
FEWER, MORE = "fewer, on balance", "more, on balance"
"""The same in a study whose groups chance did not make alike: nothing says what they were avoided by."""

LONGEST_KEY = 40
OPEN = "The study leaves open that there is no difference."
RANGE = "{index}, it could be from {low} to {high} in {people}."
RELATIVE = "Going from {before} to {after} in {people} is also called “{percent} {word}”."
BEFORE_ROUNDING = "(That is worked out before rounding.)"
OTHER_START = "For people who start at {before} in {people}, it is {after} in {people} {index}."

CERTAINTY_NAMES: dict[Certainty, str] = {
    "": "Certainty: not rated.",
    "high": "Certainty: high, as rated by your clinician.",
    "moderate": "Certainty: moderate, as rated by your clinician.",
    "low": "Certainty: low, as rated by your clinician.",
    "very-low": "Certainty: very low, as rated by your clinician.",
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

NOT_BY_CHANCE = "In this study, chance did not decide who was in which group. Other things may explain the difference."
STUDIES: dict[Design, str] = {
    "cohort": NOT_BY_CHANCE,
    "survey": f"The study asked people at one point in time. {NOT_BY_CHANCE}",
    "case-control": NOT_BY_CHANCE,
    "matched": NOT_BY_CHANCE,
    "before-after": "The study looked at people before and after. Other things may have changed as well.",
}
VARIED = "Not all people in the study were followed for the same time{span}."
OTHER_SPAN = "The study ran for {span}. For {other}, we assume that the risk goes on as before."

ONE_STUDY = "Based on one study. Talk it over with your clinician."
PLACE = "{number} of {all}"
BACK, NEXT, LEAVE = "◂ Back", "Next ▸", "Esc: leave"
SHOW_RANGE, HIDE_RANGE = "Show the range", "Hide the range"
SCREEN_TITLE = "For the patient"
