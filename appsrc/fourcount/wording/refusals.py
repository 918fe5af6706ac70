"""Why a file is not opened, or a record not kept: one sentence for every reason, with the place."""

from __future__ import annotations

from fourcount.record.codec import Refused
from fourcount.wording.numbers import whole

REFUSAL_TEXTS = {
    "empty": "The file is empty.",
    "too-large": "A record takes at most {megabytes} megabytes, and this is more.",
    "not-text": "From line {line} on the file is not text, so it is no record of Fourcount.",
    "damaged": "The file is damaged: line {line} goes wrong at its character {column}.",
    "cut-off": "The file ends before the record does; its end is missing.",
    "too-deep": "The file is nested deeper than any record is.",
    "key-twice": "“{name}” stands twice {place}, and only one of them can be meant.",
    "not-a-record": "This is no record of Fourcount.",
    "newer": "A newer version of Fourcount saved this file: its format is {number}, and this one reads up to {newest}.",
    "unknown-field": "There is something {place} that this version does not know: “{name}”.",
    "missing-field": "“{name}” is missing {place}.",
    "wrong-kind": "Something of the wrong kind stands {place}.",
    "unknown-word": "A word that is none of those possible stands {place}.",
    "level-out-of-range": "The confidence level of a record lies from 80% to 99.9%, and this one does not.",
    "no-outcome": "A record has at least one outcome, and this one has none.",
    "too-many-outcomes": "A record has at most {limit} outcomes, and this one has more.",
    "no-stratum": "At least one stratum is needed {place}, and there is none.",
    "too-many-strata": "There are more than {limit} strata {place}, and no record has more.",
    "too-long": "More than {limit} characters stand {place}, and no record holds more.",
    "character": "A hidden character that no record holds ({character}) stands {place}.",
}
"""By the keys of ``record.file.refused.REFUSALS``."""

FIELD_NAMES = {
    "title_text": "title",
    "source_text": "source",
    "name_text": "name of the outcome",
    "first_label_text": "first group’s name",
    "second_label_text": "second group’s name",
    "left_heading_text": "first column’s heading",
    "right_heading_text": "second column’s heading",
    "left_words_text": "first column’s words",
    "right_words_text": "second column’s words",
    "plain_event_text": "first column’s plain words",
    "plain_other_text": "second column’s plain words",
    "span_text": "time span",
    "first_left_text": "first row’s first cell",
    "first_right_text": "first row’s second cell",
    "second_left_text": "second row’s first cell",
    "second_right_text": "second row’s second cell",
    "unit_text": "unit of person-time",
    "limits_level_text": "level of the limits",
    "label_text": "stratum’s name",
    "paper_text": "printed result",
    "adjusted_text": "adjusted effect",
    "adjusted_for_text": "list of what it is adjusted for",
    "first_randomised_text": "number randomised in the first group",
    "second_randomised_text": "number randomised in the second group",
    "first_lost_text": "number lost in the first group",
    "second_lost_text": "number lost in the second group",
    "first_loss_ratio_text": "ratio of risks among the lost of the first group",
    "second_loss_ratio_text": "ratio of risks among the lost of the second group",
    "icc_text": "intracluster correlation",
    "cluster_size_text": "mean size of a cluster",
    "line_text": "line of your own",
    "starting_risk_text": "starting risk",
    "starting_risk_source_text": "source of the starting risk",
    "low_risk_text": "low starting risk",
    "high_risk_text": "high starting risk",
    "rate_text": "rate",
    "overall_risk_text": "overall risk",
    "exposed_share_text": "share of people who have it",
    "other_span_text": "other time span",
}
"""What the window calls each text; anything else in a file is named as the file names it."""

COUNTED = {"outcomes": "outcome", "strata": "stratum"}
"""Lists, and what one of them is called."""

SILENT = ("table", "patient", "choices")
"""Parts of a record that the name of what they hold makes plain."""

CANNOT_BE_OPENED = "“{name}” cannot be opened: {reason}"
NO_SUCH_FILE = "there is no such file."
A_FOLDER = "it is a folder."
NOT_PERMITTED = "the system does not let it be read."
NOT_A_FILE = "it is not an ordinary file."
UNREADABLE = "the system cannot read it."


def refusal_text(refused: Refused) -> str:
    """One sentence that says what is wrong and where."""
    facts = refused.facts
    limit = facts.get("limit", 0)
    return REFUSAL_TEXTS[refused.key].format(
        place=place_words(str(facts.get("place", ""))),
        name=facts.get("name", ""),
        limit=whole(int(limit)),
        megabytes=int(limit) // 1_000_000,
        **{name: facts.get(name, "") for name in ("line", "column", "number", "newest", "character")},
    )


def place_words(path: str) -> str:
    """A path in a record in words: "in the starting risk of outcome 2", "in stratum 3 of outcome 1"."""
    if not path:
        return "in the file"
    steps = path.split(".")
    words: list[str] = []
    for step, behind in zip(steps, [*steps[1:], ""], strict=True):
        if step in COUNTED and behind.isdecimal():
            words.append(f"{COUNTED[step]} {int(behind) + 1}")
        elif not step.isdecimal() and not (behind and step in SILENT):
            words.append(f"the {FIELD_NAMES[step]}" if step in FIELD_NAMES else f"“{step}”")
    return f"in {' of '.join(reversed(words))}"
