"""The other way in which a doubtful paste can be understood: the same numbers, placed otherwise."""

from __future__ import annotations

from msgspec.structs import replace

from fourcount.record.entry.readings import Pasted, PastedGroup
from fourcount.record.outcome import Form

OTHER_FORMS: dict[str, dict[Form, Form]] = {
    "pairs-or-groups": {"pairs": "events-and-others", "events-and-others": "pairs"},
    "others-or-totals": {"events-and-others": "events-of-total", "events-of-total": "events-and-others"},
}
"""For a doubt, the forms that its counts may have instead."""


def can_turn(pasted: Pasted) -> bool:
    """Whether one of the doubts has an other way round."""
    return turned(pasted) is not pasted


def turned(pasted: Pasted) -> Pasted:
    """The other way; turned twice, a paste is what it was. One without such a doubt stays as it is."""
    if "orientation" in pasted.ambiguous and pasted.form == "events-and-others" and len(pasted.groups) == 2:
        return _transposed(pasted)
    for doubt, forms in OTHER_FORMS.items():
        if doubt in pasted.ambiguous and pasted.form in forms:
            return replace(pasted, form=forms[pasted.form])
    return pasted


def _transposed(pasted: Pasted) -> Pasted:
    """Rows become columns; the names of the groups change places with those of the outcomes."""
    first, second = pasted.groups
    groups = (
        PastedGroup(left_text=first.left_text, right_text=second.left_text, label=pasted.left_heading),
        PastedGroup(left_text=first.right_text, right_text=second.right_text, label=pasted.right_heading),
    )
    return replace(
        pasted,
        groups=groups,
        left_heading=first.label,
        right_heading=second.label,
        layout="across" if pasted.layout == "down" else "down",
    )
