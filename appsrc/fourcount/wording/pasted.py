"""What a paste was understood as, what is not certain about it, and what it filled: for the reader to look at."""

from __future__ import annotations

from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.outcome import Form, Outcome
from fourcount.wording import labels
from fourcount.wording.printed_labels import PASTED, PASTED_PARTS, PUT_AWAY

GROUP_LINES: dict[Form, str] = {
    "events-and-others": "{label}: {left} with, {right} without",
    "events-of-total": "{label}: {left} of {right}",
    "percent-of-total": "{label}: {left} of {right}",
    "person-time": "{label}: {left} in {right}{unit}",
    "risk-at-time": "{label}: {left} ({right})",
    "strata": "{label}: {left} of {right}",
}
PAIR_LINES = "Pairs: {both} both, {first} first only, {second} second only, {neither} neither"
PRINTED = "Printed: {text}"
EVENT = "Event: {words}"

DOUBTS = {
    "others-or-totals": "The second count of each group may be its total, or those without the event.",
    "orientation": "Groups may run down or across.",
    "pairs-or-groups": "These may be counts of pairs, or of two separate groups.",
    "percent-disagrees": "A percentage beside a count is not what the count gives.",
    "no-totals": "Not both totals were found.",
    "totals-by-percent": "The totals were told from the percentages.",
    "more-counts": "There are more counts than two groups have; the first two were taken.",
    "several-rows": "There are rows of several outcomes; the first was taken.",
    "strata-or-outcomes": "Several rows were taken as strata of one outcome; they may be several outcomes.",
    "total-left-out": "A row or column of totals was left out.",
    "left-out": "A row or column was not understood, and left out.",
    "rates-unchecked": "The unit of person-time is not printed beside each number.",
    "comma-pairs": "A comma was taken as a border between two counts.",
    "point-thousands": "Points in whole numbers were taken as marks of thousands.",
    "totals-disagree": "A total is not the sum of its counts.",
    "counts-left-out": "The counts in it were not understood; only the printed result was taken.",
    "not-compared": "Nothing says that the two counts are of two groups.",
    "changed-count": "The counts may be of one group at two times.",
}
UNKNOWN_DOUBT = "Check it against the paper."


def understood(pasted: Pasted, outcome: Outcome) -> list[str]:
    """A line for each group, then the event, then the printed figures."""
    lines = _pairs(pasted) if pasted.form == "pairs" else _groups(pasted, outcome)
    event = pasted.words or pasted.left_heading
    if event:
        lines.append(EVENT.format(words=event))
    if pasted.paper_text:
        lines.append(PRINTED.format(text=pasted.paper_text))
    return lines


def uncertain(pasted: Pasted) -> list[str]:
    """A sentence for each doubt."""
    return [DOUBTS.get(key, UNKNOWN_DOUBT) for key in pasted.ambiguous]


def filled(before: Outcome, after: Outcome, *, another: bool = False) -> str:
    """What a paste changed, in a short notice; ``another`` where it came over an earlier table and its words."""
    kinds = {
        "table": ("table",),
        "labels": ("first_label_text", "second_label_text"),
        "headings": ("left_heading_text", "right_heading_text"),
        "words": ("left_words_text", "right_words_text"),
        "span": ("span_text",),
        "figures": ("paper_text", "adjusted_text"),
    }
    parts = [
        PASTED_PARTS[part]
        for part, fields in kinds.items()
        if any(getattr(before, field) != getattr(after, field) for field in fields)
    ]
    told = PASTED.format(parts=", ".join(parts)) if parts else labels.NOTHING_PASTED
    return f"{told} {PUT_AWAY}" if another else told


def _pairs(pasted: Pasted) -> list[str]:
    cells = [text or "?" for group in pasted.groups[:2] for text in (group.left_text, group.right_text)]
    return (
        [PAIR_LINES.format(**dict(zip(("both", "first", "second", "neither"), cells, strict=False)))] if cells else []
    )


def _groups(pasted: Pasted, outcome: Outcome) -> list[str]:
    lines = []
    for place, group in enumerate(pasted.groups):
        stratum = pasted.stratum_labels[place // 2] if place // 2 < len(pasted.stratum_labels) else ""
        label = _label(group, place % 2, outcome)
        name = f"{stratum}, {label}" if stratum else label
        unit = f" {pasted.unit}" if pasted.unit else ""
        pattern = GROUP_LINES.get(pasted.form, GROUP_LINES["events-of-total"])
        right = group.right_text or "?"
        lines.append(pattern.format(label=name, left=group.left_text or "?", right=right, unit=unit))
    return lines


def _label(group: PastedGroup, place: int, outcome: Outcome) -> str:
    position = ("first", "second")[place]
    own: str = getattr(outcome, f"{position}_label_text").strip()
    return group.label or own or labels.GROUP_NAMES[position]
